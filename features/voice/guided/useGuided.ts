import { useCallback, useEffect, useReducer, useRef, useState } from "react";
import { createGuidedSession, type GuidedSession } from "./hearing/guidedSession";
import {
  beforeGuided,
  farthest,
  guidedSteps,
  sideOf,
  type GuidedEvent,
  type GuidedRun,
  type GuidedState,
} from "./guidedSteps";
import { dropUnkeptRun, readUnkeptRun, saveUnkeptRun } from "./unkeptRun";
import { createLiveSound, type LiveSound } from "../recorder/liveSound";

/** Long enough to read "held" and to breathe in. */
const breathMs = 1100;

export interface Guided {
  state: GuidedState;
  live: LiveSound;
  tell: (event: GuidedEvent) => void;
}

/** Runs tone, microphone and worker as the machine's steps ask. */
export function useGuided(): Guided {
  const [state, tell] = useReducer(guidedSteps, beforeGuided);
  const [live] = useState(createLiveSound);
  const session = useRef<GuidedSession | null>(null);

  useEffect(() => {
    const own = createGuidedSession(tell, live);
    session.current = own;
    const kept = readUnkeptRun(Date.now());
    if (kept) tell({ kind: "restored", kept });
    return () => own.close();
  }, [live]);

  useEffect(() => saveUnkeptRun(state), [state]);

  // One effect a step: a try that is asked for again is a new state object, and runs again.
  useEffect(() => {
    const own = session.current;
    switch (state.step) {
      case "opening":
        void own?.open();
        return;
      case "tone":
        if (state.run.target !== null) void own?.sound(state.run.target);
        return;
      case "listening":
        own?.listen();
        return;
      case "judging":
        own?.judge(askedOf(state.run));
        return;
      case "held": {
        const timer = setTimeout(() => tell({ kind: "next" }), breathMs);
        return () => clearTimeout(timer);
      }
      case "before":
      case "paused":
      case "done":
      case "failed":
        own?.close();
    }
  }, [state]);

  const tellAndForget = useCallback((event: GuidedEvent) => {
    if (event.kind === "leave") dropUnkeptRun();
    tell(event);
  }, []);
  return { state, live, tell: tellAndForget };
}

function askedOf(run: GuidedRun) {
  if (run.target === null) return null;
  const edge = run.held.length === 0 ? null : farthest(run, run.end);
  return { midi: run.target, beyond: edge && { midi: edge.midi, side: sideOf(run.end) } };
}
