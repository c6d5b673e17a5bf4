import { useQuery } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Voice } from "@/shared/contract/voice";
import { BeforeSinging } from "./BeforeSinging";
import { useChosenVoiceId } from "./chosenVoice";
import { failureWords } from "./failureWords";
import { KeepTake } from "./KeepTake";
import { ListeningScreen } from "./ListeningScreen";
import { bandWords, warmedWords, whenWords } from "./noteWords";
import type { HeardTake, RecorderState } from "./recorder/recorder";
import { useRecorder, type Recorder } from "./recorder/useRecorder";
import { TakeFailure } from "./TakeFailure";
import { inTune } from "./takeOfHeard";
import { TakeResult } from "./TakeResult";
import { newVoice, useKeepTake, voiceQueries } from "./voiceQueries";

export interface SingScreenProps {
  /** the take is in its voice, and the singer goes on to it or to the songs */
  onKept: (next: "voice" | "songs") => void;
}

/** From the first press to the result: one page, one step of the recorder at a time. */
export function SingScreen({ onKept }: SingScreenProps) {
  const recorder = useRecorder();
  const { state, restoring } = recorder;
  useFocusOnChange(state.step);
  return (
    <>
      <Step recorder={recorder} restoring={restoring} onKept={onKept} />
      <LiveText hidden>{announcement(state)}</LiveText>
    </>
  );
}

function Step({
  recorder,
  restoring,
  onKept,
}: {
  recorder: Recorder;
  restoring: boolean;
  onKept: SingScreenProps["onKept"];
}) {
  const { state, live, sing, stop, leave, felt } = recorder;
  switch (state.step) {
    case "idle":
    case "asking":
      return restoring ? (
        <Waiting words="Looking for your last take" />
      ) : (
        <BeforeSinging asking={state.step === "asking"} onSing={sing} />
      );
    case "listening":
    case "stopping":
      return <ListeningScreen live={live} seconds={state.seconds} stopping={state.step === "stopping"} onStop={stop} />;
    case "judging":
      return <Waiting words={`Reading ${Math.max(1, Math.round(state.seconds))} s of singing`} />;
    case "failure":
      return <TakeFailure failure={state.failure} onAgain={sing} />;
    case "result":
      return (
        <Result
          take={state.take}
          onAgain={sing}
          onFelt={felt}
          onKept={(next) => {
            leave();
            onKept(next);
          }}
        />
      );
  }
}

function Waiting({ words }: { words: string }) {
  return (
    <Screen title="What was heard" crumb={{ label: "Voice", href: "/voice" }}>
      <Skeleton words={words} bars={[{ height: 52, width: 230 }, { height: 380 }]} />
    </Screen>
  );
}

interface ResultProps {
  take: HeardTake;
  onAgain: () => void;
  onFelt: Recorder["felt"];
  onKept: SingScreenProps["onKept"];
}

function Result({ take, onAgain, onFelt, onKept }: ResultProps) {
  const voices = useQuery(voiceQueries.list());
  const chosenId = useChosenVoiceId();
  const keep = useKeepTake();
  const [first] = useState(() => newVoice("My voice"));
  const [choosing, setChoosing] = useState<"voice" | "songs" | null>(null);
  const keepIn = (voice: Voice, next: "voice" | "songs") =>
    keep.mutate({ heard: take, voice }, { onSuccess: () => onKept(next) });
  const startKeeping = (next: "voice" | "songs") => (many ? setChoosing(next) : keepIn(first, next));
  const many = (voices.data ?? []).length > 0;
  const when = [whenWords(take.sungAt), warmedWords(take.warmedUp)].filter((fact) => fact !== null).join(", ");
  return (
    <Screen
      title="What was heard"
      subtitle={when}
      crumb={{ label: "Voice", href: "/voice" }}
      wide
      footer={
        choosing !== null ? null : (
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
            <Button kind="secondary" icon="again" label="Sing again" onPress={onAgain} testID="sing-again" />
            <Button
              label="Keep this voice"
              busy={keep.isPending || voices.isPending}
              onPress={() => startKeeping("voice")}
              style={{ flexGrow: 1 }}
              testID="sing-keep"
            />
          </View>
        )
      }
    >
      <View style={{ gap: 16 }}>
        {keep.error && (
          <Notice kind="error" title="Not kept yet">
            {`${keep.error.message} This take is still here.`}
          </Notice>
        )}
        {choosing !== null && (
          <KeepTake
            voices={voices.data ?? []}
            chosenId={chosenId}
            busy={keep.isPending}
            onKeep={(voice) => keepIn(voice, choosing)}
            onCancel={() => setChoosing(null)}
          />
        )}
        <TakeResult take={take} onAgain={onAgain} onSongs={() => startKeeping("songs")} onFelt={onFelt} />
      </View>
    </Screen>
  );
}

function announcement(state: RecorderState): string {
  if (state.step === "asking") return "Waiting for the microphone.";
  if (state.step === "listening") return "Listening. Sing now.";
  if (state.step === "stopping" || state.step === "judging") return "Stopped. Reading your take.";
  if (state.step === "failure") return failureWords(state.failure).title;
  if (state.step !== "result" || !state.take.report.comfort) return "";
  return `Your comfortable notes: ${bandWords(inTune(state.take.report.comfort, state.take.report.tuningCents))}.`;
}

/** The button that was pressed is gone with its step: the focus goes on to the new heading, or to Stop while listening. */
function useFocusOnChange(step: RecorderState["step"]): void {
  const before = useRef(step);
  useEffect(() => {
    if (before.current === step) return;
    before.current = step;
    if (step === "asking" || step === "stopping" || step === "listening") return;
    document.querySelector<HTMLElement>("h1")?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [step]);
}
