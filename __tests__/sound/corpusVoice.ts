import { CURVE_RATE, type LineNote, type PitchCurve } from "./corpusLine";
import type { Random } from "./random";
import { rms } from "./room";
import type { Vowel } from "./vocalTract";

/** Taken out once: inside a test runner every use of a global is slow. */
const { atan2, ceil, exp, floor, max, min, PI, round, sin, sqrt } = Math;

/** Sung vowels of an adult man: five formants in Hz (common practice, rounded). */
const FORMANTS: Record<Vowel, readonly number[]> = {
  a: [680, 1150, 2500, 3100, 3700],
  e: [430, 1750, 2450, 3250, 3700],
  i: [300, 2050, 2750, 3300, 3800],
  o: [440, 820, 2450, 3050, 3600],
  u: [330, 700, 2350, 3000, 3500],
};
const NASAL = [270, 1000, 2200, 3000, 3600] as const;
const WIDTHS = [70, 90, 120, 170, 220] as const;
const BLOCK_S = 0.005;
const HIGHEST_PARTIAL_HZ = 7500;
const SINE = Float32Array.from({ length: 8193 }, (_, i) => sin((2 * PI * i) / 8192));

/** One singer's instrument. */
export interface VoiceBody {
  /** formants against a man's */
  tract: number;
  /** fall of the source in powers of the partial's number: 0.8 bright, 1.8 soft */
  tilt: number;
  /** first partial against that fall, in dB */
  firstDb: number;
  /** share of the way the first formant is opened up to a pitch above it */
  opening: number;
  /** breath against the voice in dB */
  breathDb: number;
  jitter: number;
  shimmer: number;
  /** how much weaker every second cycle is, 0 to 1: a rough voice, half way to an octave lower */
  alternation?: number;
}

/**
 * Sounds a line partial by partial: the source's fall and the vowel's resonances decide each partial's strength, so that
 * this voice shares neither pulse shape nor filter with `singPhrase`.
 *
 * @returns mono samples at about half of full scale
 */
export function soundLine(
  notes: readonly LineNote[],
  curve: PitchCurve,
  body: VoiceBody,
  durationS: number,
  rate: number,
  random: Random,
): Float32Array {
  const length = ceil(durationS * rate);
  const block = round(BLOCK_S * rate);
  const out = new Float32Array(length);
  const envelope = envelopeOf(notes, durationS, random);
  const most = 120;
  const strength = new Float32Array(most + 1);
  const step = new Float32Array(most + 1);
  const turn = new Float32Array(most + 1);
  const turnStep = new Float32Array(most + 1);
  const formants = [...FORMANTS[notes[0]!.vowel]];
  const hiss = createHiss(rate, body.tract);
  const breath = 10 ** (body.breathDb / 20);
  let [phase, stretch, loudness, wanted, odd, index] = [0, 1, 1, 1, false, 0];
  for (let from = 0; from < length; from += block) {
    const t = from / rate;
    while (index + 1 < notes.length && t >= notes[index + 1]!.start - 0.06) index++;
    const note = notes[index]!;
    const hz = hzAt(curve, from / rate);
    const partials = min(most, floor(min(HIGHEST_PARTIAL_HZ, 0.45 * rate) / hz));
    const nasal = note.onset === "nasal" && t < note.start + 0.08;
    moveFormants(formants, nasal ? NASAL : FORMANTS[note.vowel], body, hz);
    spectrum(strength, step, turn, turnStep, partials, most, hz, formants, body, block);
    const rough = note.fry ? 0.6 : (body.alternation ?? 0);
    for (let i = from; i < min(length, from + block); i++) {
      const now = i / rate;
      const f = hzAt(curve, now);
      phase += (f * stretch) / rate;
      if (phase >= 1) {
        phase -= 1;
        odd = !odd;
        stretch = max(0.5, 1 + (note.fry ? 0.12 : body.jitter) * random.normal());
        wanted = max(0.1, 1 + (note.fry ? 0.2 : body.shimmer) * random.normal()) * (odd ? 1 - rough : 1);
      }
      loudness += (wanted - loudness) * min(1, (8 * f) / rate);
      let sum = 0;
      for (let h = 1; h <= most && (h <= partials || strength[h]! > 1e-9); h++) {
        const at = h * phase + turn[h]!;
        sum += strength[h]! * SINE[((at - floor(at)) * 8192) | 0]!;
        strength[h]! += step[h]!;
        turn[h]! += turnStep[h]!;
      }
      const puff = hiss(random.normal()) * breath * (0.6 + 0.4 * SINE[(phase * 8192) | 0]!);
      const where = now * CURVE_RATE;
      out[i] = envelope[where | 0]! * (sum * loudness + puff);
    }
  }
  addConsonants(out, notes, rate, random);
  const level = rms(out, true);
  return out.map((x) => (0.12 * x) / max(1e-9, level));
}

function hzAt(curve: PitchCurve, t: number): number {
  const at = t * CURVE_RATE;
  const whole = floor(at);
  const a = curve.sung[whole]!;
  const midi = a + ((curve.sung[whole + 1] ?? a) - a) * (at - whole);
  return 440 * 2 ** ((midi - 69) / 12);
}

