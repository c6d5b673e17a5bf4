import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { noteWord } from "../noteWords";
import { farthest, type GuidedEvent, type GuidedRun } from "./guidedSteps";

export interface GuidedTurnProps {
  run: GuidedRun;
  onTell: (event: GuidedEvent) => void;
}

/** Between the ends: what was found, a rest, and the way up only if the singer wants it. */
export function GuidedTurn({ run, onTell }: GuidedTurnProps) {
  const lowest = farthest(run, "low");
  return (
    <Screen
      title="The low end is done"
      back="/voice"
      closes
      hideBar
      footer={
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
          <Button
            kind="secondary"
            label="Finish here"
            onPress={() => onTell({ kind: "finish" })}
            testID="guided-finish"
          />
          <Button label="Now go up" onPress={() => onTell({ kind: "up" })} style={{ flexGrow: 1 }} testID="guided-up" />
        </View>
      }
    >
      <View style={{ gap: 18, paddingTop: 12, maxWidth: 560 }} testID="guided-turn">
        <Card style={{ gap: 6 }}>
          <Heading level={2}>Your lowest held note</Heading>
          <Text variant="number" style={{ lineHeight: 52 }}>
            {lowest ? noteWord(lowest.midi) : "–"}
          </Text>
          {lowest && <Text tone="soft">{`Held for ${lowest.heldS.toFixed(1)} s.`}</Text>}
        </Card>
        <Text>
          {`Rest a moment and sip some water. Going up starts again from ${run.home === null ? "the middle" : noteWord(run.home)}.`}
        </Text>
        <Text tone="soft">If anything hurts, tickles or sounds hoarse, finish here. What you held is kept.</Text>
      </View>
    </Screen>
  );
}
