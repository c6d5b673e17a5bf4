import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { IconButton } from "@/features/ui/IconButton";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Take } from "@/shared/contract/take";
import { bandWords, effortWords, warmedWords, whenWords } from "./noteWords";
import { inTune } from "./takeOfHeard";

export interface TakeListProps {
  /** newest first */
  takes: readonly Take[];
  erasing: boolean;
  onErase: (id: string) => void;
}

/** What was sung when; each take can be erased, and the voice is then what the others say. */
export function TakeList({ takes, erasing, onErase }: TakeListProps) {
  const [asked, setAsked] = useState<string | null>(null);
  return (
    <View role="region" aria-label="Takes" style={{ gap: 4 }}>
      <Heading level={2}>Takes</Heading>
      <View role="list">
        {takes.map((take) => (
          <View
            key={take.id}
            role="listitem"
            testID="take-row"
            style={{ borderTopWidth: 1, borderColor: colors.line, paddingVertical: 8 }}
          >
            <View style={{ flexDirection: "row", alignItems: "center", gap: 12 }}>
              <View style={{ flexGrow: 1, flexShrink: 1 }}>
                <Text variant="strong">{bandWords(inTune(take.range, take.tuningCents))}</Text>
                <Text variant="small" tone="soft">
                  {factsOf(take)}
                </Text>
              </View>
              <IconButton
                icon="trash"
                label={`Erase the take of ${whenWords(take.sungAt)}`}
                onPress={() => setAsked(asked === take.id ? null : take.id)}
                testID="take-erase"
              />
            </View>
            {asked === take.id && (
              <View role="group" aria-label="Erase this take?" style={{ gap: 8, paddingVertical: 8 }}>
                <Text variant="small">
                  Erase this take? Your notes are then worked out again without it. This cannot be undone.
                </Text>
                <View style={{ flexDirection: "row", gap: 10 }}>
                  <Button small kind="secondary" label="Keep it" onPress={() => setAsked(null)} />
                  <Button
                    small
                    label="Erase"
                    busy={erasing}
                    onPress={() => onErase(take.id)}
                    testID="take-erase-confirm"
                  />
                </View>
              </View>
            )}
          </View>
        ))}
      </View>
    </View>
  );
}

function factsOf({ sungAt, effort, warmedUp }: Take): string {
  const felt = effort === null ? null : `felt ${effort} of 5, ${effortWords[effort - 1]}`;
  return [whenWords(sungAt), warmedWords(warmedUp), felt].filter((fact) => fact !== null).join(" · ");
}
