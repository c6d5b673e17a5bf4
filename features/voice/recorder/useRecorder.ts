import { useCallback, useEffect, useReducer, useRef, useState } from "react";
import { createCapture, type Capture } from "./capture";
import { createLiveSound, type LiveSound } from "./liveSound";
import { idle, recorder, type HeardTake, type RecorderState } from "./recorder";
import type { TakePart } from "./takeProtocol";
import { dropStale, dropUnkept, markTakeOfThisTab, readUnkept, saveUnkept, takeOfThisTab } from "./unkeptTake";
import { noteUnreadFile, unreadFile } from "./unreadFile";

/** Less than this is not worth judging after a reload. */
const leastS = 1;

export interface Recorder {
  state: RecorderState;
  /** true until it is known whether this tab still has a take that nobody kept */
  restoring: boolean;
  /** the take before this one: it stays until another one is heard, so that a try that fails costs nothing */
  earlier: HeardTake | null;
  /** a recording that was not read to its end when the page was left or loaded again */
  unread: string | null;
  live: LiveSound;
  /** Asks for the microphone and listens, after a count of four where one is wanted. */
  sing(counted?: boolean): void;
  /** Ends the take; while it is counted in, gives it up. */
  stop(): void;
  /** Reads a recording instead. */
  read(file: File): void;
  /** Judges a part of the take instead of the whole; null judges the whole again. */
  trim(part: TakePart | null): void;
  /** Back to choosing: what was heard stays as the earlier take, what is not heard yet is given up. */
  startOver(): void;
  /** The earlier take again. */
  goBack(): void;
  /** Forgets the take, its sound and its numbers. */
  leave(): void;
  felt(warmedUp: boolean | null, effort: number | null): void;
}

/** The recorder of this tab: runs the microphone and the worker as the machine's steps ask, and survives a reload. */
export function useRecorder(): Recorder {
  const [state, dispatch] = useReducer(recorder, idle);
  const [restoring, setRestoring] = useState(() => takeOfThisTab() !== null);
  const [unread, setUnread] = useState(unreadFile);
  const [earlier, setEarlier] = useState<HeardTake | null>(null);
  const [live] = useState(createLiveSound);
  const capture = useRef<Capture | null>(null);
  const { step } = state;
  const stepNow = useRef(step);
  const earlierNow = useRef(earlier);
  const counted = useRef(false);
  useEffect(() => {
    stepNow.current = step;
    earlierNow.current = earlier;
  }, [step, earlier]);

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
      if (stepNow.current === "listening" || stepNow.current === "stopping" || stepNow.current === "judging")
        giveUp(earlierNow.current);
    };
  }, [live]);

  useEffect(() => {
    if (step === "asking") void capture.current?.start(counted.current);
    if (step === "stopping") void capture.current?.stop();
    if (step === "failure") {
      capture.current?.drop();
      giveUp(earlierNow.current);
      noteUnreadFile(null);
    }
  }, [step]);

  const take = state.step === "result" ? state.take : null;
  useEffect(() => {
    if (!take) return;
    void saveUnkept(take)
      .then(() => noteUnreadFile(null))
      .catch(() => undefined);
    const before = earlierNow.current;
    if (before && before.id !== take.id) void dropUnkept(before.id).catch(() => undefined);
  }, [take]);

  const begin = useCallback(() => {
    if (take) setEarlier(take);
    else giveUp(earlier);
    setUnread(null);
  }, [take, earlier]);
  const sing = useCallback(
    (count = false) => {
      begin();
      counted.current = count;
      dispatch({ kind: "ask" });
    },
    [begin],
  );
  const read = useCallback(
    (file: File) => {
      begin();
      noteUnreadFile(file.name);
      dispatch({ kind: "read", name: file.name });
      void capture.current?.read(file);
    },
    [begin],
  );
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
  const goBack = useCallback(() => {
    if (!earlier) return;
    markTakeOfThisTab(earlier.id);
    dispatch({ kind: "restored", take: earlier });
  }, [earlier]);
  const stop = useCallback(() => {
    const counting = stepNow.current === "counting";
    if (counting) capture.current?.drop();
    dispatch({ kind: "stop" });
    if (counting) goBack();
  }, [goBack]);
  const startOver = useCallback(() => {
    // A long recording may still be being read: only its end sets the worker free at once.
    capture.current?.close();
    begin();
    noteUnreadFile(null);
    dispatch({ kind: "leave" });
  }, [begin]);
  const leave = useCallback(() => {
    capture.current?.close();
    forget();
    if (earlier) void dropUnkept(earlier.id).catch(() => undefined);
    setEarlier(null);
    dispatch({ kind: "leave" });
  }, [earlier]);
  const felt = useCallback(
    (warmedUp: boolean | null, effort: number | null) => dispatch({ kind: "felt", warmedUp, effort }),
    [],
  );
  return { state, restoring, earlier, unread, live, sing, stop, read, trim, startOver, goBack, leave, felt };
}

/** Gives up what was not heard to its end; the take before it stays this tab's own. */
function giveUp(earlier: HeardTake | null): void {
  if (takeOfThisTab() !== earlier?.id) forget();
  markTakeOfThisTab(earlier?.id ?? null);
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
    if (!isHere()) return;
    if (!found) {
      markTakeOfThisTab(null);
      return;
    }
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
