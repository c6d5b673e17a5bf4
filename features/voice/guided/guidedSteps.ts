import type { HeldNote, TryOutcome } from "./hearing/guidedHold";
import { commonTuning } from "@/shared/voice/pitchSpread";
import type { Interruption, Unavailable } from "../recorder/recorder";

export type GuidedEnd = "low" | "high";

/** What was found so far and what is asked for next. */
export interface GuidedRun {
  id: string;
  startedAt: string;
  under16: boolean;
  /** the comfortable note both ways start from; null until it was hummed */
  home: number | null;
  end: GuidedEnd;
  /** the note asked for */
  target: number | null;
  stride: 2 | 1;
  /** tries at this very note */
  tries: number;
  /** tries beyond what was held that did not hold, at each end */
  misses: Record<GuidedEnd, number>;
  held: HeldNote[];
}

/** What the singer says of the notes that were found. */
export interface GuidedFindings {
  lowMidi: number;
  highMidi: number;
  /** notes that the singer would use in a song */
  singLow: number;
  singHigh: number;
  warmedUp: boolean | null;
  effort: number | null;
}

export type GuidedState =
  | { step: "before" }
  /** broken off before its end and not given up; `next` is the way that going on leads */
  | { step: "paused"; run: GuidedRun; next: GuidedEnd; cause: Interruption }
  | { step: "opening"; run: GuidedRun }
  /** the reference tone sounds */
  | { step: "tone"; run: GuidedRun }
  | { step: "listening"; run: GuidedRun }
  | { step: "judging"; run: GuidedRun }
  /** it counts; the next tone follows by itself */
  | { step: "held"; run: GuidedRun; note: HeldNote }
  | { step: "missed"; run: GuidedRun; outcome: Exclude<TryOutcome, { kind: "held" }> }
  /** the low end is found; before going up */
  | { step: "turn"; run: GuidedRun }
  | { step: "done"; run: GuidedRun; findings: GuidedFindings; brokenOff: Interruption | null }
  | { step: "failed"; why: Unavailable | Interruption | "nothing" | "broken" };

/** What is worth keeping of a way that was not finished, or not kept yet. */
export type UnkeptRun =
  { step: "way"; run: GuidedRun; next: GuidedEnd } | { step: "done"; run: GuidedRun; findings: GuidedFindings };

export type GuidedEvent =
  | { kind: "start"; id: string; startedAt: string; home: number | null; under16: boolean }
  /** what this tab held before it was loaded again */
  | { kind: "restored"; kept: UnkeptRun }
  /** on from where it broke off */
  | { kind: "resume" }
  | { kind: "opened" }
  | { kind: "unavailable"; why: Unavailable }
  | { kind: "toneEnded" }
  | { kind: "listened" }
  | { kind: "judged"; outcome: TryOutcome }
  | { kind: "next" }
  | { kind: "again" }
  /** enough of this end */
  | { kind: "enough" }
  | { kind: "up" }
  /** enough of all */
  | { kind: "finish" }
  | { kind: "interrupted"; cause: Interruption }
  | { kind: "broken" }
  | { kind: "found"; change: Partial<GuidedFindings> }
  | { kind: "leave" };

export const beforeGuided: GuidedState = { step: "before" };

/** Notes outside cannot be heard surely. */
const lowestAsked = 37;
const highestAsked = 88;
/** At one note; a missed whole tone is then tried as a semitone, once. */
const mostTries = 2;
/** Reserves that stay until the singer says otherwise: top 2 to 3 semitones, bottom 1 to 2, common practice. */
const topReserve = 3;
const bottomReserve = 2;

/**
 * The way down and up as a pure machine. From a comfortable note in whole tones; a missed note may be tried once more,
 * then the semitone before it once; what was held is never asked for again. Under 16 the first miss ends an end.
 * Whenever the singer stops, what was held stays.
 */
export function guidedSteps(state: GuidedState, event: GuidedEvent): GuidedState {
  if (event.kind === "leave") return beforeGuided;
  if (state.step === "before" || state.step === "failed")
    return event.kind === "start" ? opening(event) : back(state, event);
  if (state.step === "paused") return fromPause(state, event);
  if (state.step === "done") {
    return event.kind === "found" ? { ...state, findings: settled({ ...state.findings, ...event.change }) } : state;
  }
  const { run } = state;
  switch (event.kind) {
    case "unavailable":
      return state.step === "opening" ? { step: "failed", why: event.why } : state;
    case "interrupted":
      if (shownEnds(run).length > 0) return done(run, event.cause);
      return run.held.length > 0
        ? { step: "paused", run, next: run.end, cause: event.cause }
        : { step: "failed", why: event.cause };
    case "broken":
      return shownEnds(run).length > 0 ? done(run) : { step: "failed", why: "broken" };
    case "finish":
      return run.held.length > 0 ? done(run) : beforeGuided;
    case "enough":
      return run.held.length > 0 ? endOfWay(run) : state;
    default:
      return atStep(state, event);
  }
}

type Running = Exclude<GuidedState, { step: "before" | "paused" | "done" | "failed" }>;

function back(state: GuidedState, event: GuidedEvent): GuidedState {
  if (event.kind !== "restored" || state.step !== "before") return state;
  const { kept } = event;
  if (kept.step === "done") return { ...kept, brokenOff: null };
  return { step: "paused", run: kept.run, next: kept.next, cause: "reloaded" };
}

function fromPause(state: GuidedState & { step: "paused" }, event: GuidedEvent): GuidedState {
  const { run, next } = state;
  if (event.kind === "finish") return done(run, state.cause);
  if (event.kind !== "resume") return state;
  return { step: "opening", run: next === run.end ? { ...run, tries: 0 } : upwards(run) };
}

