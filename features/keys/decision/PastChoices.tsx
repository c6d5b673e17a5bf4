import { View } from "react-native";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { DecisionHistory, ToldChoice } from "./decisionHistory";

/** What was decided before, newest first, and what holds for other voices. */
export function PastChoices({ history: { earlier, others } }: { history: DecisionHistory }) {
  return (
    <View testID="key-history-list" style={{ gap: 10, borderTopWidth: 1, borderColor: colors.line, paddingTop: 12 }}>
      {earlier.length === 0 ? (
        <Text variant="small" tone="soft">
          Nothing was decided before.
        </Text>
      ) : (
        <Choices title="Before that" choices={earlier} whose={() => null} />
      )}
      {others.length > 0 && (
        <Choices title="For other voices" choices={others} whose={({ voice }) => voice ?? "Whoever sings"} />
      )}
    </View>
  );
}

interface ChoicesProps {
  title: string;
  choices: readonly ToldChoice[];
  whose: (choice: ToldChoice) => string | null;
}

function Choices({ title, choices, whose }: ChoicesProps) {
  return (
    <View style={{ gap: 10 }}>
      <Text variant="label">{title}</Text>
      <View role="list" aria-label={title} style={{ gap: 10 }}>
        {choices.map((choice, k) => (
          <View key={k} role="listitem" testID="past-choice" style={{ flexDirection: "row", gap: 14 }}>
            <View style={{ width: 40 }}>
              <KeySign of={choice.key} size={22} tone="soft" stacked />
            </View>
            <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>
              <Text variant="small">
                {[whose(choice), choice.on, choice.way].filter((part) => part !== null).join(" · ")}
              </Text>
              <Text variant="tiny" tone="soft">
                {choice.reason}
              </Text>
            </View>
          </View>
        ))}
      </View>
    </View>
  );
}
