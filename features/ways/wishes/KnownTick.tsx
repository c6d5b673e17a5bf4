import { Pressable, View } from "react-native";
import { Icon } from "@/features/ui/Icon";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { webProps } from "@/features/ui/webStyle";
import { glyphs } from "@/shared/music/pitch";
import { shapeMark } from "@/shared/ways/shapeMark";

export interface KnownTickProps {
  /** chord that the shape plays, ASCII */
  name: string;
  frets: readonly (number | null)[];
  /** marks of the shapes the player knows */
  known: readonly string[];
  onKnown: (mark: string, known: boolean) => void;
}

/** A tick under a grid: this shape I know. */
export function KnownTick({ name, frets, known, onKnown }: KnownTickProps) {
  const mark = shapeMark(frets);
  const on = known.includes(mark);
  return (
    <Pressable
      role="button"
      aria-label={`I know it: this shape of ${glyphs(name)}`}
      onPress={() => onKnown(mark, !on)}
      {...webProps({ "aria-pressed": on })}
      style={{
        minHeight: 48,
        minWidth: 72,
        flexDirection: "row",
        gap: 6,
        alignItems: "center",
        justifyContent: "center",
      }}
    >
      <View
        style={{
          width: 20,
          height: 20,
          borderRadius: 6,
          borderWidth: 1.5,
          borderColor: on ? colors.plum : colors.inkSoft,
          backgroundColor: on ? colors.plum : colors.card,
          alignItems: "center",
          justifyContent: "center",
        }}
      >
        {on && <Icon name="check" size={14} color={colors.onPlum} />}
      </View>
      <Text variant="tiny" tone={on ? "ink" : "soft"} aria-hidden>
        I know it
      </Text>
    </Pressable>
  );
}
