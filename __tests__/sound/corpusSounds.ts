import { pluck } from "./noSinging";
import { biquad, fan, guitar } from "./corpusRoom";
import type { Random } from "./random";
import { addRoom, noise, rms } from "./room";

/** Taken out once: inside a test runner every use of a global is slow. */
const { exp, floor, max, min, PI, round, sin } = Math;

const toLevel = (pcm: Float32Array, level: number): Float32Array => {
  const scale = level / max(1e-9, rms(pcm));
  return pcm.map((x) => x * scale);
};
const midiHz = (midi: number): number => 440 * 2 ** ((midi - 69) / 12);

/** Somebody breathing near the microphone. */
export function breathing(rate: number, durationS: number, random: Random): Float32Array {
  const out = toLevel(noise(round(rate * durationS), rate, "pink", random), 0.001);
  for (let at = 0.3; at < durationS - 1; at += random.between(1.3, 1.9)) {
    const lengthS = random.between(0.6, 1.1);
    let air: Float32Array = Float32Array.from({ length: round(lengthS * rate) }, () => random.normal());
    air = biquad(biquad(air, rate, "peak", random.between(500, 1600), 1.5, 14), rate, "low", 3500, 0.7);
    const loud = random.between(0.02, 0.06) / max(1e-9, rms(air));
    const from = round(at * rate);
    air.forEach((x, i) => {
      if (from + i < out.length) out[from + i]! += loud * x * sin((PI * i) / air.length);
    });
  }
  return out;
}

/** Beeps of a timer or a lorry: the same tone over and over, nearly pure. */
export function beeps(rate: number, durationS: number, random: Random): Float32Array {
  const out = toLevel(noise(round(rate * durationS), rate, "pink", random), 0.001);
  const hz = random.between(420, 1250);
  const [onS, everyS] = [random.between(0.1, 0.45), random.between(0.5, 0.95)];
  const square = random.next() < 0.5 ? 0.3 : 0;
  for (let i = 0; i < out.length; i++) {
    const t = i / rate;
    const since = t % everyS;
    const edge = max(0, min(1, since / 0.004, (onS - since) / 0.004));
    out[i]! += 0.15 * edge * (sin(2 * PI * hz * t) + square * sin(6 * PI * hz * t));
  }
  return out;
}

/** A whistled tune with slides and a breathy edge. */
export function whistling(rate: number, durationS: number, random: Random): Float32Array {
  const length = round(rate * durationS);
  const out = toLevel(noise(length, rate, "pink", random), 0.0015);
  let phase = 0;
  let midi = random.between(82, 88);
  let goal = midi;
  let next = 0.3;
  let loud = 0;
  let air = 0;
  const vibrato = random.between(0, 0.25);
  for (let i = 0; i < length; i++) {
    const t = i / rate;
    if (t >= next) {
      goal = max(80, min(96, goal + floor(random.between(-5, 6))));
      next += random.between(0.25, 0.7);
    }
    midi += (goal - midi) * (12 / rate) * 4;
    const breath = t % 2.6 < 0.35 ? 0 : 1;
    loud += (breath - loud) * (30 / rate);
    phase += midiHz(midi + vibrato * sin(2 * PI * 5.5 * t)) / rate;
    air += 0.3 * (random.normal() - air);
    out[i]! += 0.2 * loud * (sin(2 * PI * phase) + 0.03 * sin(4 * PI * phase) + 0.06 * air);
  }
  return out;
}

/** A guitar alone, strummed. */
export function strumming(rate: number, durationS: number, random: Random): Float32Array {
  return toLevel(guitar(round(rate * durationS), rate, random), random.between(0.03, 0.1));
}

/** A guitar alone, picking a tune note by note. */
export function picking(rate: number, durationS: number, random: Random): Float32Array {
  const out = new Float32Array(round(rate * durationS));
  const key = floor(random.between(52, 60));
  let place = 2;
  for (let at = 0.2; at < durationS - 0.3; at += random.between(0.3, 0.55)) {
    place = max(0, min(7, place + floor(random.between(-2, 3))));
    pluck(
      out,
      rate,
      at,
      key + [0, 2, 4, 5, 7, 9, 11, 12][place]!,
      random.between(0.6, 1),
      random.between(0.5, 0.9),
      random,
    );
  }
  return toLevel(biquad(out, rate, "peak", 110, 2, 5), 0.05);
}

/** A ventilator alone. */
export function fanAlone(rate: number, durationS: number, random: Random): Float32Array {
  return toLevel(fan(round(rate * durationS), rate, random), random.between(0.01, 0.06));
}

/** A room with traffic far off and a chair that creaks. */
export function room(rate: number, durationS: number, random: Random): Float32Array {
  const length = round(rate * durationS);
  const out = toLevel(
    biquad(noise(length, rate, "pink", random), rate, "low", 600, 0.7),
    random.between(0.0008, 0.004),
  );
  for (let k = 0; k < 3; k++) {
    const from = floor(random.between(0.2, durationS - 0.5) * rate);
    const hz = random.between(200, 900);
    for (let i = 0; i < 0.12 * rate && from + i < length; i++)
      out[from + i]! += 0.01 * exp(-i / (0.03 * rate)) * sin((2 * PI * hz * i) / rate) * random.between(0.6, 1);
  }
  return out;
}

/** Clapping, with a little of the room. */
export function clapping(claps: Float32Array, rate: number, random: Random): Float32Array {
  return addRoom(claps, rate, { reverb: random.between(0, 0.4) }, random);
}
