import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import type { Song } from "@/shared/contract/song";
import { measureTake } from "@/shared/keys/measureTake";
import type { TakeMeasures } from "@/shared/keys/takeMeasures";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { type BackingPlayer, useBacking } from "../backing/useBacking";
import { recall, remember } from "./tabMemory";
import type { HeardTry, TryRecorder } from "./singing/tryRecorder";
import { countOnly, type TriedKey, tryPlan, type TryWishes, usualWishes } from "./setup/tryWishes";

/** What belongs to a take that waits to be kept. */
interface Waiting {
  key: TriedKey;
  wishes: TryWishes;
  /** when in the take the plan's time 0 was heard; null where nothing told the singer the time */
  startS: number | null;
}

/** A take that was sung and measured, and is not kept yet. */
export interface MeasuredTry extends Waiting {
  take: HeardTry;
  plan: BackingPlan | null;
  /** null where the song's tune is not known */
  measures: TakeMeasures | null;
}

export interface Try {
  wishes: TryWishes;
  setWishes: (wishes: TryWishes) => void;
  /** of the key and wishes that stand now */
  plan: BackingPlan | null;
  backing: BackingPlayer;
  /** the take that waits */
  measured: MeasuredTry | null;
  /** how it felt, 1 to 5; null while it is not said */
  effort: number | null;
  felt: (effort: number) => void;
  /** Forgets the take. */
  forget: () => void;
  /** seconds between the start of the take and the plan's time 0, while it is sung */
  startS: () => number | null;
}

/** The end of the last note rings out. */
const ringS = 0.9;
const lookMs = 250;

/** Runs a try: microphone first, then the count-in; what was sung is laid on the tune. */
export function useTry(song: Song, { tonic, shift }: TriedKey, recorder: TryRecorder): Try {
  const wishesName = `larkspan.try-wishes.${song.id}`;
  const waitingName = `larkspan.try-waiting.${song.id}`;
  const effortName = `larkspan.try-effort.${song.id}`;
  const [wishes, keepWishes] = useState<TryWishes>(() => ({ ...usualWishes(song), ...recall(wishesName) }));
  const [waiting, keepWaiting] = useState(() => recall<Waiting>(waitingName));
  const [effort, keepEffort] = useState(() => recall<number>(effortName));
  const plan = useMemo(() => tryPlan(song, { tonic, shift }, wishes), [song, tonic, shift, wishes]);
  const heardPlan = useMemo(() => plan && (wishes.backing ? plan : countOnly(plan)), [plan, wishes.backing]);
  const ending = useRef<ReturnType<typeof setTimeout> | null>(null);
  const now = useRef<Waiting>({ key: { tonic, shift }, wishes, startS: null });
  const { stop, startedMs } = recorder;
  const { step } = recorder.state;
  useEffect(() => {
    if (step !== "listening") now.current = { key: { tonic, shift }, wishes, startS: null };
  }, [step, tonic, shift, wishes]);

  const onEnded = useCallback(() => {
    if (now.current.wishes.backing) ending.current = setTimeout(stop, 1000 * ringS);
  }, [stop]);
  const backing = useBacking(heardPlan, onEnded);
  const { start, stop: silence, begunMs } = backing;
  const startS = useCallback(() => {
    const [began, listened] = [begunMs(), startedMs()];
    return began === null || listened === null ? null : (began - listened) / 1000;
  }, [begunMs, startedMs]);
  const felt = useCallback(
    (next: number | null) => {
      keepEffort(next);
      remember(effortName, next);
    },
    [effortName],
  );
  const note = useCallback(
    (next: Waiting | null) => {
      keepWaiting(next);
      remember(waitingName, next);
    },
    [waitingName],
  );

  useEffect(() => {
    if (step !== "listening") return;
    felt(null);
    note(now.current);
    start();
    const timer = setInterval(() => {
      const found = startS();
      if (found === null || !now.current.wishes.backing) return;
      now.current = { ...now.current, startS: found };
      remember(waitingName, now.current);
    }, lookMs);
    return () => {
      clearInterval(timer);
      if (ending.current !== null) clearTimeout(ending.current);
      silence();
      note(now.current);
    };
  }, [step, start, silence, startS, note, felt, waitingName]);

  const take = recorder.state.step === "heard" ? recorder.state.take : null;
  const measured = useMemo(() => {
    if (!take || !waiting) return null;
    const sung = tryPlan(song, waiting.key, waiting.wishes);
    return { ...waiting, take, plan: sung, measures: measure(take, sung, waiting.startS) };
  }, [take, song, waiting]);
  return {
    wishes,
    setWishes: (next) => {
      keepWishes(next);
      remember(wishesName, next);
    },
    plan,
    backing,
    measured,
    effort,
    felt,
    forget: () => {
      note(null);
      felt(null);
      recorder.leave();
    },
    startS,
  };
}

function measure({ report }: HeardTry, plan: BackingPlan | null, startS: number | null): TakeMeasures | null {
  if (!plan || plan.notes.length === 0) return null;
  return measureTake(report, plan, { startS });
}
