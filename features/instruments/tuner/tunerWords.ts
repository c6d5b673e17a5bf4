import type { Instrument } from "@/shared/instruments/instrument";
import { loadNow, type TuningPlan } from "@/shared/instruments/stringTuning";
import { glyphs, noteName } from "@/shared/music/pitch";
import { inTuneCents, targetOf, type HeardString, type TunerState } from "./tunerState";

const spelled = (midi: number, like: string) => glyphs(noteName(midi, like.includes("b") ? "flats" : "common"));

/** A pitch by name, spelled as the string is. */
export function pitchWords(instrument: Instrument, index: number, midi: number): string {
  return spelled(midi, instrument.strings[index]?.note ?? "");
}

/** "D4 string": called by the note it has now. */
export function stringName(instrument: Instrument, index: number): string {
  return `${glyphs(instrument.strings[index]?.note ?? "")} string`;
}

/** "12 cents low", "1.4 semitones high", "In tune". */
function offWords(cents: number): string {
  const whole = Math.round(Math.abs(cents));
  if (Math.abs(cents) <= inTuneCents) return "In tune";
  const way = cents < 0 ? "low" : "high";
  return whole < 100 ? `${whole} cents ${way}` : `${(whole / 100).toFixed(1)} semitones ${way}`;
}

/** What to do about it. */
function turnWords(cents: number): string {
  const off = Math.abs(cents);
  if (off <= inTuneCents) return "Let it ring.";
  if (cents < 0) return off < 20 ? "Turn the peg up a little." : off < 100 ? "Turn the peg up." : "Bring it up slowly.";
  if (off < 20) return "Let it down a little below, then bring it up to the note.";
  return "Let it down.";
}

/** With the capo on nobody turns pegs first. */
function clampedWords(cents: number): string {
  if (Math.abs(cents) <= inTuneCents) return "Let it ring.";
  return cents > 0
    ? "Set the capo close behind the fret, straight and no tighter than it must be. If it stays high, let the string down a little."
    : "See that the capo holds this string. If it stays low, turn the peg up a little.";
}

/** What is heard, and what to do, in two sentences. */
export function heardWords(
  instrument: Instrument,
  plan: TuningPlan,
  state: TunerState,
  heard: HeardString,
): { off: string; turn: string; stop: boolean } {
  const name = stringName(instrument, heard.index);
  if (heard.octaves !== 0) {
    const many = Math.abs(heard.octaves) === 1 ? "An octave" : `${Math.abs(heard.octaves)} octaves`;
    const low = heard.octaves < 0;
    const turn = low ? "Bring it up slowly, eyes away from the string." : "Let it down, or pluck the open string.";
    return { off: `${many} too ${low ? "low" : "high"}`, turn, stop: false };
  }
  const string = instrument.strings[heard.index];
  const open = heard.midi - (state.pass === "strings" ? 0 : plan.capo);
  if (string && heard.cents > 20 && loadNow(string, instrument.scaleMm, open) === "unsafe")
    return {
      off: offWords(heard.cents),
      turn: `Stop. The ${name} can snap up here. Let it down now, eyes away.`,
      stop: true,
    };
  if (heard.index !== state.asked)
    return {
      off: `That is the ${name}`,
      turn: `Pluck the ${stringName(instrument, state.asked)} instead.`,
      stop: false,
    };
  const turn = state.pass === "strings" ? turnWords(heard.cents) : clampedWords(state.clamped ? heard.cents : 0);
  return {
    off: offWords(heard.cents),
    turn: state.clamped || state.pass === "strings" ? turn : turnWords(heard.cents),
    stop: false,
  };
}

/** What this step is, "Let the D4 string down to C4". */
export function stepWords(instrument: Instrument, plan: TuningPlan, state: TunerState): string {
  const { asked, pass } = state;
  const string = plan.strings[asked];
  if (!string) return "";
  const name = stringName(instrument, asked);
  const to = pitchWords(instrument, asked, targetOf(plan, state, asked));
  if (pass === "check") return `Check the ${name}: ${to}`;
  if (pass === "capo") return `Capo on: check the ${name} at ${to}`;
  if (string.toMidi === string.fromMidi) return `Tune the ${name}`;
  return string.toMidi < string.fromMidi ? `Let the ${name} down to ${to}` : `Bring the ${name} up to ${to}`;
}

/** Cautions of one string before its peg is turned. */
export function cautionWords(instrument: Instrument, plan: TuningPlan, state: TunerState): string | null {
  const string = plan.strings[state.asked];
  if (!string || state.pass !== "strings") return null;
  if (string.verdict === "tight")
    return "This string gets tighter than it was made for. Eyes away, bring it up slowly, and stop if it creaks.";
  if (string.verdict === "slack")
    return "This string gets slack: it may buzz, and it frets sharp. Pluck it softly while you tune.";
  return null;
}

const failures: Record<string, { title: string; happened: string; next: string }> = {
  refused: {
    title: "The microphone is not allowed here",
    happened: "Your browser was told not to let this page use the microphone.",
    next: "Allow it in the browser's settings and try again, or tune by ear below.",
  },
  "no-microphone": {
    title: "No microphone found",
    happened: "This device has no microphone that the browser can use.",
    next: "Plug one in and try again, or tune by ear below.",
  },
  insecure: {
    title: "This address is not secure",
    happened: "Browsers let a page listen only over a secure connection.",
    next: "Open Larkspan at its address that begins with https, or tune by ear below.",
  },
  busy: {
    title: "The microphone is in use",
    happened: "Another program or page holds the microphone.",
    next: "Close the other one and try again, or tune by ear below.",
  },
  interrupted: {
    title: "The sound broke off",
    happened: "The microphone was taken away, muted, or this page went into the background.",
    next: "Go on where you were: the strings you have tuned stay ticked.",
  },
};
const cannotListen = {
  title: "Listening stopped",
  happened: "This browser could not pass the sound on to the page.",
  next: "Try again, or tune by ear below.",
};

/** Why nobody listens, and how to go on. */
export function failureWords(why: string): { title: string; happened: string; next: string } {
  return failures[why] ?? cannotListen;
}
