import type { Delivery, LineNote, Onset } from "./corpusLine";
import type { VoiceBody } from "./corpusVoice";
import type { Random } from "./random";
import type { Vowel } from "./vocalTract";

const { abs, ceil, floor, max, min, round } = Math;

/** Voices with the lowest and highest note they are asked for (MIDI) and the bounds of their tract against a man's. */
export const VOICES = {
  bass: { low: 40, high: 60, tract: [0.94, 1.0] },
  baritone: { low: 43, high: 64, tract: [0.97, 1.04] },
  tenor: { low: 48, high: 69, tract: [1.0, 1.06] },
  alto: { low: 53, high: 74, tract: [1.1, 1.17] },
  mezzo: { low: 57, high: 77, tract: [1.12, 1.19] },
  soprano: { low: 60, high: 84, tract: [1.14, 1.22] },
  child: { low: 58, high: 77, tract: [1.25, 1.42] },
} as const;
export type VoiceName = keyof typeof VOICES;

/** Shapes of phrases. */
export type PhraseKind = "song" | "scale" | "arpeggio" | "long" | "ornamented" | "flipping";

const VOWELS: readonly Vowel[] = ["a", "e", "i", "o", "u"];
const MAJOR = [0, 2, 4, 5, 7, 9, 11];

/** A singer of that kind: bright or soft, steady or not, with more or less breath. */
export function makeBody(voice: VoiceName, random: Random): VoiceBody {
  const [from, to] = VOICES[voice].tract;
  const soft = random.next();
  return {
    tract: random.between(from, to),
    tilt: 0.85 + 0.75 * soft,
    firstDb: random.between(-4, 2) + 6 * soft,
    opening: random.between(0.3, 1),
    breathDb: random.between(-42, -24),
    jitter: random.between(0.002, 0.008),
    shimmer: random.between(0.01, 0.06),
  };
}

export function makeDelivery(random: Random): Delivery {
  return {
    vibrato: null,
    scoopCents: random.between(0, 60),
    glideS: random.between(0.04, 0.1),
    driftCents: random.between(4, 14),
  };
}

export function makeVibrato(random: Random): { rateHz: number; extentCents: number } {
  return { rateHz: random.between(4.9, 6.9), extentCents: random.between(35, 100) };
}

/** Steps above the lowest note of the phrase, with durations in seconds. */
type Plan = { step: number; durationS: number }[];

function plan(kind: PhraseKind, span: number, random: Random): Plan {
  const beat = random.between(0.38, 0.6);
  const scale = [0, 1].flatMap((octave) => MAJOR.map((s) => s + 12 * octave)).filter((s) => s <= span);
  const top = scale.length - 1;
  const even = (steps: readonly number[]): Plan =>
    steps.map((step) => ({ step, durationS: beat * random.between(0.9, 1.1) }));
  if (kind === "scale") return even([...scale, ...scale.slice(0, -1).reverse()].slice(0, 17));
  if (kind === "arpeggio") {
    const chord = [0, 4, 7, 12, 16].filter((s) => s <= span);
    return even([...chord, ...chord.slice(0, -1).reverse(), ...chord.slice(1), 0]);
  }
  if (kind === "long")
    return [2, 0, 4, top, 3].map((at) => ({ step: scale[min(at, top)]!, durationS: random.between(1, 1.8) }));
  const places = Array.from({ length: 14 }, () => 0);
  places[0] = floor(random.between(1, top));
  for (let k = 1; k < places.length; k++) places[k] = max(0, min(top, places[k - 1]! + round(random.normal() * 1.8)));
  places[floor(random.between(2, 6))] = 0;
  places[floor(random.between(7, 12))] = top;
  return places.map((at) => ({
    step: scale[at]!,
    durationS: beat * (random.next() < 0.25 ? random.between(1.5, 2.2) : random.between(0.85, 1.1)),
  }));
}

/**
 * A phrase of about seven seconds for a voice, somewhere in its compass, by a singer whose tuning is off by a common
 * amount and unevenly by a little more.
 *
 * @param options creak: ends some phrases in vocal fry; tied: share of notes joined to the one before
 */
