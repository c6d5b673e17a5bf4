import { View } from "react-native";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { highestShift, lowestShift, shiftWords } from "./retuneWords";

export interface ShiftStepperProps {
  /** what is shifted, in words */
  name: string;
  /** null where the strings differ */
  value: number | null;
  onChange: (value: number) => void;
  testID: string;
}

/** Semitones down or up. */
export function ShiftStepper({ name, value, onChange, testID }: ShiftStepperProps) {
  const now = value ?? 0;
  return (
    <View role="group" aria-label={`Shift of ${name}`} style={{ flexDirection: "row", alignItems: "center" }}>
      <IconButton
        icon="minus"
        label={`A semitone down: ${name}`}
        disabled={now <= lowestShift}
        onPress={() => onChange(now - 1)}
        testID={`${testID}-down`}
      />
      <Text variant="label" testID={testID} style={{ minWidth: 124, textAlign: "center" }}>
        {value === null ? "each its own" : shiftWords(value)}
      </Text>
      <IconButton
        icon="plus"
        label={`A semitone up: ${name}`}
        disabled={now >= highestShift}
        onPress={() => onChange(now + 1)}
        testID={`${testID}-up`}
      />
    </View>
  );
}
