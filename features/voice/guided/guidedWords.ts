import type { FailureKind, Interruption } from "../recorder/recorder";
import { failureWords, mendWords, type FailureWords } from "../sing/failureWords";
import { noteWord } from "../noteWords";
import type { TryOutcome } from "./hearing/guidedHold";
import { farthest, type GuidedEnd, type GuidedRun, type GuidedState } from "./guidedSteps";

export interface StepWords {
  /** what is happening, short */
  title: string;
  /** what to do */
  text: string;
}

/** What the singer reads at each step of the way. */
export function stepWords(
  state: Exclude<GuidedState, { step: "before" | "paused" | "done" | "failed" | "turn" }>,
): StepWords {
  const { run } = state;
  const asked = run.target === null ? null : noteWord(run.target);
  switch (state.step) {
    case "opening":
      return {
        title: "Waiting for the microphone",
        text: "Your browser asks whether this page may use it. Choose to allow it.",
      };
    case "tone":
      return { title: "Listen", text: `This is ${asked}.` };
    case "listening":
      return asked === null
        ? { title: "Hum a comfortable note", text: "Any note that costs you nothing. Hold it for about two seconds." }
        : { title: `Now sing ${asked}`, text: "On any vowel, at your ease, for about two seconds." };
    case "judging":
      return { title: "Reading your note", text: " " };
    case "held":
      return { title: `Held: ${noteWord(state.note.midi)}`, text: `For ${state.note.heldS.toFixed(1)} s. It counts.` };
    case "missed":
      return missedWords(run, state.outcome);
  }
}

function missedWords(run: GuidedRun, outcome: Exclude<TryOutcome, { kind: "held" }>): StepWords {
  const asked = run.target === null ? "A note" : noteWord(run.target);
  if (outcome.kind === "unheard") {
    const text = unheard[outcome.why] ?? "Come a little closer to the microphone.";
    return { title: "Your voice was not heard", text };
  }
  const onward = againIsSmaller(run)
    ? `You can try half the step, or leave it at that.`
    : "You can try it once more, or leave it at that.";
  if (outcome.kind === "unsteady")
    return { title: `${asked} did not stay`, text: `That happens near the end of a voice. ${onward}` };
  return { title: `That was ${noteWord(outcome.note.midi)}`, text: `${asked} was asked for. ${onward}` };
}

const unheard: Partial<Record<string, string>> = {
  "too-quiet": "Come a little closer to the microphone, and sing as softly as you like.",
  "too-noisy": "The room is loud just now. Wait until it is quieter.",
  clipped: "Move a little away from the microphone.",
  "several-voices": "Something else sounded too. Headphones at a moderate level keep the tone out of the microphone.",
};

/** The next try asks for the semitone before the missed whole tone. */
export function againIsSmaller(run: GuidedRun): boolean {
  return run.held.length > 0 && run.tries >= 2;
}

/** What ends the way, in the singer's words. */
export function enoughWords(end: GuidedEnd): string {
  return end === "low" ? "This is my lowest" : "This is my highest";
}

/** "Lowest held so far: F2." */
export function soFarWords(run: GuidedRun): string {
  const edge = farthest(run, run.end);
  if (!edge)
    return run.home === null ? "" : `We start at ${noteWord(run.home)}, in the middle of your comfortable notes.`;
  return `${run.end === "low" ? "Lowest" : "Highest"} held so far: ${noteWord(edge.midi)}, ${edge.heldS.toFixed(1)} s.`;
}

export function failedWords(why: (GuidedState & { step: "failed" })["why"]): FailureWords {
  if (why === "nothing") {
    return {
      title: "Only one note so far",
      happened: "One held note does not show where a voice ends.",
      safe: "Nothing was kept, and your voices are as they were.",
      next: "Start again when you like, or sing a few seconds of a song instead.",
    };
  }
  const unavailable: FailureKind[] = ["refused", "no-microphone", "insecure", "busy", "unsupported", "broken"];
  const kind = unavailable.find((one) => one === why);
  if (kind) return failureWords({ kind, report: null, seconds: 0, stoppedBy: null });
  const cause = why as Interruption;
  const broken = failureWords({ kind: "interrupted", report: null, seconds: 0, stoppedBy: cause });
  return { ...broken, next: mendWords(cause, "start again") };
}

/** For those who listen to the screen. The tone itself must not be talked over. */
export function announcement(state: GuidedState): string {
  switch (state.step) {
    case "before":
    case "tone":
    case "judging":
      return "";
    case "paused":
      return "What you held is still here.";
    case "turn":
      return "The low end is done.";
    case "done":
      return `You can hold ${noteWord(state.findings.lowMidi)} to ${noteWord(state.findings.highMidi)}.`;
    case "failed":
      return failedWords(state.why).title;
    default: {
      const { title, text } = stepWords(state);
      return `${title}. ${text}`;
    }
  }
}