export function makeLine(
  voice: VoiceName,
  kind: PhraseKind,
  random: Random,
  options: { creak?: boolean; tied?: number } = {},
): { notes: LineNote[]; durationS: number } {
  const { low, high } = VOICES[voice];
  const span = min(high - low, floor(random.between(8, 17)));
  const bottom = low + floor(random.between(0, high - low - span + 0.999));
  const tuning = random.between(-0.45, 0.45);
  const slope = random.between(0.1, 0.45);
  const notes: LineNote[] = [];
  let at = random.between(0.3, 0.7);
  plan(kind, span, random).forEach(({ step, durationS }, index, all) => {
    const rest = index > 0 && index % 5 === 0 ? random.between(0.3, 0.5) : 0;
    const onset: Onset =
      index > 0 && rest === 0 && random.next() < (options.tied ?? 0.4)
        ? "tied"
        : pick(["open", "stop", "hiss", "nasal"] as const, random);
    const gap =
      rest +
      { tied: 0, open: 0.02, stop: random.between(0.04, 0.07), hiss: random.between(0.06, 0.12), nasal: 0.015 }[onset];
    const start = at + gap;
    const midi = bottom + step + tuning + random.normal() * 0.15;
    const levelDb = max(-12, min(6, slope * (step - span / 2) + random.between(-2.5, 2.5)));
    const note: LineNote = { midi, start, end: start + durationS, onset, vowel: pick(VOWELS, random), levelDb };
    notes.push(...decorated(kind, note, random));
    at = notes[notes.length - 1]!.end;
    const last = index === all.length - 1;
    if (options.creak && (last || index % 5 === 4)) {
      const fry: LineNote = {
        ...note,
        midi: 28 + random.between(-3, 4),
        start: at,
        end: at + random.between(0.2, 0.45),
        onset: "tied",
        levelDb: note.levelDb - 6,
        fry: true,
      };
      notes.push(fry);
      at = fry.end + (last ? 0 : 0.25);
      const next = random.between(0.02, 0.08);
      at += next;
    }
  });
  untieAfterFry(notes);
  return { notes, durationS: ceil((at + random.between(0.3, 0.6)) * 100) / 100 };
}

function untieAfterFry(notes: LineNote[]): void {
  notes.forEach((note, k) => {
    if (note.onset === "tied" && notes[k - 1] && notes[k - 1]!.end < note.start - 1e-6) note.onset = "open";
  });
}

/** Grace notes and voice breaks: far off the melody, and too short to count. */
function decorated(kind: PhraseKind, note: LineNote, random: Random): LineNote[] {
  if (kind === "ornamented" && random.next() < 0.4) {
    const grace = random.between(0.07, 0.11);
    const away = (random.next() < 0.7 ? 1 : -1) * floor(random.between(2, 8));
    return [
      { ...note, midi: note.midi + away, end: note.start + grace },
      { ...note, start: note.start + grace, end: note.end + grace, onset: "tied" },
    ];
  }
  if (kind === "flipping" && random.next() < 0.3) {
    const flip = random.between(0.06, 0.1);
    const up = 12 + random.between(-1, 1);
    return [
      note,
      {
        ...note,
        midi: note.midi + up,
        start: note.end,
        end: note.end + flip,
        onset: "tied",
        levelDb: note.levelDb - 4,
      },
    ];
  }
  return [note];
}

function pick<T>(from: readonly T[], random: Random): T {
  return from[floor(random.next() * from.length)]!;
}

/** A single note; @returns a line of `durationS` with silence around it */
export function oneNote(voice: VoiceName, durationS: number, random: Random): { notes: LineNote[]; durationS: number } {
  const { low, high } = VOICES[voice];
  const midi = random.between(low + 3, high - 3);
  const note: LineNote = {
    midi,
    start: 0.4,
    end: 0.4 + durationS,
    onset: "open",
    vowel: pick(VOWELS, random),
    levelDb: 0,
  };
  return { notes: [note], durationS: durationS + 0.8 + abs(random.normal()) * 0.1 };
}
