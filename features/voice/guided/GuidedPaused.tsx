import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Screen } from "@/features/ui/Screen";
import { Text } from "@/features/ui/Text";
import { bandWords, noteWord } from "../noteWords";
import { interruptionWords } from "../sing/failureWords";
import { farthest, shownEnds, type GuidedEvent, type GuidedState } from "./guidedSteps";

export interface GuidedPausedProps {
  state: GuidedState & { step: "paused" };
  onTell: (event: GuidedEvent) => void;
}

/** The way broke off before its end: what was held is still here, and three ways on. */
export function GuidedPaused({ state: { run, next, cause }, onTell }: GuidedPausedProps) {
  const low = farthest(run, "low");
  const high = farthest(run, "high");
  const range = shownEnds(run).length > 0;
  return (
    <Screen
      title="Where you left off"
      crumb={{ label: "Voice", href: "/voice" }}
      footer={
        <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
          {range && (
            <Button
              kind="secondary"
              label="Finish here"
              onPress={() => onTell({ kind: "finish" })}
              testID="guided-finish"
            />
          )}
          <Button
            icon="mic"
            label={next === "low" ? "Go on down" : "Go on up"}
            onPress={() => onTell({ kind: "resume" })}
            style={{ flexGrow: 1 }}
            testID="guided-resume"
          />
        </View>
      }
    >
      <View style={{ gap: 18, paddingTop: 12, maxWidth: 560 }} testID="guided-paused">
        <Text>{`${cause === "reloaded" ? "This page was left or loaded again" : interruptionWords(cause)}. What you held until then is still here.`}</Text>
        <Card style={{ gap: 6 }}>
          <Heading level={2}>Held so far</Heading>
          <Text variant="number" style={{ lineHeight: 52 }}>
            {low && high ? (range ? bandWords({ lowMidi: low.midi, highMidi: high.midi }) : noteWord(low.midi)) : "–"}
          </Text>
          <Text tone="soft">
            {run.held.length === 1 ? "One note, held for itself." : `${run.held.length} notes, each held for itself.`}
          </Text>
        </Card>
        <Text tone="soft">If anything hurts, tickles or sounds hoarse, finish here.</Text>
        <Button
          kind="text"
          icon="again"
          label="Start anew instead"
          onPress={() => onTell({ kind: "leave" })}
          flush
          testID="guided-anew"
        />
      </View>
    </Screen>
  );
}
