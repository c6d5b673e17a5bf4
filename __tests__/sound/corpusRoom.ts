import { pluck } from "./noSinging";
import type { Random } from "./random";
import { mix, noise, rms } from "./room";

/** Taken out once: inside a test runner every use of a global is slow. */
const { abs, cos, exp, floor, log, max, min, PI, round, sign, sin } = Math;

/** A second-order filter in the form of R. Bristow-Johnson's audio cookbook. @see W3C Note "Audio EQ Cookbook" */
export function biquad(
  pcm: Float32Array,
  rate: number,
  kind: "high" | "low" | "peak",
  hz: number,
  q: number,
  gainDb = 0,
): Float32Array {
  const w = (2 * PI * min(hz, 0.45 * rate)) / rate;
  const alpha = sin(w) / (2 * q);
  const a = 10 ** (gainDb / 40);
  const c = cos(w);
  const [b0, b1, b2, a0, a2] =
    kind === "peak"
      ? [1 + alpha * a, -2 * c, 1 - alpha * a, 1 + alpha / a, 1 - alpha / a]
      : kind === "high"
        ? [(1 + c) / 2, -(1 + c), (1 + c) / 2, 1 + alpha, 1 - alpha]
        : [(1 - c) / 2, 1 - c, (1 - c) / 2, 1 + alpha, 1 - alpha];
  let x1 = 0,
    x2 = 0,
    y1 = 0,
    y2 = 0;
  return pcm.map((x) => {
    const y = (b0 * x + b1 * x1 + b2 * x2 + 2 * c * y1 - a2 * y2) / a0;
    x2 = x1;
    x1 = x;
    y2 = y1;
    y1 = y;
    return y;
  });
}

/** Steady noise so many dB under the sound. */
export function addNoise(
  pcm: Float32Array,
  rate: number,
  snrDb: number,
  random: Random,
  colour: "white" | "pink" = "pink",
): Float32Array {
  const out = pcm.slice();
  mix(out, noise(pcm.length, rate, colour, random), rms(pcm, true) * 10 ** (-snrDb / 20));
  return out;
}

/** Mains hum with the buzz of a power supply. */
export function addMains(pcm: Float32Array, rate: number, hz: number, levelDb: number, random: Random): Float32Array {
  const parts = Array.from({ length: 12 }, (_, k) => ({
    gain: (k === 0 ? 1 : k % 2 === 1 ? 0.8 : 0.4) * random.between(0.4, 1) * (k + 1) ** -0.6,
    phase: random.between(0, 2 * PI),
  }));
  const out = pcm.slice();
  const buzz = pcm.map((_, i) =>
    parts.reduce((sum, p, k) => sum + p.gain * sin((2 * PI * hz * (k + 1) * i) / rate + p.phase), 0),
  );
  mix(out, buzz, rms(pcm, true) * 10 ** (levelDb / 20));
  return out;
}

/** A ventilator: rushing air and the tone of its blades, both slowly swelling. */
export function addFan(pcm: Float32Array, rate: number, snrDb: number, random: Random): Float32Array {
  const out = pcm.slice();
  mix(out, fan(pcm.length, rate, random), rms(pcm, true) * 10 ** (-snrDb / 20));
  return out;
}

export function fan(length: number, rate: number, random: Random): Float32Array {
  const blade = random.between(75, 210);
  const swell = random.between(0.2, 0.7);
  const tones = [0.5, 0.3, 0.12].map((gain) => gain * random.between(0.3, 1.1));
  const air = biquad(noise(length, rate, "pink", random), rate, "low", random.between(900, 2500), 0.7);
  const level = max(1e-9, rms(air));
  return air.map((x, i) => {
    const t = i / rate;
    const tone = tones.reduce((sum, gain, k) => sum + gain * sin(2 * PI * blade * (k + 1) * t + k), 0);
    return (x / level + 0.6 * tone) * (1 + 0.15 * sin(2 * PI * swell * t));
  });
}

/** A laptop's microphone: next to nothing below 220 to 380 Hz, a peak in the treble, its own noise. */
export function laptopMicrophone(pcm: Float32Array, rate: number, random: Random): Float32Array {
  const corner = random.between(220, 380);
  let out = biquad(biquad(pcm, rate, "high", corner, 0.54), rate, "high", corner, 1.31);
  out = biquad(out, rate, "peak", random.between(2500, 4500), 1.2, random.between(3, 8));
  out = biquad(out, rate, "low", 9000, 0.7);
  return addNoise(out, rate, random.between(26, 34), random, "white");
}

