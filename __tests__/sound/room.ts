import type { Random } from "./random";

/** Taken out once: inside a test runner every use of a global is slow. */
const { abs, max, min, PI, sin, sqrt } = Math;

/** What the room and the microphone do to a sound; everything off by default. */
export interface RoomOptions {
  /** steady noise at this signal-to-noise ratio in dB */
  noiseSnrDb?: number;
  /** colour of that noise, default "pink" */
  noiseColour?: "white" | "pink" | "fan";
  /** mains hum: fundamental in Hz and level against the sound in dB */
  hum?: { hz: number; levelDb: number };
  /** echo: share of the reverberant sound, 0 to 1 */
  reverb?: number;
  /** a small microphone: nothing below about this frequency in Hz */
  thinMicHz?: number;
  /** another sound underneath at this level in dB against the voice */
  underneath?: { pcm: Float32Array; levelDb: number };
  /** gain in dB before the converter */
  gainDb?: number;
  /** flat ceiling of the converter, default 1 */
  clipAt?: number;
}

/** @returns a new array: the sound as this room and microphone hand it over */
export function addRoom(sound: Float32Array, rate: number, options: RoomOptions, random: Random): Float32Array {
  let out: Float32Array = Float32Array.from(sound);
  if (options.reverb) out = reverberate(out, rate, options.reverb);
  const level = rms(out, true);
  if (options.underneath) mix(out, options.underneath.pcm, level * 10 ** (options.underneath.levelDb / 20));
  if (options.thinMicHz) out = highPass(highPass(out, rate, options.thinMicHz), rate, options.thinMicHz);
  const heard = rms(out, true);
  if (options.hum) mix(out, hum(out.length, rate, options.hum.hz), heard * 10 ** (options.hum.levelDb / 20));
  if (options.noiseSnrDb !== undefined)
    mix(out, noise(out.length, rate, options.noiseColour ?? "pink", random), heard * 10 ** (-options.noiseSnrDb / 20));
  const gain = 10 ** ((options.gainDb ?? 0) / 20);
  const ceiling = options.clipAt ?? 1;
  return out.map((x) => max(-ceiling, min(ceiling, x * gain)));
}

/** RMS of a sound; of its sounding part only if asked. */
export function rms(pcm: Float32Array, sounding = false): number {
  let peak = 0;
  for (const x of pcm) peak = max(peak, abs(x));
  let sum = 0;
  let count = 0;
  const block = 441;
  for (let from = 0; from < pcm.length; from += block) {
    let power = 0;
    const to = min(pcm.length, from + block);
    for (let i = from; i < to; i++) power += pcm[i]! ** 2;
    if (sounding && sqrt(power / (to - from)) < peak * 0.02) continue;
    sum += power;
    count += to - from;
  }
  return count > 0 ? sqrt(sum / count) : 0;
}

/** Adds `other`, brought to the RMS `level`, to `into`. */
export function mix(into: Float32Array, other: Float32Array, level: number): void {
  const scale = level / max(1e-12, rms(other, true));
  for (let i = 0; i < min(into.length, other.length); i++) into[i]! += scale * other[i]!;
}

/** Steady noise of a colour, at unit RMS or so. */
export function noise(length: number, rate: number, colour: "white" | "pink" | "fan", random: Random): Float32Array {
  const out = new Float32Array(length);
  const low = [0, 0, 0];
  for (let i = 0; i < length; i++) {
    const white = random.normal();
    if (colour === "white") {
      out[i] = white;
      continue;
    }
    low[0] = 0.997 * low[0]! + 0.03 * white;
    low[1] = 0.96 * low[1]! + 0.1 * white;
    low[2] = 0.6 * low[2]! + 0.3 * white;
    out[i] = low[0]! * 3 + low[1]! + low[2]! + 0.1 * white;
    if (colour === "fan") out[i]! += 0.4 * sin((2 * PI * 118 * i) / rate) + 0.2 * sin((2 * PI * 236 * i) / rate);
  }
  return out;
}

/** Mains hum with its overtones. */
export function hum(length: number, rate: number, hz: number): Float32Array {
  const parts = [1, 0.7, 0.5, 0.2, 0.25, 0.1];
  return Float32Array.from({ length }, (_, i) =>
    parts.reduce((sum, p, k) => sum + p * sin((2 * PI * hz * (k + 1) * i) / rate + k), 0),
  );
}

/** Second-order high-pass (Butterworth). */
export function highPass(pcm: Float32Array, rate: number, hz: number): Float32Array {
  const w = Math.tan((PI * hz) / rate);
  const norm = 1 / (1 + Math.SQRT2 * w + w * w);
  const b1 = 2 * (w * w - 1) * norm;
  const b2 = (1 - Math.SQRT2 * w + w * w) * norm;
  let x1 = 0,
    x2 = 0,
    y1 = 0,
    y2 = 0;
  return pcm.map((x) => {
    const y = norm * (x - 2 * x1 + x2) - b1 * y1 - b2 * y2;
    x2 = x1;
    x1 = x;
    y2 = y1;
    y1 = y;
    return y;
  });
}

/** A small live room: four feedback delays side by side. */
function reverberate(pcm: Float32Array, rate: number, share: number): Float32Array {
  const wet = new Float32Array(pcm.length);
  for (const [delayS, feedback] of [
    [0.0297, 0.75],
    [0.0371, 0.73],
    [0.0411, 0.71],
    [0.0437, 0.69],
  ] as const) {
    const delay = Math.round(delayS * rate);
    const line = new Float32Array(delay);
    for (let i = 0; i < pcm.length; i++) {
      const slot = i % delay;
      const y = line[slot]!;
      line[slot] = pcm[i]! + feedback * y;
      wet[i]! += 0.25 * y;
    }
  }
  return pcm.map((x, i) => (1 - share) * x + share * wet[i]!);
}