function moveFormants(now: number[], goal: readonly number[], body: VoiceBody, hz: number): void {
  for (let k = 0; k < now.length; k++) {
    let wanted = goal[k]! * body.tract;
    if (k === 0 && hz > wanted) wanted += (hz * 1.05 - wanted) * body.opening;
    now[k]! += (wanted - now[k]!) * 0.15;
  }
}

/** Sets each partial on its way to the strength and phase it should have one block later. */
function spectrum(
  strength: Float32Array,
  step: Float32Array,
  turn: Float32Array,
  turnStep: Float32Array,
  partials: number,
  most: number,
  hz: number,
  formants: readonly number[],
  body: VoiceBody,
  block: number,
): void {
  let power = 0;
  const goal = new Float32Array(most + 1);
  const angle = new Float32Array(most + 1);
  for (let h = 1; h <= partials; h++) {
    const f = h * hz;
    let gain = h ** -body.tilt * (h === 1 ? 10 ** (body.firstDb / 20) : 1);
    let phase = 0;
    for (let k = 0; k < formants.length; k++) {
      const centre = formants[k]!;
      const width = WIDTHS[k]! * body.tract;
      const apart = centre * centre - f * f;
      gain *= (centre * centre) / sqrt(apart * apart + width * width * f * f);
      phase -= atan2(width * f, apart) / (2 * PI);
    }
    goal[h] = gain;
    angle[h] = phase;
    power += gain * gain;
  }
  // Singers even out most, not all, of what a resonance does to the loudness of one pitch.
  const even = power > 0 ? power ** -0.4 : 0;
  for (let h = 1; h <= most; h++) {
    step[h] = (goal[h]! * even - strength[h]!) / block;
    if (strength[h] === 0) turn[h] = angle[h]!;
    turnStep[h] = h <= partials ? (angle[h]! - turn[h]!) / block : 0;
  }
}

/** Loudness every millisecond: rise and fall at the voice's edges, each note's level, a swell over longer notes. */
function envelopeOf(notes: readonly LineNote[], durationS: number, random: Random): Float32Array {
  const out = new Float32Array(ceil(durationS * CURVE_RATE) + 2);
  let level = 10 ** (notes[0]!.levelDb / 20);
  notes.forEach((note, index) => {
    const tied = notes[index + 1]?.onset === "tied";
    const rise = note.onset === "stop" ? 0.015 : random.between(0.025, 0.06);
    const fall = random.between(0.04, 0.09);
    const goal = 10 ** (note.levelDb / 20);
    const swell = random.between(-0.15, 0.25);
    if (note.onset !== "tied") level = goal;
    for (let i = ceil(note.start * CURVE_RATE); i < note.end * CURVE_RATE && i < out.length; i++) {
      const t = i / CURVE_RATE;
      const since = t - note.start;
      const left = note.end - t;
      level += (goal - level) * 0.03;
      const attack = note.onset === "tied" ? 1 : min(1, since / rise);
      const release = tied ? 1 : min(1, left / fall);
      const closed = note.onset === "nasal" && since < 0.07 ? 0.4 : 1;
      out[i] =
        level * attack * sqrt(release) * release * closed * (1 + swell * sin((PI * since) / (note.end - note.start)));
    }
  });
  return out;
}

/** Noise as it sounds through a mouth: two wide resonances. */
function createHiss(rate: number, tract: number): (x: number) => number {
  const parts = [
    [1700 * tract, 900],
    [4200 * tract, 2500],
  ].map(([hz, width]) => {
    const r = exp((-PI * width!) / rate);
    return { b: 2 * r * Math.cos((2 * PI * min(hz!, 0.4 * rate)) / rate), c: -r * r, y1: 0, y2: 0, gain: sqrt(1 - r) };
  });
  return (x) => {
    let sum = 0;
    for (const p of parts) {
      const y = p.gain * x + p.b * p.y1 + p.c * p.y2;
      p.y2 = p.y1;
      p.y1 = y;
      sum += y;
    }
    return sum;
  };
}

/** Noise of s, f, t and k just before the note, and breath taken in longer rests. */
function addConsonants(out: Float32Array, notes: readonly LineNote[], rate: number, random: Random): void {
  const level = rms(out, true);
  notes.forEach((note, index) => {
    const rest = note.start - (notes[index - 1]?.end ?? 0);
    const hissS = note.onset === "hiss" ? min(0.11, rest) : note.onset === "stop" ? 0.012 : 0;
    const loud = level * (note.onset === "hiss" ? random.between(0.08, 0.3) : 0.5);
    burst(out, rate, note.start - hissS, hissS, loud, 0.9, random);
    if (index > 0 && rest > 0.25) burst(out, rate, note.start - rest + 0.05, rest - 0.15, level * 0.03, 0.4, random);
  });
}

function burst(
  out: Float32Array,
  rate: number,
  at: number,
  lengthS: number,
  level: number,
  bright: number,
  random: Random,
): void {
  const count = round(lengthS * rate);
  const from = round(at * rate);
  let before = 0;
  for (let i = 0; i < count; i++) {
    const x = random.normal();
    if (from + i >= 0 && from + i < out.length) out[from + i]! += level * sin((PI * i) / count) * (x - bright * before);
    before = x;
  }
}
