import { useEffect, useMemo, useReducer, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import { glyphs } from "@/shared/music/pitch";
import { formParts, tempoOfTaps } from "@/shared/songs/formSketch";
import { reconcileKeys } from "@/shared/songs/reconcileKeys";
import { deviceDraft } from "@/features/api/deviceDraft";
import { useSaveSong } from "../songQueries";
import { AnswerStep, NoAnswer } from "./AnswerStep";
import { BeatStep } from "./BeatStep";
import { takeForm, type ChartChange } from "./chartChanges";
import { FormStep } from "./FormStep";
import { FoundSoFar } from "./FoundSoFar";
import { HomeStep, type HomeEars } from "./HomeStep";
import { beginListening, listening, type Listening } from "./listening";

export interface RecordingScreenProps extends HomeEars {
  song: Song;
  /** highest fret for a capo on the instrument in hand, 0 for one without */
  capoTo: number;
}

type Step = "beat" | "parts" | "home" | "answer";
const steps = [
  { value: "beat", label: "Beat" },
  { value: "parts", label: "Parts" },
  { value: "home", label: "Home note" },
  { value: "answer", label: "Answer" },
] as const;
const titles: Record<Step, string> = {
  beat: "First, feel the beat",
  parts: "Then mark the parts",
  home: "Find the home note",
  answer: "Chart and recording",
};
/** Runs on over a reload, as the recording does. */
const clock = () => (performance.timeOrigin + performance.now()) / 1000;
const drafts = deviceDraft<Listening>("listening", "tab");

const besides = webStyle({
  display: "grid",
  gridTemplateColumns: "minmax(0, 1fr) minmax(300px, 392px)",
  columnGap: 40,
  alignItems: "start",
});

/** Does the chart fit the recording? Led through as one listens: beat, parts, home note, answer. Every step may be left out. */
export function RecordingScreen({ song, capoTo, hum, sing }: RecordingScreenProps) {
  const layout = useLayout();
  const phone = layout === "phone";
  const wide = layout === "wide";
  const [step, setStep] = useState<Step>("beat");
  const [state, dispatch] = useReducer(
    listening,
    null,
    () => drafts.load(song.id) ?? beginListening(song.tempo, song.beatsPerBar),
  );
  useEffect(() => drafts.save(song.id, state), [song.id, state]);
  const [taken, setTaken] = useState<{ before: Song; said: string } | null>(null);
  const save = useSaveSong();
  const tempo = useMemo(() => state.tempo ?? tempoOfTaps(state.taps)?.tempo ?? null, [state.tempo, state.taps]);
  const beat = tempo === null ? null : { tempo, beatsPerBar: state.beatsPerBar };
  const chartKey = song.chart.trim() === "" ? null : song.writtenKey;
  const { home } = state;
  const answer = useMemo(
    () => (chartKey && home ? reconcileKeys(chartKey, { tonic: home.tonic, mode: home.mode }, capoTo) : null),
    [chartKey, home, capoTo],
  );
  const take = ({ song: changed, said }: ChartChange) =>
    save.mutate(changed, { onSuccess: () => setTaken({ before: song, said }) });
  const undo = () => {
    if (taken) save.mutate({ ...taken.before, revision: song.revision }, { onSuccess: () => setTaken(null) });
  };
  const next = steps[steps.findIndex(({ value }) => value === step) + 1];
  return (
    <Screen
      title="Chart and recording"
      subtitle={phone ? song.title : null}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide={wide}
      footer={
        next && (
          <Button
            small={!phone}
            label={`Next: ${next.label.toLowerCase()}`}
            onPress={() => setStep(next.value)}
            testID="next-step"
          />
        )
      }
    >
      <View style={wide ? besides : null}>
        <View style={{ gap: 20, paddingTop: phone ? 12 : 0 }}>
          <Segmented
            label="Steps of listening"
            value={step}
            options={steps}
            onChange={setStep}
            testID="listening-step"
          />
          {taken && (
            <Notice
              kind="good"
              testID="change-taken"
              title={taken.said}
              action={
                <Button kind="text" small label="Undo" busy={save.isPending} onPress={undo} testID="undo-change" />
              }
            >
              The song is kept.
            </Notice>
          )}
          {save.error && (
            <Notice kind="error" title="The song is not changed">
              {`${save.error.message} What you noted here is still there.`}
            </Notice>
          )}
          <Heading level={2}>{titles[step]}</Heading>
          {step === "beat" && <BeatStep state={state} dispatch={dispatch} clock={clock} />}
          {step === "parts" && (
            <FormStep
              state={state}
              dispatch={dispatch}
              clock={clock}
              tempo={tempo}
              busy={save.isPending}
              onTake={() => take(takeForm(song, formParts(state.marks, state.endS ?? 0, beat), beat))}
            />
          )}
          {step === "home" && (
            <>
              <HomeStep state={state} dispatch={dispatch} chart={song.writtenKey} hum={hum} sing={sing} />
              <Text variant="small" tone="soft">
                {chartKey
                  ? `The chart is written in ${glyphs(chartKey.tonic)}.`
                  : "This song has no chart with a key yet."}
              </Text>
            </>
          )}
          {step === "answer" &&
            (answer ? (
              <AnswerStep song={song} answer={answer} busy={save.isPending} onTake={take} />
            ) : (
              <NoAnswer songId={song.id} missing={chartKey ? "home" : "chart"} />
            ))}
        </View>
        {wide && <FoundSoFar state={state} tempo={tempo} chart={chartKey} />}
      </View>
    </Screen>
  );
}
