import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import { createCapture, type Capture } from "../recorder/capture";
import { createLiveSound, timeOf, type LiveSound } from "../recorder/liveSound";
import { idle, recorder, type HeardTake, type RecorderEvent, type RecorderState } from "../recorder/recorder";
import { soundToSend, type SoundToSend } from "../recorder/sound/soundToSend";
import { longestTryS } from "../recorder/takeProtocol";
import {
  dropStale,
  dropUnkept,
  markTakeOfThisTab,
  readUnkept,
  saveUnkept,
  takeOfThisTab,
} from "../recorder/unkeptTake";
import { usePlayback, type Playback } from "../recorder/usePlayback";
import { causeWords, failureWords, isInterruption, type FailureWords } from "../sing/failureWords";

/** A song as it was sung in a key. The sound stays on this device. */
interface HeardTry extends Pick<HeardTake, "id" | "sungAt" | "report" | "processed"> {
  /** what broke it off, in a sentence; null where the singer ended it */
  brokenOff: string | null;
}

type TryTakeState =
  | { step: "idle" | "asking" }
  | { step: "listening" | "stopping"; id: string; seconds: number }
  | { step: "judging"; seconds: number; listened: number }
  | { step: "heard"; take: HeardTry }
  /** `heard`: there was sound, and it was judged */
  | { step: "failure"; words: FailureWords; heard: boolean };

/** The recorder for pages where a song is tried. */
export interface TryTake {
  state: TryTakeState;
  /** until it is known whether a take waits here */
  restoring: boolean;
  sing(): void;
  stop(): void;
  /** Forgets the take and its sound. */
  leave(): void;
  /** what is heard now, for pictures; changes all the time */
  now(): Pick<LiveSound, "frames" | "ahead" | "levelDb" | "peak"> & { now: number };
  /** Calls whenever something was heard; gives what ends that. */
  listen(listener: () => void): () => void;
  /** the page's clock (performance.now) at second 0 of the take; null before anything arrived */
  startedMs(): number | null;
  playback: Playback;
  /** makes a file of the take that is heard, to be handed in; null where there is none */
  toSend(): Promise<SoundToSend | null>;
}

/** Less than this is not worth judging after a reload. */
const leastS = 2;
const nothing = new Float32Array(0);

/** @param place whose take this is: each place of a tab has one that waits until it is kept or forgotten */
export function useTryTake(place: string): TryTake {
  const mark = `larkspan.try.${place}`;
  const [state, dispatch] = useReducer(recorder, idle);
  const [restoring, setRestoring] = useState(() => takeOfThisTab(mark) !== null);
  const [live] = useState(createLiveSound);
  const capture = useRef<Capture | null>(null);
  const started = useRef<number | null>(null);
  const { step } = state;
  const stepNow = useRef(step);
  useEffect(() => {
    stepNow.current = step;
  }, [step]);

  const forget = useCallback(() => {
    const id = takeOfThisTab(mark);
    markTakeOfThisTab(null, mark);
    if (id !== null) void dropUnkept(id).catch(() => undefined);
  }, [mark]);

  useEffect(() => {
    const own = createCapture(dispatch, live, { mostS: longestTryS, mark });
    capture.current = own;
    own.warmUp();
    let here = true;
    void restore(own, mark, dispatch, () => here).finally(() => here && setRestoring(false));
    return () => {
      here = false;
      own.close();
      capture.current = null;
      // Leaving gives up what is still being sung; a result waits for whoever comes back.
      if (stepNow.current === "listening" || stepNow.current === "stopping") forget();
    };
  }, [live, mark, forget]);

  useEffect(() => {
    // The block that came with the least delay tells best when the take began.
    const look = () => {
      const began = live.atMs - 1000 * live.seconds;
      started.current = Math.min(started.current ?? Infinity, began);
    };
    live.listeners.add(look);
    return () => void live.listeners.delete(look);
  }, [live]);

  useEffect(() => {
    if (step === "asking") {
      started.current = null;
      void capture.current?.start(false);
    }
    if (step === "stopping") void capture.current?.stop();
    if (step === "failure") {
      capture.current?.drop();
      forget();
    }
  }, [step, forget]);

  const heard = state.step === "result" ? state.take : null;
  useEffect(() => {
    if (heard) void saveUnkept(heard).catch(() => undefined);
  }, [heard]);

  const sing = useCallback(() => {
    forget();
    dispatch({ kind: "ask" });
  }, [forget]);
  const stop = useCallback(() => dispatch({ kind: "stop" }), []);
  const leave = useCallback(() => {
    capture.current?.drop();
    forget();
    dispatch({ kind: "leave" });
  }, [forget]);
  const now = useCallback(() => {
    const { frames, ahead, levelDb, peak } = live;
    return { frames, ahead, levelDb, peak, now: Math.max(0, timeOf(live, performance.now())) };
  }, [live]);
  const listen = useCallback(
    (listener: () => void) => {
      live.listeners.add(listener);
      return () => void live.listeners.delete(listener);
    },
    [live],
  );
  const startedMs = useCallback(() => started.current, []);
  const playback = usePlayback(heard?.pcm ?? nothing, heard?.sampleRate ?? 48_000);
  const toSend = useCallback(async () => heard && soundToSend(heard.pcm, heard.sampleRate), [heard]);
  const shown = useMemo(() => shownState(state), [state]);
  return { state: shown, restoring, sing, stop, leave, now, listen, startedMs, playback, toSend };
}

function shownState(state: RecorderState): TryTakeState {
  switch (state.step) {
    case "listening":
    case "stopping":
      return { step: state.step, id: state.id, seconds: state.seconds };
    case "judging":
      return { step: "judging", seconds: state.seconds, listened: state.listened };
    case "result": {
      const { id, sungAt, report, processed, stoppedBy } = state.take;
      const brokenOff = isInterruption(stoppedBy) ? causeWords(stoppedBy, report.durationS) : null;
      return { step: "heard", take: { id, sungAt, report, processed, brokenOff } };
    }
    case "failure":
      return { step: "failure", words: failureWords(state.failure), heard: state.failure.report !== null };
    default:
      return { step: state.step === "asking" ? "asking" : "idle" };
  }
}

async function restore(
  capture: Capture,
  mark: string,
  dispatch: (event: RecorderEvent) => void,
  isHere: () => boolean,
): Promise<void> {
  const id = takeOfThisTab(mark);
  try {
    await dropStale(Date.now());
    const found = id === null ? null : await readUnkept(id);
    if (!found || !isHere()) return;
    if ("result" in found) {
      dispatch({ kind: "restored", take: found.result });
      return;
    }
    const { cutOff } = found;
    const seconds = cutOff.pcm.length / cutOff.sampleRate;
    if (seconds < leastS) {
      markTakeOfThisTab(null, mark);
      await dropUnkept(cutOff.id);
      return;
    }
    dispatch({ kind: "rejudging", id: cutOff.id, sungAt: cutOff.sungAt, seconds });
    capture.judgeKept(cutOff);
  } catch {
    // Without the device's storage there is nothing to restore, and singing works all the same.
  }
}
