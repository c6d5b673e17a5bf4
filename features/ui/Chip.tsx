import { Pressable, View } from "react-native";
import { Icon } from "./Icon";
import { Text } from "./Text";
import { colors } from "./theme";
import { webProps } from "./webStyle";

export interface ChipProps {
  label: string;
  selected?: boolean;
  /** without it the chip is only a label */
  onPress?: () => void;
  /** chords stand in the mono face */
  mono?: boolean;
  testID?: string;
}

export function Chip({ label, selected = false, onPress, mono = false, testID }: ChipProps) {
  const face = (
    <View
      style={{
        flexDirection: "row",
        alignItems: "center",
        gap: 6,
        height: 32,
        paddingHorizontal: 12,
        borderRadius: 999,
        borderWidth: 1,
        borderColor: selected ? colors.plum : onPress ? colors.inkSoft : colors.line,
        backgroundColor: selected ? colors.plum : colors.card,
      }}
    >
      {selected && <Icon name="check" size={16} color={colors.onPlum} />}
      <Text
        variant={mono ? "monoBold" : "label"}
        tone={selected ? "onPlum" : "ink"}
        style={{ fontSize: 14, lineHeight: 18 }}
        numberOfLines={1}
      >
        {label}
      </Text>
    </View>
  );
  if (!onPress) return face;
  return (
    <Pressable
      role="button"
      onPress={onPress}
      testID={testID}
      {...webProps({ "aria-pressed": selected })}
      style={{ minHeight: 48, justifyContent: "center" }}
    >
      {face}
    </Pressable>
  );
}
