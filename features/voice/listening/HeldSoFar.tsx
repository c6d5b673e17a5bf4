import { View } from "react-native";
import { SpanLadder } from "@/features/span/SpanLadder";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { bandWords, noteWord, semitonesOf } from "../noteWords";
import type { LiveSound } from "../recorder/liveSound";
import { longestNote, marksOfTimes } from "../timeOnNotes";
import { useHeard } from "./useHeard";
import { semitoneWords } from "@/shared/music/moveWords";

export interface HeldSoFarProps {
  live: LiveSound;
  width: number;
  /** for the ladder and the words over it */
  height: number;
}

/** Steps of a ladder, the largest first. */
const steps = [18, 15, 12] as const;
const around = 2;
const leastShown = 12;
const wordsHeight = 76;

/** The column that grows while the singer sings: every note held so far, and for how long. */
export function HeldSoFar({ live, width, height }: HeldSoFarProps) {
  // Tenths of a second are as fine as the marks can show.
  useHeard(live, ({ held }) => [...held].map(([midi, seconds]) => `${midi}:${seconds.toFixed(1)}`).join(" "));
  const times = [...live.held].map(([midi, seconds]) => ({ midi, seconds })).sort((a, b) => a.midi - b.midi);
  const low = times[0]?.midi;
  const high = times.at(-1)?.midi;
  if (low === undefined || high === undefined) {
    return (
      <View style={{ minHeight: height, gap: 4 }}>
        <Heading level={2}>Held so far</Heading>
        <Text variant="small" tone="soft">
          Nothing yet. Each note you hold is added here.
        </Text>
      </View>
    );
  }
  const range = { lowMidi: low, highMidi: high };
  const spare = Math.max(0, leastShown - (high - low));
  const scale = { low: low - around - Math.floor(spare / 2), high: high + around + Math.ceil(spare / 2) };
  const step = steps.find((one) => (scale.high - scale.low + 1) * one <= height - wordsHeight) ?? 12;
  const longest = longestNote(times);
  const most = longest ? ` Longest: ${noteWord(longest.midi)}, ${longest.seconds.toFixed(1)} seconds.` : "";
  return (
    <View style={{ minHeight: height, gap: 4 }} testID="held-so-far">
      <Heading level={2}>Held so far</Heading>
      <Text variant="small" tone="soft">
        {`${bandWords(range)}, ${semitoneWords(semitonesOf(range))}`}
      </Text>
      <SpanLadder
        voice={{ range, comfort: range }}
        marks={marksOfTimes(times)}
        step={step}
        width={width}
        scale={scale}
        summary={`Held so far: ${bandWords(range)}.${most}`}
      />
    </View>
  );
}
