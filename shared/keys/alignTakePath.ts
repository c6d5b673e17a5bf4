/** Frames a second in which a take is laid on a tune. */
export const PATH_RATE = 25;

/** A tune in frames. */
export interface WantedFrames {
  /** MIDI number of each frame; NaN in rests */
  midi: Float32Array;
  /** 1 where a phrase begins */
  begins: Uint8Array;
  /** 1 on the last frame of a phrase */
  ends: Uint8Array;
}

/** A path that is known beforehand within limits. */
export interface PathBand {
  /** frame of the tune that frame 0 of the take should lie on */
  first: number;
  halfWidth: number;
}

/** Taken out once: inside a test runner every use of a global is slow. */
const { abs, max, min, round } = Math;
const silent = (midi: number) => midi !== midi;

/** Costs of one frame; 1 is a frame sung on quite another note. */
const unsung = 0.45;
const sungInRest = 0.35;
const sungAside = 0.4;
const slower = 0.22;
const faster = 0.22;
/** Beginning a phrase, leaving at its end, and breaking off within it. */
const begin = 6;
const leave = 2;
const breakOff = 12;
/** From this distance in semitones on a note is quite another. */
const otherNote = 2.5;

/**
 * Distance of two pitches whatever their octaves.
 *
 * @param semitones difference, fractional
 * @returns the difference folded into -6 to 6
 * @example foldedSemitones(11.5) // => -0.5
 */
export function foldedSemitones(semitones: number): number {
  return semitones - 12 * round(semitones / 12);
}

/**
 * The cheapest way of a take through a tune (dynamic time warping): each frame of the take lies on a frame of the tune,
 * which goes on, waits or hurries; between phrases the singer may leave the tune and come in again anywhere.
 *
 * @param sung MIDI numbers of the take's frames, NaN where nothing is sung
 * @param wanted the tune
 * @param offset semitones that the singer sings from the tune, fractional
 * @param band limits within which the singer kept to a backing; then the tune is not left
 * @returns frame of the tune for each frame of the take, -1 outside the tune; and the cost of a frame on average
 * @see H. Sakoe, S. Chiba, IEEE Trans. ASSP 26(1), 1978; its weights here are the project's own
 */
export function pathThroughTune(
  sung: Float32Array,
  wanted: WantedFrames,
  offset: number,
  band: PathBand | null,
): { frames: Int32Array; cost: number } {
  const width = wanted.midi.length;
  const length = sung.length;
  const steps = new Uint8Array(length * width);
  const aside = new Int32Array(length).fill(-1);
  let costs = new Float32Array(width).fill(Infinity);
  let outside = band ? Infinity : 0;
  let next = new Float32Array(width);
  for (let t = 0; t < length; t += 1) {
    const from = band ? max(0, round(band.first + t - band.halfWidth)) : 0;
    const to = band ? min(width - 1, round(band.first + t + band.halfWidth)) : width - 1;
    next.fill(Infinity);
    let leaving = outside;
    const fresh = band !== null && !costs.some((cost) => cost < Infinity);
    for (let j = from; j <= to; j += 1) {
      const rest = silent(wanted.midi[j]!);
      const quiet = silent(sung[t]!);
      let best = costs[j]! + (rest && quiet ? 0.01 : slower);
      let step = 0;
      if (j > 0 && costs[j - 1]! <= best) [best, step] = [costs[j - 1]!, 1];
      if (j > 1 && costs[j - 2]! + faster < best) [best, step] = [costs[j - 2]! + faster, 2];
      const entry = band ? (fresh ? 0 : Infinity) : outside + begin;
      if ((band || wanted.begins[j]) && entry < best) [best, step] = [entry, 3];
      next[j] = best + frameCost(sung[t]!, wanted.midi[j]!, offset, rest, quiet);
      steps[t * width + j] = step;
    }
    if (!band) {
      for (let j = 0; j < width; j += 1) {
        const cost = costs[j]! + (wanted.ends[j] || silent(wanted.midi[j]!) ? leave : breakOff);
        if (cost < leaving) {
          leaving = cost;
          aside[t] = j;
        }
      }
      outside = leaving + (silent(sung[t]!) ? 0.01 : sungAside);
    }
    [costs, next] = [next, costs];
  }
  return tracedBack(costs, outside, steps, aside, length, width, band !== null);
}

function frameCost(sung: number, wanted: number, offset: number, rest: boolean, quiet: boolean): number {
  if (rest) return quiet ? 0 : sungInRest;
  if (quiet) return unsung;
  return min(1, abs(foldedSemitones(sung - wanted - offset)) / otherNote);
}

function tracedBack(
  costs: Float32Array,
  outside: number,
  steps: Uint8Array,
  aside: Int32Array,
  length: number,
  width: number,
  banded: boolean,
): { frames: Int32Array; cost: number } {
  const frames = new Int32Array(length).fill(-1);
  let at = -1;
  let least = outside;
  costs.forEach((cost, j) => {
    if (cost < least) [least, at] = [cost, j];
  });
  for (let t = length - 1; t >= 0; t -= 1) {
    frames[t] = at;
    if (at < 0) {
      if (banded) continue;
      at = aside[t]!;
      continue;
    }
    const step = steps[t * width + at]!;
    if (step === 3) {
      at = -1;
      if (banded) break;
    } else at -= step;
  }
  return { frames, cost: length === 0 ? 0 : least / length };
}
