import { midiToHz } from "./pitch";

/** How a string sounds. */
export interface StringSound {
  /** seconds in which its sound falls by 60 dB */
  decayS: number;
  /** 0 = dull (a thumb) to 1 = bright (a pick) */
  bright: number;
  /** seconds that are rendered */
  lengthS: number;
}

/**
 * The sound of one plucked string: one period that runs round a damped loop, tuned by an all-pass.
 *
 * @param midi note, fractional allowed
 * @param sampleRate samples a second
 * @param sound how it is plucked and how long it sounds
 * @returns samples from -1 to 1; the same for the same note each time
 * @see K. Karplus, A. Strong, "Digital Synthesis of Plucked-String and Drum Timbres", Computer Music Journal 7(2), 1983;
 *   D. Jaffe, J. Smith, "Extensions of the Karplus-Strong Plucked-String Algorithm", ibid.
 */
export function pluckString(midi: number, sampleRate: number, sound: StringSound): Float32Array<ArrayBuffer> {
  const hz = midiToHz(midi);
  const period = sampleRate / hz;
  // The loop's averaging delays by half a sample; the all-pass makes up the rest, 0.1 to 1.1 samples.
  const whole = Math.max(2, Math.floor(period - 0.6));
  const fraction = period - 0.5 - whole;
  const allPass = (1 - fraction) / (1 + fraction);
  const keep = Math.min(0.9999, 10 ** (-3 / (hz * sound.decayS)));
  const loop = pluck(whole, sound.bright, midi);
  const out = new Float32Array(Math.ceil(sound.lengthS * sampleRate));
  let at = 0;
  let lastLoop = loop[whole - 1]!;
  let lastIn = 0;
  let lastOut = 0;
  let peak = 1e-9;
  for (let i = 0; i < out.length; i += 1) {
    const now = loop[at]!;
    out[i] = now;
    if (Math.abs(now) > peak) peak = Math.abs(now);
    const damped = (keep * (now + lastLoop)) / 2;
    lastLoop = now;
    lastOut = allPass * (damped - lastOut) + lastIn;
    lastIn = damped;
    loop[at] = lastOut;
    at = at + 1 === whole ? 0 : at + 1;
  }
  const fade = Math.min(out.length, Math.round(0.05 * sampleRate));
  for (let i = 0; i < out.length; i += 1) {
    out[i]! *= Math.min(1, (out.length - i) / fade) / peak;
  }
  return out;
}

/** Where it is plucked, as a part of its length: every fifth partial is missing. */
const pluckedAt = 1 / 5;
const mostPartials = 60;

/**
 * One period of a plucked string: partials that fall evenly, faster where it is plucked softly, in phases scattered by
 * the note. Noise would do for a start, but its lowest partial may be missing by chance, and then the note is not heard.
 */
function pluck(length: number, bright: number, seed: number): Float32Array {
  const period = new Float32Array(length);
  let state = (Math.round(seed * 100) * 2654435761) >>> 0 || 1;
  const fall = 0.5 + (1 - bright);
  for (let k = 1; k <= Math.min(mostPartials, length / 2 - 1); k += 1) {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    const phase = (2 * Math.PI * state) / 2 ** 32;
    const amplitude = Math.abs(Math.sin(Math.PI * k * pluckedAt)) * k ** -fall;
    for (let i = 0; i < length; i += 1) period[i]! += amplitude * Math.sin((2 * Math.PI * k * i) / length + phase);
  }
  return period;
}
