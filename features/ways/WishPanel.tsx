import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Chip } from "@/features/ui/Chip";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useWishes, wishWords } from "./wishes";

const highest = 9;

/** What to do without, folded away until it is wanted. */
export function WishPanel() {
  const [open, setOpen] = useState(false);
  const [wishes, setWishes] = useWishes();
  const turn = (name: "noBarre" | "noCapo" | "noRetune") => setWishes({ ...wishes, [name]: !wishes[name] });
  return (
    <View>
      <View style={{ flexDirection: "row", alignItems: "center", flexWrap: "wrap", columnGap: 8 }}>
        <Button
          kind="text"
          small
          label={open ? "Close wishes" : "Your wishes"}
          icon={open ? "up" : "down"}
          expanded={open}
          onPress={() => setOpen(!open)}
          testID="wishes"
          style={{ marginLeft: -8 }}
        />
        {!open && (
          <Text variant="small" tone="soft">
            {wishWords(wishes)}
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
            <Chip label="Avoid barres" selected={wishes.noBarre} onPress={() => turn("noBarre")} />
            <Chip label="Avoid a capo" selected={wishes.noCapo} onPress={() => turn("noCapo")} />
            <Chip label="Avoid retuning" selected={wishes.noRetune} onPress={() => turn("noRetune")} />
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
        </View>
      )}
    </View>
  );
}
