import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { EarlierChoice } from "@/shared/contract/decision";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { DecisionHistory, ToldChoice } from "./decisionHistory";

export interface PastChoicesProps {
  history: DecisionHistory;
  /** takes a choice anew; undefined while that cannot be */
  onAgain: ((choice: EarlierChoice) => void) | undefined;
}

/** What was decided before, newest first, what was taken back, and what holds for other voices. */
export function PastChoices({ history: { earlier, takenBack, others }, onAgain }: PastChoicesProps) {
  return (
    <View testID="key-history-list" style={{ gap: 10, borderTopWidth: 1, borderColor: colors.line, paddingTop: 12 }}>
      {earlier.length === 0 ? (
        <Text variant="small" tone="soft">
          Nothing was decided before.
        </Text>
      ) : (
        <Choices title="Before that" choices={earlier} whose={() => null} onAgain={onAgain} />
      )}
      {takenBack.length > 0 && <Choices title="Taken back" choices={takenBack} whose={() => null} onAgain={onAgain} />}
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
  onAgain?: PastChoicesProps["onAgain"];
}

function Choices({ title, choices, whose, onAgain }: ChoicesProps) {
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
            {choice.again && onAgain && <Again of={choice} onPress={onAgain} />}
          </View>
        ))}
      </View>
    </View>
  );
}

function Again({ of: { key, on, again }, onPress }: { of: ToldChoice; onPress: (choice: EarlierChoice) => void }) {
  const sign = glyphs(keySign(key));
  return (
    <Button
      kind="text"
      small
      label="Use again"
      accessibleName={`Use again: ${sign} of ${on}`}
      onPress={() => again && onPress(again)}
      testID="use-again"
    />
  );
}
