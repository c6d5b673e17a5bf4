import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Chip } from "@/features/ui/Chip";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { colors } from "@/features/ui/theme";
import type { Instrument } from "@/shared/instruments/instrument";
import { useWishes } from "./useWishes";
import { knownOn, wishWords } from "./wishes";

const highest = 9;

interface WishPanelProps {
  instrument: Instrument;
  songId: string;
  open: boolean;
  onOpen: (open: boolean) => void;
}

/** What to do without and which shapes are known, folded away until it is wanted. */
export function WishPanel({ instrument, songId, open, onOpen }: WishPanelProps) {
  const [wishes, setWishes] = useWishes();
  const known = knownOn(wishes, instrument).length;
  const turn = (name: "noBarre" | "noCapo" | "neverRetune" | "keepRinging") =>
    setWishes({ ...wishes, [name]: !wishes[name] });
  return (
    <View>
      <View style={{ flexDirection: "row", alignItems: "center", flexWrap: "wrap", columnGap: 8 }}>
        <Button
          kind="text"
          small
          label={open ? "Close wishes" : "Your wishes"}
          icon={open ? "up" : "down"}
          expanded={open}
          onPress={() => onOpen(!open)}
          testID="wishes"
          style={{ marginLeft: -8 }}
        />
        {!open && (
          <Text variant="small" tone="soft">
            {wishWords(wishes, instrument)}
          </Text>
        )}
      </View>
      {open && (
        <View
          style={{
            borderTopWidth: 1,
            borderBottomWidth: 1,
            borderColor: colors.line,
            paddingVertical: 8,
            marginBottom: 8,
          }}
        >
          <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8 }}>
            <Chip label="No barre" selected={wishes.noBarre} onPress={() => turn("noBarre")} />
            <Chip label="No capo" selected={wishes.noCapo} onPress={() => turn("noCapo")} />
            <Chip label="Never retune on stage" selected={wishes.neverRetune} onPress={() => turn("neverRetune")} />
            <Chip label="Keep strings ringing" selected={wishes.keepRinging} onPress={() => turn("keepRinging")} />
          </View>
          <View style={{ flexDirection: "row", alignItems: "center" }}>
            <Text variant="small" style={{ minWidth: 128 }} aria-live="polite">
              {`Highest capo: fret ${wishes.highestCapo}`}
            </Text>
            <IconButton
              icon="minus"
              label="Highest capo one fret lower"
              disabled={wishes.highestCapo <= 1}
              onPress={() => setWishes({ ...wishes, highestCapo: wishes.highestCapo - 1 })}
            />
            <IconButton
              icon="plus"
              label="Highest capo one fret higher"
              disabled={wishes.highestCapo >= highest}
              onPress={() => setWishes({ ...wishes, highestCapo: wishes.highestCapo + 1 })}
            />
          </View>
          <Text variant="small" tone="soft" aria-live="polite">
            {known === 0
              ? "Tick the shapes you know under the grids below; ways made of them move up."
              : `You know ${known} ${known === 1 ? "shape" : "shapes"} in this tuning. Ways made of them move up.`}
          </Text>
          <View style={{ paddingVertical: 12 }}>
            <TextLink
              href={{ pathname: "/known-shapes", params: { instrument: instrument.id, song: songId } }}
              testID="known-shapes"
            >
              Shapes I know
            </TextLink>
          </View>
        </View>
      )}
    </View>
  );
}
