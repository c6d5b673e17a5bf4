import { createRandom, type Random } from "./random";
import { addRoom, rms, type RoomOptions } from "./room";
import { createVocalTract, type Vowel } from "./vocalTract";

/** Taken out once: inside a test runner every use of a global is slow. */
const { abs, max, min, PI, sin } = Math;

export interface PhraseNote {
  /** fractional MIDI number of the note's centre */
  midi: number;
  /** from its onset to the next onset, in seconds */
  durationS: number;
  /** level against the phrase in dB, default 0 */
  levelDb?: number;
  /** silence or consonant before the note in seconds, taken from its duration; default by `consonants` */
  gapS?: number;
}

export interface PhraseOptions extends RoomOptions {
  notes: PhraseNote[];
  /** one vowel per note, repeated as needed; default a e i o u */
  vowels?: Vowel[];
  seed?: number;
  sampleRate?: number;
  /** formant scale: 1 adult man, 1.15 adult woman, 1.3 child */
  tract?: number;
  vibrato?: { rateHz: number; extentCents: number };
  /** cents below the note where each onset starts, gliding in over 80 ms; default 0 */
  scoopCents?: number;
  /** share of notes that begin with a consonant (noise and a gap), 0 to 1; default 0.4 */
  consonants?: number;
  /** aspiration noise against the voice, in dB; default -32 */
  breathDb?: number;
  /** cycle-to-cycle changes of period and amplitude, as shares; defaults 0.004 and 0.03 */
  jitter?: number;
  shimmer?: number;
  /** low-pass of the glottal source in Hz; lower is softer; default 2500 */
  tiltHz?: number;
  /** silence before and after, in seconds; default 0.3 */
  padS?: number;
}

/** What was really sung. */
export interface PhraseTruth {
  notes: { start: number; end: number; midi: number }[];
  lowestMidi: number;
  highestMidi: number;
  /** Hz every 10 ms; null where no voice sounds */
  f0: (number | null)[];
}

/**
 * Sings a phrase: a glottal pulse train through five formants, with everything people and rooms add.
 * Used by the engine's tests and, written to a wav with `padS: 1`, as the browser journeys' microphone.
 *
 * @example
 *   const { pcm, truth } = singPhrase({ notes: [{ midi: 57, durationS: 0.6 }], seed: 1, sampleRate: 48000, padS: 1 });
 *   writeWav(path, pcm, 48000);
 */
export function singPhrase(options: PhraseOptions): { pcm: Float32Array; truth: PhraseTruth; sampleRate: number } {
  const { notes, seed = 1, sampleRate = 44100, padS = 0.3 } = options;
  const random = createRandom(seed);
  const sounding = layNotes(notes, padS, options.consonants ?? 0.4, random);
  const durationS = padS * 2 + notes.reduce((sum, n) => sum + n.durationS, 0);
  const pitch = pitchCurve(sounding, options, random, durationS);
  const voice = soundVoice(sounding, pitch, options, random, Math.round(durationS * sampleRate), sampleRate);
  const pcm = addRoom(voice, sampleRate, options, random);
  const f0: (number | null)[] = [];
  for (let k = 0; k < Math.floor(durationS * 100); k++) {
    const inside = sounding.some((n) => k / 100 >= n.start && k / 100 < n.end);
    f0.push(inside ? midiHz(pitch(k / 100)) : null);
  }
  const truth = {
    notes: sounding.map(({ start, end, midi }) => ({ start, end, midi })),
    lowestMidi: min(...notes.map((n) => n.midi)),
    highestMidi: max(...notes.map((n) => n.midi)),
    f0,
  };
  return { pcm, truth, sampleRate };
}

interface Sounding extends PhraseNote {
  start: number;
  end: number;
  consonantFrom: number | null;
}

function midiHz(midi: number): number {
  return 440 * 2 ** ((midi - 69) / 12);
}

function layNotes(notes: PhraseNote[], padS: number, consonants: number, random: Random): Sounding[] {
  let at = padS;
  return notes.map((note) => {
    const spoken = random.next() < consonants;
    const gap = note.gapS ?? (spoken ? random.between(0.04, 0.09) : 0);
    const start = at + min(gap, note.durationS / 2);
    const consonantFrom = spoken && gap > 0 ? at : null;
    at += note.durationS;
    return { ...note, start, end: at, consonantFrom };
  });
}

