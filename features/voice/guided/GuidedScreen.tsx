import { useQuery } from "@tanstack/react-query";
import { useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { newId } from "@/features/api/newId";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import type { Voice } from "@/shared/contract/voice";
import { KeepTake } from "../sing/KeepTake";
import { RefusalPage } from "../sing/RefusalPage";
import { noteWord, whenWords } from "../noteWords";
import { useSingingVoice } from "../useSingingVoice";
import { newVoice, useKeepHolds, voiceQueries } from "../voiceQueries";
import { BeforeGuided } from "./BeforeGuided";
import { GuidedPaused } from "./GuidedPaused";
import { GuidedResult } from "./GuidedResult";
import { GuidedStep, type OnTheWay } from "./GuidedStep";
import type { GuidedFindings, GuidedState } from "./guidedSteps";
import { dropUnkeptRun } from "./unkeptRun";
import { GuidedTurn } from "./GuidedTurn";
import { announcement, failedWords } from "./guidedWords";
import { isUnder16, rememberAge } from "./singerAge";
import { takeOfHolds } from "./takeOfHolds";
import { useGuided } from "./useGuided";

export interface GuidedScreenProps {
  /** the voice whose ends are looked for; the chosen one unless said */
  voiceId: string | undefined;
  onKept: () => void;
}

/** Lowest and highest note under guidance: cautions first, one note at a time, and what was found. */
export function GuidedScreen({ voiceId, onKept }: GuidedScreenProps) {
  const { state, live, tell } = useGuided();
  const { singing, voice } = useSingingVoice(voiceId);
  const home = singing ? Math.round((singing.comfort.lowMidi + singing.comfort.highMidi) / 2) : null;
  useFocusOnChange(state.step);
  const start = (under16: boolean) =>
    tell({ kind: "start", id: newId(), startedAt: new Date().toISOString(), home, under16 });
  return (
    <>
      {state.step === "before" && (
        <BeforeGuided
          key={voice?.id ?? ""}
          from={home === null ? null : noteWord(home)}
          under16={isUnder16(voice?.id ?? null)}
          onStart={start}
        />
      )}
      {state.step === "paused" && <GuidedPaused state={state} onTell={tell} />}
      {state.step === "failed" && <Failed why={state.why} onAgain={() => tell({ kind: "leave" })} />}
      {state.step === "turn" && <GuidedTurn run={state.run} onTell={tell} />}
      {state.step === "done" && (
        <Result
          state={state}
          chosenId={voice?.id ?? null}
          onFound={(change) => tell({ kind: "found", change })}
          onAgain={() => tell({ kind: "leave" })}
          onKept={onKept}
        />
      )}
      {onTheWay(state) && <GuidedStep state={state} live={live} onTell={tell} />}
      <LiveText hidden>{announcement(state)}</LiveText>
    </>
  );
}

const pages = new Set<GuidedState["step"]>(["before", "paused", "failed", "turn", "done"]);

function onTheWay(state: GuidedState): state is OnTheWay {
  return !pages.has(state.step);
}

interface ResultProps {
  state: GuidedState & { step: "done" };
  chosenId: string | null;
  onFound: (change: Partial<GuidedFindings>) => void;
  onAgain: () => void;
  onKept: () => void;
}

function Result({ state, chosenId, onFound, onAgain, onKept }: ResultProps) {
  const voices = useQuery(voiceQueries.list());
  const keep = useKeepHolds();
  const [first] = useState(() => newVoice("My voice"));
  const [choosing, setChoosing] = useState(false);
  const keepIn = (voice: Voice) =>
    keep.mutate(
      { take: takeOfHolds(state.run, state.findings, voice.id), voice },
      {
        onSuccess: () => {
          rememberAge(voice.id, state.run.under16);
          dropUnkeptRun();
          onKept();
        },
      },
    );
  const many = (voices.data ?? []).length > 0;
  return (
    <Screen
      title="What you can hold"
      subtitle={`${whenWords(state.run.startedAt)}, held note by note`}
      crumb={{ label: "Voice", href: "/voice" }}
      wide
      footer={
        choosing ? null : (
          <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
            <Button kind="secondary" label="Not this time" onPress={onAgain} testID="guided-drop" />
            <Button
              label="Keep these notes"
              busy={keep.isPending || voices.isPending}
              onPress={() => (many ? setChoosing(true) : keepIn(first))}
              style={{ flexGrow: 1 }}
              testID="guided-keep"
            />
          </View>
        )
      }
    >
      <View style={{ gap: 16, paddingTop: 8 }}>
        {keep.error && (
          <Notice kind="error" title="Not kept yet">
            {`${keep.error.message} These notes are still here.`}
          </Notice>
        )}
        {choosing && (
          <KeepTake
            voices={voices.data ?? []}
            chosenId={chosenId}
            busy={keep.isPending}
            onKeep={keepIn}
            onCancel={() => setChoosing(false)}
          />
        )}
        <GuidedResult state={state} onFound={onFound} />
      </View>
    </Screen>
  );
}

function Failed({ why, onAgain }: { why: (GuidedState & { step: "failed" })["why"]; onAgain: () => void }) {
  const words = failedWords(why);
  return (
    <RefusalPage
      words={words}
      again={{ icon: "again", label: "Start again", onPress: onAgain, testID: "guided-restart" }}
      except="guided"
      testID={`guided-failed-${why}`}
    />
  );
}

/** The button that was pressed is gone with its page: the focus goes on to the new heading. */
function useFocusOnChange(step: GuidedState["step"]): void {
  const page = pages.has(step) ? step : "way";
  const before = useRef<string>(page);
  useEffect(() => {
    if (before.current === page) return;
    before.current = page;
    document.querySelector<HTMLElement>("h1")?.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, [page]);
}
