import { useCallback, useEffect, useReducer, useRef, useState } from "react";
import { createCapture, type Capture } from "../recorder/capture";
import { createLiveSound, type LiveSound } from "../recorder/liveSound";
import { idle, recorder, type RecorderState } from "../recorder/recorder";
import { longestTakeS } from "../recorder/takeProtocol";
import { dropUnkept, markTakeOfThisTab, takeOfThisTab } from "../recorder/unkeptTake";

export interface Line {
  state: RecorderState;
  live: LiveSound;
  sing(): void;
  stop(): void;
  /** Lets go of the microphone and of what was heard. */
  leave(): void;
}

/**
 * A line sung into a page that is not about the voice: heard and judged like a take, but never kept. A take that waits
 * for its singer on the voice page stays where it is.
 *
 * @param mostS the line ends by itself after so many seconds
 */
export function useLine(mostS = longestTakeS): Line {
  const [state, dispatch] = useReducer(recorder, idle);
  const [live] = useState(createLiveSound);
  const capture = useRef<Capture | null>(null);
  const { step } = state;
  const waiting = useRef<string | null>(null);
  const own = useRef(false);

  const forget = useCallback(() => {
    if (!own.current) return;
    own.current = false;
    const id = takeOfThisTab();
    markTakeOfThisTab(waiting.current);
    if (id !== null && id !== waiting.current) void dropUnkept(id).catch(() => undefined);
  }, []);

  useEffect(() => {
    const opened = createCapture(dispatch, live, { mostS });
    capture.current = opened;
    opened.warmUp();
    return () => {
      opened.close();
      capture.current = null;
      forget();
    };
  }, [live, forget, mostS]);

  useEffect(() => {
    if (step === "asking") {
      if (!own.current) waiting.current = takeOfThisTab();
      own.current = true;
      void capture.current?.start(false);
    }
    if (step === "stopping") void capture.current?.stop();
    if (step === "failure" || step === "idle") capture.current?.drop();
    if (step === "failure" || step === "result" || step === "idle") forget();
  }, [step, forget]);

  const sing = useCallback(() => dispatch({ kind: "ask" }), []);
  const stop = useCallback(() => dispatch({ kind: "stop" }), []);
  const leave = useCallback(() => dispatch({ kind: "leave" }), []);
  return { state, live, sing, stop, leave };
}
