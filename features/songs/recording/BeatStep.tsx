import { useMemo, useState } from "react";
import { Pressable, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Field } from "@/features/ui/Field";
import { LiveText } from "@/features/ui/LiveText";
import { Segmented } from "@/features/ui/Segmented";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { tempoOfTaps } from "@/shared/songs/formSketch";
import type { Listening, ListeningEvent } from "./listening";
import { useTap } from "./useTap";

export interface StepProps {
  state: Listening;
  dispatch: (event: ListeningEvent) => void;
  /** the clock that taps and marks are given in, seconds */
  clock: () => number;
}

const bars = ["2", "3", "4", "6"].map((value) => ({ value, label: `${value} beats in a bar` }));

/** Step 1: the beat, tapped along with the recording, or written down. */
export function BeatStep({ state, dispatch, clock }: StepProps) {
  const { taps, beatsPerBar } = state;
  const tapped = useMemo(() => tempoOfTaps(taps), [taps]);
  const [typed, setTyped] = useState("");
  const tap = useTap(() => dispatch({ kind: "tap", atS: clock() }));
  const tempo = state.tempo ?? tapped?.tempo ?? null;
  const readings = tapped
    ? [
        { value: String(tapped.half), label: `Half, ${tapped.half}`, there: tapped.half !== null },
        { value: String(tapped.tempo), label: `As tapped, ${tapped.tempo}`, there: true },
        { value: String(tapped.double), label: `Double, ${tapped.double}`, there: tapped.double !== null },
      ].filter(({ there }) => there)
    : [];
  const wrong = typed !== "" && readTempo(typed) === null;
  return (
    <View style={{ gap: 16 }}>
      <Text>
        Let the recording play on another device or in another window, and tap where your foot would. Eight taps are
        enough; a missed one does no harm.
      </Text>
      <Pressable
        role="button"
        aria-label="Tap with the beat"
        testID="tap-beat"
        {...tap}
        style={{
          height: 128,
          borderRadius: sizes.radius,
          borderWidth: 2,
          borderColor: colors.plum,
          backgroundColor: "var(--soft)",
          alignItems: "center",
          justifyContent: "center",
          gap: 4,
        }}
      >
        <Text variant="title" tone="plum">
          Tap with the beat
        </Text>
        <View aria-hidden style={{ flexDirection: "row", gap: 6 }}>
          {Array.from({ length: 8 }, (_, k) => (
            <View
              key={k}
              style={{
                width: 10,
                height: 10,
                borderRadius: 5,
                borderWidth: 1.5,
                borderColor: colors.plum,
                backgroundColor:
                  k < (taps.length === 0 ? 0 : ((taps.length - 1) % 8) + 1) ? colors.plum : "transparent",
              }}
            />
          ))}
        </View>
      </Pressable>
      <LiveText variant="strong" testID="tempo-found">
        {tapped === null
          ? taps.length === 0
            ? tempo === null
              ? "No beat yet."
              : `The song has ${tempo} beats a minute so far.`
            : "Go on tapping."
          : `${tempo} beats a minute${tapped.spread > 0.08 ? ", tapped rather unevenly" : ""}.`}
      </LiveText>
      {tapped && readings.length > 1 && (
        <Segmented
          label="How fast it is counted"
          value={String(tempo)}
          options={readings}
          onChange={(value) => dispatch({ kind: "tempo", tempo: Number(value) })}
        />
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 12, alignItems: "flex-start" }}>
        <View style={{ flexGrow: 1, flexBasis: 150 }}>
          <Field
            label="Or write the tempo"
            value={typed}
            inputMode="numeric"
            hint="Beats a minute"
            error={wrong ? "Give 20 to 400 beats a minute." : undefined}
            onChangeText={(text) => {
              setTyped(text);
              const read = readTempo(text);
              if (read !== null) dispatch({ kind: "tempo", tempo: read });
            }}
            testID="tempo-typed"
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 150 }}>
          <Select
            label="How it is counted"
            value={String(beatsPerBar)}
            options={
              bars.some(({ value }) => value === String(beatsPerBar))
                ? bars
                : [...bars, { value: String(beatsPerBar), label: `${beatsPerBar} beats in a bar` }]
            }
            onChange={(value) => dispatch({ kind: "beatsPerBar", beats: Number(value) })}
          />
        </View>
      </View>
      {taps.length > 0 && (
        <Button kind="text" small label="Begin the taps anew" onPress={() => dispatch({ kind: "forgetTaps" })} flush />
      )}
    </View>
  );
}

function readTempo(text: string): number | null {
  const tempo = /^\s*\d{1,3}\s*$/.test(text) ? Number(text) : NaN;
  return tempo >= 20 && tempo <= 400 ? tempo : null;
}
