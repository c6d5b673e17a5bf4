import { useCallback, useEffect, useReducer, useRef, useState } from "react";
import { createCapture, type Capture } from "./capture";
import { createLiveSound, type LiveSound } from "./liveSound";
import { idle, recorder, type RecorderState } from "./recorder";
import type { TakePart } from "./takeProtocol";
import { dropStale, dropUnkept, markTakeOfThisTab, readUnkept, saveUnkept, takeOfThisTab } from "./unkeptTake";

/** Less than this is not worth judging after a reload. */
const leastS = 1;

export interface Recorder {
  state: RecorderState;
  /** true until it is known whether this tab still has a take that nobody kept */
  restoring: boolean;
  live: LiveSound;
  /** Asks for the microphone and listens, after a count of four where one is wanted. */
  sing(counted?: boolean): void;
  /** Ends the take; while it is counted in, gives it up. */
  stop(): void;
  /** Reads a recording instead. */
  read(file: File): void;
  /** Judges a part of the take instead of the whole; null judges the whole again. */
  trim(part: TakePart | null): void;
  /** Forgets the take, its sound and its numbers. */
  leave(): void;
  felt(warmedUp: boolean | null, effort: number | null): void;
}

/** The recorder of this tab: runs the microphone and the worker as the machine's steps ask, and survives a reload. */
export function useRecorder(): Recorder {
  const [state, dispatch] = useReducer(recorder, idle);
  const [restoring, setRestoring] = useState(() => takeOfThisTab() !== null);
  const [live] = useState(createLiveSound);
  const capture = useRef<Capture | null>(null);
  const { step } = state;
  const stepNow = useRef(step);
  const counted = useRef(false);
  useEffect(() => {
    stepNow.current = step;
  }, [step]);

  useEffect(() => {
    const own = createCapture(dispatch, live);
    capture.current = own;
    own.warmUp();
    let here = true;
    void restore(own, dispatch, () => here).finally(() => here && setRestoring(false));
    return () => {
      here = false;
      own.close();
      capture.current = null;
      // Leaving the page gives a take up that is still being sung; a result waits for whoever comes back.
      if (stepNow.current === "listening" || stepNow.current === "stopping" || stepNow.current === "judging") forget();
    };
  }, [live]);

  useEffect(() => {
    if (step === "asking") void capture.current?.start(counted.current);
    if (step === "stopping") void capture.current?.stop();
    if (step === "failure") {
      capture.current?.drop();
      forget();
    }
  }, [step]);

  const take = state.step === "result" ? state.take : null;
  useEffect(() => {
    if (take) void saveUnkept(take).catch(() => undefined);
  }, [take]);

  const sing = useCallback((count = false) => {
    forget();
    counted.current = count;
    dispatch({ kind: "ask" });
  }, []);
  const read = useCallback((file: File) => {
    forget();
    dispatch({ kind: "read", name: file.name });
    void capture.current?.read(file);
  }, []);
  const trim = useCallback(
    (part: TakePart | null) => {
      if (!take) return;
      if (!part) dispatch({ kind: "judgeWhole" });
      else {
        dispatch({ kind: "judgePart" });
        capture.current?.judgePart(take, part);
      }
    },
    [take],
  );
  const stop = useCallback(() => {
    if (stepNow.current === "counting") capture.current?.drop();
    dispatch({ kind: "stop" });
  }, []);
  const leave = useCallback(() => {
    // A long recording may still be being read: only its end sets the worker free at once.
    capture.current?.close();
    forget();
    dispatch({ kind: "leave" });
  }, []);
  const felt = useCallback(
    (warmedUp: boolean | null, effort: number | null) => dispatch({ kind: "felt", warmedUp, effort }),
    [],
  );
  return { state, restoring, live, sing, stop, read, trim, leave, felt };
}

/** Only what this tab recorded is erased: the mark names it. */
function forget(): void {
  const id = takeOfThisTab();
  markTakeOfThisTab(null);
  if (id !== null) void dropUnkept(id).catch(() => undefined);
}

async function restore(
  capture: Capture,
  dispatch: (event: Parameters<typeof recorder>[1]) => void,
  isHere: () => boolean,
): Promise<void> {
  const id = takeOfThisTab();
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
      forget();
      return;
    }
    dispatch({ kind: "rejudging", id: cutOff.id, sungAt: cutOff.sungAt, seconds });
    capture.judgeKept(cutOff);
  } catch {
    // Without the device's storage there is nothing to restore, and singing works all the same.
  }
}