function pitchCurve(
  sounding: Sounding[],
  options: PhraseOptions,
  random: Random,
  durationS: number,
): (t: number) => number {
  const { vibrato, scoopCents = 0 } = options;
  const drift = Array.from({ length: Math.ceil(durationS * 10) + 2 }, () => 0.05 * random.normal());
  const phase = random.between(0, 2 * PI);
  return (t) => {
    let index = 0;
    while (index + 1 < sounding.length && t >= sounding[index + 1]!.start) index++;
    const note = sounding[index]!;
    const before = index > 0 ? sounding[index - 1]! : null;
    const since = t - note.start;
    let midi = note.midi;
    if (before && before.end >= note.start - 1e-6 && since < 0.06)
      midi = before.midi + (note.midi - before.midi) * ease(since / 0.06);
    else if (scoopCents > 0 && since < 0.08) midi -= (scoopCents / 100) * (1 - ease(since / 0.08));
    const slot = max(0, t * 10);
    const whole = Math.floor(slot);
    midi += (drift[whole] ?? 0) + ((drift[whole + 1] ?? 0) - (drift[whole] ?? 0)) * (slot - whole);
    if (vibrato)
      midi +=
        (vibrato.extentCents / 100) * min(1, max(0, since - 0.1) / 0.2) * sin(2 * PI * vibrato.rateHz * t + phase);
    return midi;
  };
}

function ease(x: number): number {
  const c = max(0, min(1, x));
  return c * c * (3 - 2 * c);
}

function soundVoice(
  sounding: Sounding[],
  pitch: (t: number) => number,
  options: PhraseOptions,
  random: Random,
  length: number,
  rate: number,
): Float32Array {
  const {
    vowels = ["a", "e", "i", "o", "u"],
    tract = 1,
    breathDb = -32,
    jitter = 0.004,
    shimmer = 0.03,
    tiltHz = 2500,
  } = options;
  const filter = createVocalTract(rate, tract);
  const out = new Float32Array(length);
  const tilt = Math.exp((-2 * PI * tiltHz) / rate);
  const breath = 10 ** (breathDb / 20);
  let phase = 0;
  let stretch = 1;
  let loudness = 1;
  let soft = 0;
  let hz = 0;
  let index = 0;
  for (let i = 0; i < length; i++) {
    const t = i / rate;
    while (index + 1 < sounding.length && t >= (sounding[index + 1]!.consonantFrom ?? sounding[index + 1]!.start))
      index++;
    const note = sounding[index]!;
    if (i % 32 === 0) {
      hz = midiHz(pitch(t));
      filter.setVowel(vowels[index % vowels.length]!, 0.02, hz);
    }
    const next = sounding[index + 1];
    const tied = next !== undefined && next.start - note.end < 1e-6;
    const rise = index > 0 && sounding[index - 1]!.end >= note.start - 1e-6 ? 1 : ease((t - note.start) / 0.03);
    const fall = tied ? 1 : ease((note.end - t) / 0.03);
    const gain = t >= note.start && t < note.end ? rise * fall * 10 ** ((note.levelDb ?? 0) / 20) : 0;
    const step = (hz * stretch) / rate;
    let source = glottalFlow(phase, step);
    phase += step;
    if (phase >= 1) {
      phase -= 1;
      stretch = 1 + jitter * random.normal();
      loudness = 1 + shimmer * random.normal();
    }
    source *= loudness;
    soft = tilt * soft + (1 - tilt) * (source + breath * 2 * random.normal());
    const hiss =
      note.consonantFrom !== null && t >= note.consonantFrom && t < note.start - 0.005 ? 0.02 * random.normal() : 0;
    out[i] = filter.next(soft * gain) + hiss;
  }
  evenOut(out, sounding, rate);
  let peak = 1e-9;
  for (const x of out) peak = max(peak, abs(x));
  return out.map((x) => (0.4 * x) / peak);
}

/** Singers keep their notes about equally loud, whatever a formant does to one pitch: most of the difference is taken out. */
function evenOut(pcm: Float32Array, sounding: Sounding[], rate: number): void {
  const spans = sounding.map((n) => [Math.round(n.start * rate), min(pcm.length, Math.round(n.end * rate))] as const);
  const levels = spans.map(([from, to], k) => rms(pcm.subarray(from, to)) / 10 ** ((sounding[k]!.levelDb ?? 0) / 20));
  const mean = levels.reduce((sum, x) => sum + x, 0) / levels.length;
  const gains = levels.map((x) => (mean / max(1e-12, x)) ** 0.75);
  const blend = 0.04 * rate;
  spans.forEach(([from], k) => {
    const to = spans[k + 1]?.[0] ?? pcm.length;
    const before = k === 0 ? gains[0]! : gains[k - 1]!;
    for (let i = from; i < to; i++) pcm[i]! *= before + (gains[k]! - before) * ease((i - from) / blend);
  });
}

/** Derivative of the glottal flow: open for 60 % of the cycle, with the closing step smoothed against aliasing. */
function glottalFlow(phase: number, step: number): number {
  const open = 0.6;
  const p = phase / open;
  let value = phase < open ? 2 * p - 3 * p * p : 0;
  const toClose = phase - open;
  if (abs(toClose) < step) {
    const x = toClose / step;
    value += x < 0 ? 0.5 * (x + 1) ** 2 : -0.5 * (1 - x) ** 2;
  }
  return value;
}
