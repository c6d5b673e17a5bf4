import { View } from "react-native";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { effortWords } from "@/shared/voice/effortWords";

type Effort = "1" | "2" | "3" | "4" | "5" | "unsaid";
const options = (["1", "2", "3", "4", "5"] as const).map((value) => ({ value, label: value }));

/** How the key felt, from 1, easy, to 5, straining. */
export function EffortQuestion({ effort, onFelt }: { effort: number | null; onFelt: (effort: number) => void }) {
  return (
    <View style={{ gap: 6 }}>
      <Text variant="strong">How did that feel?</Text>
      <Segmented<Effort>
        label="How it felt, from 1, easy, to 5, straining"
        options={options}
        value={effort === null ? "unsaid" : (String(effort) as Effort)}
        onChange={(value) => onFelt(Number(value))}
        testID="try-effort"
      />
      <View style={{ flexDirection: "row", justifyContent: "space-between" }}>
        <Text variant="tiny" tone="soft">
          1 easy
        </Text>
        <Text variant="tiny" aria-live="polite">
          {effort === null ? "" : effortWords[effort - 1]}
        </Text>
        <Text variant="tiny" tone="soft">
          5 straining
        </Text>
      </View>
    </View>
  );
}