/** A phone call: 300 to 3400 Hz, levels evened out by the phone, eight bits in the logarithmic steps of ITU-T G.711. */
export function phoneMicrophone(pcm: Float32Array, rate: number, random: Random): Float32Array {
  let out = biquad(biquad(pcm, rate, "high", 300, 0.54), rate, "high", 300, 1.31);
  out = biquad(biquad(out, rate, "low", 3400, 0.54), rate, "low", 3400, 1.31);
  const typical = max(1e-9, rms(out, true));
  let level = typical;
  out = out.map((x) => {
    level += (max(abs(x), 0.05 * typical) - level) * (abs(x) > level ? 0.002 : 0.00004);
    return max(-1, min(1, (0.2 * x * (level / typical) ** -0.5) / typical));
  });
  return addNoise(out, rate, random.between(28, 36), random, "white").map(eightBits);
}

function eightBits(x: number): number {
  const bent = (sign(x) * log(1 + 255 * min(1, abs(x)))) / log(256);
  const kept = round(bent * 127) / 127;
  return (sign(kept) * (256 ** abs(kept) - 1)) / 255;
}

/** A ringing room: eight delays that feed each other evenly, with a duller tail. @param rt60 seconds to -60 dB @param wet share of the echo */
export function hall(pcm: Float32Array, rate: number, rt60: number, wet: number, random: Random): Float32Array {
  const lines = [0.0213, 0.0271, 0.0319, 0.0367, 0.0413, 0.0461, 0.0523, 0.0597].map((s) => {
    const size = round(s * random.between(0.93, 1.07) * rate);
    return { delay: new Float32Array(size), size, gain: 10 ** ((-3 * size) / (rate * rt60)), dull: 0 };
  });
  const echo = pcm.map((x, i) => {
    let sum = 0;
    for (const line of lines) {
      line.dull += 0.6 * (line.delay[i % line.size]! - line.dull);
      sum += line.dull;
    }
    for (const line of lines) line.delay[i % line.size] = x + line.gain * (line.dull - sum / 4);
    return sum;
  });
  const out = pcm.map((x) => x * (1 - wet));
  mix(out, echo, rms(pcm, true) * wet);
  return out;
}

/** Overdriven into the converter's ceiling. */
export function clipped(pcm: Float32Array, drive: number): Float32Array {
  let peak = 1e-9;
  for (const x of pcm) peak = max(peak, abs(x));
  return pcm.map((x) => max(-1, min(1, (drive * x) / peak)));
}

/** A noise gate: digital silence whenever the level is low, with a short fade. */
export function gated(pcm: Float32Array, rate: number): Float32Array {
  const threshold = rms(pcm, true) * 0.06;
  let level = 0;
  let gain = 0;
  return pcm.map((x) => {
    level = max(abs(x), level * exp(-1 / (0.03 * rate)));
    gain += ((level > threshold ? 1 : 0) - gain) * 0.004;
    return gain < 0.01 ? 0 : x * gain;
  });
}

const SHAPES = [
  [0, 7, 12, 16, 19, 24],
  [0, 7, 12, 15, 19, 24],
  [0, 7, 10, 16, 19],
] as const;

/** A guitar strummed through chords of some key; the strings ring on until the next stroke. */
export function guitar(length: number, rate: number, random: Random): Float32Array {
  const out = new Float32Array(length);
  const key = floor(random.between(40, 46));
  const beatS = random.between(0.32, 0.62);
  const degrees = [0, 5, 7, 0, 9, 5, 2, 7];
  for (let beat = 0; beat * beatS < length / rate; beat++) {
    if (beat % 4 === 3 && random.next() < 0.4) continue;
    const degree = degrees[floor(beat / 4) % degrees.length]!;
    const minor = degree === 9 || degree === 2;
    const shape = minor ? SHAPES[1] : SHAPES[random.next() < 0.2 ? 2 : 0];
    const root = key + (degree > 7 ? degree - 12 : degree);
    const low = root < 40 ? root + 12 : root;
    const up = beat % 2 === 1;
    const strings = up ? [...shape].reverse().slice(0, 4) : [...shape];
    strings.forEach((step, k) =>
      pluck(
        out,
        rate,
        beat * beatS + k * random.between(0.008, 0.016),
        low + step,
        random.between(0.5, 1),
        beatS * 1.3,
        random,
      ),
    );
  }
  return biquad(out, rate, "peak", random.between(95, 130), 2, 5);
}

/** A guitar somewhere beside the singer. */
export function addGuitar(pcm: Float32Array, rate: number, levelDb: number, random: Random): Float32Array {
  const out = pcm.slice();
  mix(out, guitar(pcm.length, rate, random), rms(pcm, true) * 10 ** (levelDb / 20));
  return out;
}
