import { View } from "react-native";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { effortWords } from "../noteWords";

export interface AfterSingingProps {
  warmedUp: boolean | null;
  effort: number | null;
  onChange: (warmedUp: boolean | null, effort: number | null) => void;
}

type Warmed = "yes" | "no" | "unsaid";
type Effort = "1" | "2" | "3" | "4" | "5" | "unsaid";

const warmedOptions = [
  { value: "no", label: "Not yet" },
  { value: "yes", label: "Yes" },
] as const;
const effortOptions = (["1", "2", "3", "4", "5"] as const).map((value) => ({ value, label: value }));

/** Two short questions; neither has to be answered. */
export function AfterSinging({ warmedUp, effort, onChange }: AfterSingingProps) {
  const warmed: Warmed = warmedUp === null ? "unsaid" : warmedUp ? "yes" : "no";
  const felt = effort === null ? "unsaid" : (String(effort) as Effort);
  return (
    <View style={{ gap: 14 }}>
      <View style={{ gap: 6 }}>
        <Text variant="label">How did it feel?</Text>
        <Segmented<Effort>
          label="How it felt, from 1, easy, to 5, straining"
          options={effortOptions}
          value={felt}
          onChange={(value) => onChange(warmedUp, Number(value))}
          testID="take-effort"
        />
        <View style={{ flexDirection: "row", justifyContent: "space-between" }}>
          <Text variant="tiny" tone="soft">
            1 easy
          </Text>
          <Text variant="tiny" tone="ink" aria-live="polite">
            {effort === null ? "" : effortWords[effort - 1]}
          </Text>
          <Text variant="tiny" tone="soft">
            5 straining
          </Text>
        </View>
      </View>
      <View style={{ gap: 6 }}>
        <Text variant="label">Were you warmed up?</Text>
        <Segmented<Warmed>
          label="Warmed up"
          options={warmedOptions}
          value={warmed}
          onChange={(value) => onChange(value === "yes", effort)}
          testID="take-warmed"
        />
      </View>
    </View>
  );
}
