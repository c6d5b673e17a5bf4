import { ANALYSIS_RATE } from "../signal/resampler";
import { MAX_LAG } from "../signal/lagFrame";

const MOST_HARMONICS = 12;
const HIGHEST_HARMONIC_HZ = 2300;
/** Harmonics whose surroundings hold less than this share of the power tell nothing. */
const LEAST_SHARE = 3e-4;
/** With fewer harmonics than this to look at, what is missing proves less. */
const SURE_FROM = 3;

const lastLag = MAX_LAG;
const lagWindow = Float32Array.from({ length: MAX_LAG + 1 }, (_, lag) =>
  lag === 0 ? 0.5 : 0.5 + 0.5 * Math.cos((Math.PI * lag) / MAX_LAG),
);

/**
 * How completely the harmonics of a pitch are there. A pitch one octave (or a twelfth) too low explains the sound's
 * repetition just as well, but every second harmonic (or two of three) is missing; two notes at once have a common
 * low period whose harmonics are mostly missing. A lost fundamental alone counts little.
 *
 * @param r autocorrelation of the frame with the room subtracted, shape [141]
 * @param hz the pitch in question
 * @param enclosed leaves out what lies above the last multiple, where a harmonic may be weak only because the sound ends,
 *   and what stands out alone, as one harmonic does on a formant: a choice between candidates can bear that, a verdict on
 *   the sound cannot
 * @returns 0 (those between are missing) to 1 (all are there); 1 where too few harmonics fit to tell
 * @see the Wiener-Khinchin theorem: the spectrum is the cosine transform of the autocorrelation
 */
export function harmonicPresence(r: Float32Array, hz: number, enclosed = false): number {
  const count = Math.min(MOST_HARMONICS, Math.floor(HIGHEST_HARMONIC_HZ / hz));
  if (count < 3 || !(r[0]! > 0)) return 1;
  const power = new Float32Array(count + 2);
  for (let h = 1; h <= count; h += 4) fourPowers(r, hz, h, count, power);
  const least = LEAST_SHARE * MAX_LAG * 0.5 * Math.max(0, r[0]!);
  let presence = 1;
  for (const every of [2, 3, 5, 7]) {
    const several = enclosed ? 2 * every <= count : every < count;
    if (several) presence = Math.min(presence, between(power, count, every, least, enclosed));
  }
  return presence;
}

/**
 * What `powerAt` says of harmonic h and the three above it as far as there are, never below 0. Four at once: each sum
 * waits for its own cosine only, so a processor works on all of them side by side.
 */
function fourPowers(r: Float32Array, hz: number, h: number, count: number, power: Float32Array): void {
  const turn = (2 * Math.PI * hz) / ANALYSIS_RATE;
  const [step0, step1] = [2 * Math.cos(turn * h), 2 * Math.cos(turn * (h + 1))];
  const [step2, step3] = [2 * Math.cos(turn * (h + 2)), 2 * Math.cos(turn * (h + 3))];
  let [before0, before1, before2, before3] = [step0 / 2, step1 / 2, step2 / 2, step3 / 2];
  let [now0, now1, now2, now3] = [1, 1, 1, 1];
  let [sum0, sum1, sum2, sum3] = [0, 0, 0, 0];
  for (let lag = 0; lag <= lastLag; lag++) {
    const weighed = lagWindow[lag]! * r[lag]!;
    sum0 += weighed * now0;
    sum1 += weighed * now1;
    sum2 += weighed * now2;
    sum3 += weighed * now3;
    const next0 = step0 * now0 - before0;
    const next1 = step1 * now1 - before1;
    const next2 = step2 * now2 - before2;
    const next3 = step3 * now3 - before3;
    before0 = now0;
    before1 = now1;
    before2 = now2;
    before3 = now3;
    now0 = next0;
    now1 = next1;
    now2 = next2;
    now3 = next3;
  }
  power[h] = Math.max(0, sum0);
  if (h + 1 <= count) power[h + 1] = Math.max(0, sum1);
  if (h + 2 <= count) power[h + 2] = Math.max(0, sum2);
  if (h + 3 <= count) power[h + 3] = Math.max(0, sum3);
}

/** Geometric mean of two powers, `share` of the way from the first to the second. */
function onTheWay(from: number, to: number, share: number): number {
  if (share === 0.5) return Math.sqrt(from * to);
  return from > 0 ? from * (to / from) ** share : 0;
}

/**
 * Mean presence of the harmonics between the multiples of `every`, against the slope from multiple to multiple, and
 * above the last multiple against that one, unless only those enclosed are asked for.
 */
function between(power: Float32Array, count: number, every: number, least: number, enclosed: boolean): number {
  let sum = 0;
  let weight = 0;
  const last = enclosed ? count - (count % every) : count;
  for (let h = 1; h <= last; h++) {
    if (h % every === 0) continue;
    const below = power[h - (h % every)]!;
    const above = h - (h % every) + every <= count ? power[h - (h % every) + every]! : below;
    const share = (h % every) / every;
    const expected = h < every ? above : onTheWay(Math.max(below, 1e-3 * above), Math.max(above, 1e-3 * below), share);
    if (expected < least && power[h]! < least) continue;
    const trust = h < every ? 0.5 : 1;
    sum += trust * Math.min(1, Math.sqrt(power[h]! / Math.max(expected, 1e-30)));
    weight += trust;
  }
  if (weight < 1) return 1;
  const sure = Math.min(1, weight / SURE_FROM);
  return 1 - sure * (1 - sum / weight);
}

/**
 * Power of the sound near one frequency, from its autocorrelation (resolution about 57 Hz).
 *
 * @param r autocorrelation, shape [141]
 * @param hz frequency, 0 to 2300 Hz
 * @returns power in arbitrary units, comparable within one frame
 */
export function powerAt(r: Float32Array, hz: number): number {
  const step = 2 * Math.cos((2 * Math.PI * hz) / ANALYSIS_RATE);
  let before = step / 2;
  let now = 1;
  let sum = 0;
  for (let lag = 0; lag <= lastLag; lag++) {
    sum += lagWindow[lag]! * r[lag]! * now;
    const next = step * now - before;
    before = now;
    now = next;
  }
  return sum;
}
