import { execFileSync, spawnSync } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { createRandom, type Random } from "./random";
import { highPass, hum, noise } from "./room";
import { readWav } from "./wavFile";

/** Taken out once: inside a test runner every use of a global is slow. */
const { exp, floor, min, PI, round, sin } = Math;

/** Sounds without singing; each a function of a seed, 6 seconds long unless said otherwise. */
export type SoundMaker = (seed: number, sampleRate?: number, durationS?: number) => Float32Array;

const scaled = (pcm: Float32Array, gain: number): Float32Array => pcm.map((x) => x * gain);

export const silence: SoundMaker = (_seed, rate = 44100, durationS = 6) => new Float32Array(round(rate * durationS));

export const roomTone: SoundMaker = (seed, rate = 44100, durationS = 6) =>
  scaled(noise(round(rate * durationS), rate, "pink", createRandom(seed)), 0.004);

export const fanNoise: SoundMaker = (seed, rate = 44100, durationS = 6) =>
  scaled(noise(round(rate * durationS), rate, "fan", createRandom(seed)), 0.05);

export const mainsHum: SoundMaker = (seed, rate = 44100, durationS = 6) =>
  scaled(hum(round(rate * durationS), rate, seed % 2 === 0 ? 50 : 60), 0.03);

export const claps: SoundMaker = (seed, rate = 44100, durationS = 6) => {
  const random = createRandom(seed);
  const out = scaled(noise(round(rate * durationS), rate, "pink", random), 0.001);
  for (let t = 0.3; t < durationS - 0.3; t += random.between(0.35, 0.6)) burst(out, rate, t, 0.02, 0.5, random);
  return highPass(out, rate, 300);
};

export const typing: SoundMaker = (seed, rate = 44100, durationS = 6) => {
  const random = createRandom(seed);
  const out = scaled(noise(round(rate * durationS), rate, "pink", random), 0.001);
  for (let t = 0.2; t < durationS - 0.2; t += random.between(0.06, 0.25))
    burst(out, rate, t, 0.004, random.between(0.05, 0.2), random);
  return highPass(out, rate, 500);
};

function burst(out: Float32Array, rate: number, at: number, decayS: number, level: number, random: Random): void {
  const from = round(at * rate);
  for (let i = 0; i < decayS * 6 * rate && from + i < out.length; i++)
    out[from + i]! += level * random.normal() * exp(-i / (decayS * rate));
}

/** A whistled tune between about 800 and 2000 Hz: nearly a pure tone. */
export const whistle: SoundMaker = (seed, rate = 44100, durationS = 6) => {
  const random = createRandom(seed);
  const out = scaled(noise(round(rate * durationS), rate, "pink", random), 0.002);
  let phase = 0;
  let midi = 84;
  for (let from = 0.3; from < durationS - 0.5; from += 0.45) {
    midi = Math.max(80, min(95, midi + round(random.between(-4, 4))));
    for (let i = round(from * rate); i < (from + 0.4) * rate; i++) {
      const since = i / rate - from;
      phase += (2 * PI * 440 * 2 ** ((midi - 69) / 12) * (1 + 0.003 * sin(35 * since))) / rate;
      out[i]! +=
        0.3 *
        min(1, since / 0.04, (0.4 - since) / 0.04) *
        (sin(phase) + 0.02 * sin(2 * phase) + 0.02 * random.normal());
    }
  }
  return out;
};

const CHORDS = [
  [43, 47, 50, 55, 59, 67],
  [48, 52, 55, 60, 64],
  [50, 57, 62, 66],
  [40, 47, 52, 55, 59, 64],
];

/** Strummed plucked strings through open chords. */
export const strummedStrings: SoundMaker = (seed, rate = 44100, durationS = 6) => {
  const random = createRandom(seed);
  const out = new Float32Array(round(rate * durationS));
  let beat = 0;
  for (let t = 0.1; t < durationS - 0.2; t += 0.5, beat++) {
    const chord = CHORDS[floor(beat / 4) % CHORDS.length]!;
    chord.forEach((midi, i) => pluck(out, rate, t + i * 0.012, midi, random.between(0.6, 1), 0.55, random));
  }
  return scaled(out, 0.12);
};

/** One plucked string: noise in a delay line with a gentle low-pass. @see K. Karplus, A. Strong, Computer Music J. 7(2) 1983 */
export function pluck(
  out: Float32Array,
  rate: number,
  at: number,
  midi: number,
  level: number,
  lengthS: number,
  random: Random,
): void {
  const period = rate / (440 * 2 ** ((midi - 69) / 12));
  const size = floor(period - 0.5);
  const tune = period - 0.5 - size;
  const line = Float32Array.from({ length: size + 1 }, () => random.normal() * 0.5);
  const from = round(at * rate);
  const count = min(round(lengthS * rate), out.length - from);
  let before = 0;
  for (let i = 0; i < count; i++) {
    const slot = i % (size + 1);
    const behind = line[(slot + 1) % (size + 1)]!;
    const x = line[slot]! * tune + behind * (1 - tune);
    const y = 0.996 * 0.5 * (x + before);
    before = x;
    line[slot] = y;
    out[from + i]! += level * y * min(1, (count - i) / (0.02 * rate));
  }
}

/** Speech by the machine's own voice; null where espeak-ng is not installed. */
export function speech(
  text: string,
  voice = "en",
  wordsPerMinute = 160,
  pitch = 50,
): { pcm: Float32Array; sampleRate: number } | null {
  if (spawnSync("espeak-ng", ["--version"]).status !== 0) return null;
  const folder = mkdtempSync(join(tmpdir(), "speech-"));
  try {
    const path = join(folder, "speech.wav");
    execFileSync("espeak-ng", ["-v", voice, "-s", String(wordsPerMinute), "-p", String(pitch), "-w", path, text]);
    return readWav(path);
  } finally {
    rmSync(folder, { recursive: true });
  }
}
