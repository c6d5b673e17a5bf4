import { useEffect, useState } from "react";
import { Pressable, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors, sizes } from "@/features/ui/theme";
import { formParts, partNames, type PartName } from "@/shared/songs/formSketch";
import type { StepProps } from "./BeatStep";
import { clockWords } from "@/features/ui/clockWords";
import { useTap } from "./useTap";

export interface FormStepProps extends StepProps {
  tempo: number | null;
  busy: boolean;
  /** writes the parts into the chart */
  onTake: () => void;
}

/** Step 2: the parts, marked while the recording plays elsewhere. */
export function FormStep({ state, dispatch, clock, tempo, busy, onTake }: FormStepProps) {
  const { marks, startedS, endS, beatsPerBar } = state;
  const running = startedS !== null && endS === null;
  const now = useSeconds(running ? startedS : null, clock);
  const beat = tempo === null ? null : { tempo, beatsPerBar };
  const until = endS ?? Math.max(now, marks.at(-1)?.atS ?? 0);
  const parts = formParts(marks, until, beat);
  return (
    <View style={{ gap: 16 }}>
      <Text>
        Let the recording play from its beginning. Press the name of each part as it begins; the first press starts the
        clock.
      </Text>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
        {partNames.map((name) => (
          <PartButton
            key={name}
            name={name}
            ended={endS !== null}
            sounding={marks.at(-1)?.name === name && running}
            onBegin={() => dispatch({ kind: "part", name, atS: clock() })}
          />
        ))}
      </View>
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10, alignItems: "center" }}>
        <Text variant="display" style={{ minWidth: 96 }} testID="form-clock">
          {clockWords(endS ?? now)}
        </Text>
        <Button
          kind="secondary"
          small
          label="The song is over"
          disabled={!running}
          onPress={() => dispatch({ kind: "over", atS: clock() })}
          testID="form-over"
        />
        <Button
          kind="text"
          small
          label="Undo the last mark"
          disabled={marks.length === 0}
          onPress={() => dispatch({ kind: "undoPart" })}
          testID="form-undo"
        />
      </View>
      <LiveText hidden>
        {marks.length === 0 ? "" : `${marks.at(-1)?.name} marked at ${clockWords(marks.at(-1)?.atS ?? 0)}.`}
      </LiveText>
      {parts.length > 0 && (
        <View
          role="list"
          aria-label="Parts heard"
          testID="form-parts"
          style={{ borderTopWidth: 1.5, borderColor: colors.ink }}
        >
          {parts.map(({ label, atS, bars }, index) => (
            <View
              key={index}
              role="listitem"
              style={{
                flexDirection: "row",
                gap: 16,
                minHeight: 44,
                alignItems: "center",
                borderBottomWidth: 1,
                borderColor: colors.line,
              }}
            >
              <Text variant="mono" tone="soft" style={{ width: 56 }}>
                {clockWords(atS)}
              </Text>
              <Text variant="strong" style={{ flexGrow: 1 }}>
                {label}
              </Text>
              <Text variant="small" tone="soft">
                {running && index === parts.length - 1
                  ? "sounding now"
                  : bars === null
                    ? ""
                    : `${bars} ${bars === 1 ? "bar" : "bars"}`}
              </Text>
            </View>
          ))}
        </View>
      )}
      {marks.length > 0 && tempo === null && (
        <Text variant="small" tone="soft">
          Without a beat the parts have times but no bars. Tap the beat in the step before, and the bars are counted.
        </Text>
      )}
      {endS !== null && (
        <Button
          kind="secondary"
          label="Put these parts into the chart"
          busy={busy}
          onPress={onTake}
          testID="take-form"
        />
      )}
    </View>
  );
}

interface PartButtonProps {
  name: PartName;
  ended: boolean;
  sounding: boolean;
  onBegin: () => void;
}

function PartButton({ name, ended, sounding, onBegin }: PartButtonProps) {
  const tap = useTap(() => {
    if (!ended) onBegin();
  });
  return (
    <Pressable
      role="button"
      aria-label={`${name} begins`}
      disabled={ended}
      testID={`part-${name}`}
      {...tap}
      style={{
        flexGrow: 1,
        flexBasis: "30%",
        minHeight: 64,
        borderRadius: sizes.radius,
        borderWidth: sounding ? 2.5 : 1.5,
        borderColor: colors.plum,
        backgroundColor: sounding ? "var(--soft)" : colors.card,
        alignItems: "center",
        justifyContent: "center",
        opacity: ended ? 0.5 : 1,
      }}
    >
      <Text variant="strong" tone="plum">
        {name}
      </Text>
    </Pressable>
  );
}

/** Seconds since a start, told twice a second; 0 while nothing runs. */
function useSeconds(startedS: number | null, clock: () => number): number {
  const [now, setNow] = useState(0);
  useEffect(() => {
    if (startedS === null) return;
    const timer = setInterval(() => setNow(clock() - startedS), 500);
    return () => clearInterval(timer);
  }, [startedS, clock]);
  return startedS === null ? 0 : now;
}
