import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import type { Decision } from "@/shared/contract/decision";
import { decidedOn } from "./decide";

export interface DecidedLineProps {
  decision: Decision;
  saving: boolean;
  onUndo: () => void;
}

/** When and why the key was chosen, and the way back. */
export function DecidedLine({ decision, saving, onUndo }: DecidedLineProps) {
  return (
    <View testID="decided" style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 4 }}>
      <Text variant="small" tone="soft" style={{ flexShrink: 1 }}>
        {`Your key since ${decidedOn(decision)}. ${decision.reason}`}
      </Text>
      <Button
        kind="text"
        small
        label="Undo"
        accessibleName="Undo my key"
        disabled={saving}
        onPress={onUndo}
        testID="undo-key"
        style={{ marginVertical: -6 }}
      />
    </View>
  );
}
