import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import { decidedOn } from "./decide";
import type { SongKeys } from "../useSongKeys";

export interface DecidedLineProps {
  keys: Pick<SongKeys, "decision" | "decided" | "saving" | "undo">;
}

/** When, why and with which voice the key was chosen, and the way back. */
export function DecidedLine({ keys: { decision, decided, saving, undo } }: DecidedLineProps) {
  if (!decision || !decided) return null;
  const since = `since ${decidedOn(decision)}`;
  return (
    <View testID="decided" style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4 }}>
      <Text variant="small" tone="soft" style={{ flexShrink: 1 }}>
        {decided.otherVoice === null
          ? `Your key ${since}. ${decision.reason}`
          : `${decided.sign} is decided for ${decided.otherVoice} ${since}. It was not judged for the voice you have chosen now.`}
      </Text>
      <Button
        kind="text"
        small
        label="Undo"
        accessibleName="Undo my key"
        disabled={saving}
        onPress={undo}
        testID="undo-key"
        style={{ marginVertical: -6 }}
      />
    </View>
  );
}
