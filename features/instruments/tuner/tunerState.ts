import { hzToMidi } from "@/shared/music/pitch";
import { identifyString, type StringPlace, type TuningPlan } from "@/shared/instruments/stringTuning";
import type { StringReading } from "@/shared/voice/pluckedString";

/** Strings one by one; all again with the capo; all once more, because a neck settles. */
type TunerPass = "strings" | "capo" | "check" | "done";

/** What was heard last. */
export interface HeardString {
  midi: number;
  /** off the pitch that the string shall have now */
  cents: number;
  index: number;
  pluck: number;
  /** whole octaves off; 0 usually */
  octaves: number;
  t: number;
}

export interface TunerState {
  pass: TunerPass;
  /** the string asked for */
  asked: number;
  /** strings that stand, in this pass */
  done: number[];
  /** the capo is on */
  clamped: boolean;
  heard: HeardString | null;
  /** the last readings of this string, for the picture */
  trail: { t: number; cents: number }[];
  /** it may be any of these strings: the person says */
  question: { indices: number[]; reading: StringReading } | null;
  /** seconds in tune so far */
  heldS: number;
  /** the pluck that ended the last step, which rings on */
  spent: number;
  /** what the person has said, for as long as the pitch goes on from there */
  said: { index: number; midi: number } | null;
}

export type TunerEvent =
  | { kind: "heard"; readings: readonly StringReading[]; a4: number }
  | { kind: "next" }
  | { kind: "choose"; index: number }
  | { kind: "answer"; index: number; a4: number }
  | { kind: "clamped" }
  | { kind: "restart" };

export const inTuneCents = 3;
const letGoCents = 6;
const holdS = 1;
/** A hard pluck is sharp at first. */
const settledS = 0.3;
const goesOn = 1.6;
const trailPoints = 90;

export function startTuner(plan: TuningPlan): TunerState {
  return {
    ...{ pass: "strings", asked: plan.order[0] ?? 0, done: [], clamped: false, heard: null, trail: [] },
    ...{ question: null, heldS: 0, spent: 0, said: null },
  };
}

/** The pitch a string shall have in this pass. */
export function targetOf(plan: TuningPlan, { pass }: TunerState, index: number): number {
  const string = plan.strings[index];
  if (!string) throw new RangeError("the instrument has no such string");
  return pass === "strings" ? string.toMidi : string.clampedMidi;
}

/** The tuner as a pure machine: what happened goes in, what is shown comes out. */
export function tuner(plan: TuningPlan, state: TunerState, event: TunerEvent): TunerState {
  switch (event.kind) {
    case "heard":
      return event.readings.reduce((now, reading) => hear(plan, now, reading, event.a4), state);
    case "next":
      return standing(plan, state, state.asked, false);
    case "choose":
      return { ...state, ...fresh, asked: event.index };
    case "answer": {
      const { question } = state;
      if (!question) return state;
      const said = { index: event.index, midi: hzToMidi(question.reading.hz, event.a4) };
      return show(
        plan,
        { ...state, question: null, asked: event.index, said, heldS: 0, trail: [] },
        question.reading,
        event.index,
        event.a4,
      );
    }
    case "clamped":
      return state.pass === "capo" ? { ...state, clamped: true } : state;
    case "restart":
      return startTuner(plan);
  }
}

const fresh = { heard: null, trail: [], question: null, heldS: 0, said: null };

function hear(plan: TuningPlan, state: TunerState, reading: StringReading, a4: number): TunerState {
  if (state.pass === "done" || reading.pluck === state.spent || (state.pass === "capo" && !state.clamped)) return state;
  const midi = hzToMidi(reading.hz, a4);
  const { said } = state;
  if (said && Math.abs(midi - said.midi) <= goesOn)
    return show(plan, { ...state, said: { ...said, midi } }, reading, said.index, a4);
  const found = identifyString(midi, placesOf(plan, state), state.asked);
  if (found.kind === "ask") {
    // Once a pluck is only a clang now and then: it is asked when the pitch stands.
    return reading.sincePluckS < settledS
      ? state
      : { ...state, heldS: 0, question: { indices: found.indices, reading } };
  }
  const octaves = found.kind === "octave" ? found.octaves : 0;
  return show(plan, { ...state, question: null, said: null }, reading, found.index, a4, octaves);
}

function show(
  plan: TuningPlan,
  state: TunerState,
  reading: StringReading,
  index: number,
  a4: number,
  octaves = 0,
): TunerState {
  const midi = hzToMidi(reading.hz, a4);
  const cents = 100 * (midi - targetOf(plan, state, index));
  const heard = { midi, cents, index, octaves, pluck: reading.pluck, t: reading.t };
  // In a check any string may come; while tuning only the one that was asked for counts.
  const asked = state.pass === "strings" || octaves !== 0 ? state.asked : index;
  const same = state.heard?.index === index && state.asked === asked;
  const trail = [...(same ? state.trail : []), { t: reading.t, cents }].slice(-trailPoints);
  const passed = same && state.heard ? Math.min(0.1, Math.max(0, reading.t - state.heard.t)) : 0;
  const settled = reading.sincePluckS >= settledS;
  const off = Math.abs(cents);
  const before = same ? state.heldS : 0;
  const heldS = index !== asked || off > letGoCents ? 0 : off <= inTuneCents && settled ? before + passed : before;
  const now = { ...state, asked, heard, trail, heldS };
  return heldS >= holdS ? standing(plan, { ...now, spent: reading.pluck }, index, true) : now;
}

/** The string stands, or is left as it is; on to the next one that does not, or to the next pass. */
function standing(plan: TuningPlan, state: TunerState, index: number, inTune: boolean): TunerState {
  const done = inTune && !state.done.includes(index) ? [...state.done, index] : state.done;
  const at = plan.order.indexOf(index);
  const after = [...plan.order.slice(at + 1), ...(inTune ? plan.order.slice(0, at) : [])];
  const next = after.find((each) => !done.includes(each));
  const now = { ...state, ...fresh, done };
  if (next !== undefined) return { ...now, asked: next };
  const pass = nextPass(state.pass, plan.capo);
  return { ...now, pass, done: pass === "done" ? done : [], asked: plan.order[0] ?? 0 };
}

function nextPass(pass: TunerPass, capo: number): TunerPass {
  if (pass === "strings") return capo > 0 ? "capo" : "check";
  return pass === "capo" ? "check" : "done";
}

function placesOf(plan: TuningPlan, state: TunerState): StringPlace[] {
  return plan.strings.map(({ index, fromMidi }) => {
    const to = targetOf(plan, state, index);
    const done = state.pass !== "strings" || state.done.includes(index);
    const from = done ? to : fromMidi;
    return { index, lowMidi: Math.min(from, to), highMidi: Math.max(from, to), done: done && index !== state.asked };
  });
}
