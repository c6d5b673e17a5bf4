import type { GuidedState, UnkeptRun } from "./guidedSteps";

const storageKey = "larkspan.guided";
/** Changes with the form of what is stored: what an older page left is not read by a newer one. */
const form = 1;
const dayMs = 86_400_000;

interface Stored {
  form: number;
  kept: UnkeptRun;
}

/** What this tab held and has neither kept nor given up; null where there is nothing, or it is more than a day old. */
export function readUnkeptRun(nowMs: number): UnkeptRun | null {
  try {
    const stored = JSON.parse(sessionStorage.getItem(storageKey) ?? "null") as Stored | null;
    if (!stored || stored.form !== form) return null;
    return nowMs - Date.parse(stored.kept.run.startedAt) > dayMs ? null : stored.kept;
  } catch {
    return null;
  }
}

/** Notes what is worth coming back to; a way without a held note is not. */
export function saveUnkeptRun(state: GuidedState): void {
  const kept = worthKeeping(state);
  if (!kept) return;
  try {
    sessionStorage.setItem(storageKey, JSON.stringify({ form, kept } satisfies Stored));
  } catch {
    // A browser that forbids storage only loses the safety against a reload.
  }
}

export function dropUnkeptRun(): void {
  try {
    sessionStorage.removeItem(storageKey);
  } catch {
    // Then nothing was stored either.
  }
}

function worthKeeping(state: GuidedState): UnkeptRun | null {
  if (state.step === "before" || state.step === "failed" || state.run.held.length === 0) return null;
  if (state.step === "done") return { step: "done", run: state.run, findings: state.findings };
  if (state.step === "paused") return { step: "way", run: state.run, next: state.next };
  return { step: "way", run: state.run, next: state.step === "turn" ? "high" : state.run.end };
}