function upwards(run: GuidedRun): GuidedRun {
  return { ...run, end: "high", target: stepFrom(run, "high"), stride: 2, tries: 0 };
}

function atStep(state: Running, event: GuidedEvent): GuidedState {
  const { run } = state;
  switch (state.step) {
    case "opening":
      return event.kind === "opened" ? ask(run) : state;
    case "tone":
      return event.kind === "toneEnded" ? { step: "listening", run } : state;
    case "listening":
      if (event.kind === "again") return run.target === null ? state : ask(run);
      return event.kind === "listened" ? { step: "judging", run } : state;
    case "judging":
      return event.kind === "judged" ? afterTry(run, event.outcome) : state;
    case "held":
      return event.kind === "next" ? onward(run, state.note) : state;
    case "missed":
      return event.kind === "again" ? ask(retry(run)) : state;
    case "turn":
      return event.kind === "up" ? ask(upwards(run)) : state;
  }
}

function opening({ id, startedAt, home, under16 }: GuidedEvent & { kind: "start" }): GuidedState {
  const run: GuidedRun = {
    ...{ id, startedAt, home, under16, end: "low", target: home, stride: 2, tries: 0 },
    misses: { low: 0, high: 0 },
    held: [],
  };
  return { step: "opening", run };
}

/** Without a note to ask for, the singer hums first and nothing sounds before. */
function ask(run: GuidedRun): GuidedState {
  return { step: run.target === null ? "listening" : "tone", run };
}

function afterTry(run: GuidedRun, outcome: TryOutcome): GuidedState {
  if (outcome.kind === "held") {
    const home = run.held.length === 0 ? Math.round(outcome.note.midi) : run.home;
    return { step: "held", run: { ...run, home, held: [...run.held, outcome.note] }, note: outcome.note };
  }
  // A try in which nothing could be heard is no try of the voice.
  if (outcome.kind === "unheard") return { step: "missed", run, outcome };
  const tries = run.tries + 1;
  if (run.held.length === 0) return { step: "missed", run: { ...run, tries }, outcome };
  const tried = { ...run, tries, misses: { ...run.misses, [run.end]: run.misses[run.end] + 1 } };
  return run.under16 || run.stride === 1 ? endOfWay(tried) : { step: "missed", run: tried, outcome };
}

function retry(run: GuidedRun): GuidedRun {
  if (run.held.length === 0 || run.tries < mostTries) return run;
  return { ...run, target: (run.target ?? 0) - sideOf(run.end), stride: 1, tries: 0 };
}

function onward(run: GuidedRun, note: HeldNote): GuidedState {
  // The whole tone was missed before its semitone was tried: it is not asked for again.
  if (run.stride === 1) return endOfWay(run);
  const target = Math.round(note.midi) + sideOf(run.end) * run.stride;
  if (target < lowestAsked || target > highestAsked) return endOfWay(run);
  return ask({ ...run, target, tries: 0 });
}

function endOfWay(run: GuidedRun): GuidedState {
  return run.end === "low" ? { step: "turn", run } : done(run);
}

/** One note alone is no range. */
function done(run: GuidedRun, brokenOff: Interruption | null = null): GuidedState {
  if (shownEnds(run).length === 0) return { step: "failed", why: "nothing" };
  const { lowMidi, highMidi } = namedEnds(run.held);
  const home = run.home ?? lowMidi;
  const findings = settled({
    ...{ lowMidi, highMidi, warmedUp: null, effort: null },
    singLow: Math.min(home, lowMidi + bottomReserve),
    singHigh: Math.max(home, highMidi - topReserve),
  });
  return { step: "done", run, findings, brokenOff };
}

/** The lowest and highest held note, named by the singer's own tuning. */
function namedEnds(held: readonly HeldNote[]): { lowMidi: number; highMidi: number } {
  const offset = tuningOf(held) / 100;
  const all = held.map(({ midi }) => Math.round(midi - offset));
  return { lowMidi: Math.min(...all), highMidi: Math.max(...all) };
}

/** The offset of the held notes from equal temperament in cents: their circular mean, longer ones weighing more. */
export function tuningOf(held: readonly HeldNote[]): number {
  return commonTuning(held.map(({ midi, heldS }) => ({ start: 0, end: heldS, midi })));
}

/** Notes for a song lie among the notes that can be held, the lower one below the higher one. */
function settled(findings: GuidedFindings): GuidedFindings {
  const { lowMidi, highMidi } = findings;
  const singLow = Math.max(lowMidi, Math.min(highMidi, findings.singLow));
  return { ...findings, singLow, singHigh: Math.max(singLow, Math.min(highMidi, findings.singHigh)) };
}

function stepFrom(run: GuidedRun, end: GuidedEnd): number | null {
  return run.home === null ? null : run.home + sideOf(end) * 2;
}

export function sideOf(end: GuidedEnd): -1 | 1 {
  return end === "low" ? -1 : 1;
}

/** The farthest held note on this way; null before the first. */
export function farthest({ held }: Pick<GuidedRun, "held">, end: GuidedEnd): HeldNote | null {
  return held.reduce<HeldNote | null>(
    (best, note) => (best === null || sideOf(end) * (note.midi - best.midi) > 0 ? note : best),
    null,
  );
}

/** Ends that were looked for and led beyond the note they started from. */
export function shownEnds(run: Pick<GuidedRun, "held" | "home">): GuidedEnd[] {
  const home = run.home;
  if (home === null) return [];
  return (["low", "high"] as const).filter((end) => {
    const edge = farthest(run, end);
    return edge !== null && sideOf(end) * (edge.midi - home) >= 0.6;
  });
}
