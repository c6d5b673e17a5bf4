import type { Tune } from "./keyScore";
import { nearestSemitone } from "./nearestSemitone";

/** One pitch of a tune: how much of the sung time it takes and how its notes are held. */
export interface TunePitch {
  /** whole semitone, as the tune is written */
  midi: number;
  /** share of the sung time, 0 to 1 */
  share: number;
  /** the same share, each note weighed by how long it is held: 0.4 for passing notes to 1 for long ones */
  heldShare: number;
}

/** A note up to this many quarter notes long counts as passing. */
export const passingUpTo = 1;
/** A note of this many quarter notes or more counts as held in full. */
const heldFrom = 3;
/** A passing note strains this much of what a held one does. */
const passingWeight = 0.4;

/**
 * Weight of one note by the time it is held: passing notes touch a pitch, long ones camp on it.
 *
 * @param duration length in quarter notes (seconds where the tune comes from a recording), > 0
 * @returns 0.4 (passing) to 1 (held)
 * @see common practice; no verified figure exists, so this is a default
 */
function holdWeight(duration: number): number {
  const long = (duration - passingUpTo) / (heldFrom - passingUpTo);
  return passingWeight + (1 - passingWeight) * Math.min(1, Math.max(0, long));
}

/**
 * Sung time per pitch. Where only the span is known the middle of it is taken to be sung most, in passing notes.
 *
 * @param tune the notes, or the span
 * @returns one entry a pitch, low to high; the shares add up to 1
 * @throws RangeError if the tune has no notes, a note without length, or a span upside down
 * @see S. Thurmer, "The tessiturogram", J. Voice 2(4), 1988 (time per pitch)
 */
export function tunePitches(tune: Tune): TunePitch[] {
  if (tune.kind === "span") return spanPitches(tune.lowMidi, tune.highMidi);
  if (tune.notes.length === 0) throw new RangeError("a tune needs at least one note");
  const lengths = new Map<number, number[]>();
  for (const note of tune.notes) {
    if (!(note.duration > 0) || !Number.isFinite(note.duration) || !(note.midi >= 0 && note.midi <= 127))
      throw new RangeError("every note needs a MIDI pitch, 0 to 127, and a length above 0");
    const midi = nearestSemitone(note.midi);
    const others = lengths.get(midi);
    if (others) others.push(note.duration);
    else lengths.set(midi, [note.duration]);
  }
  // Sorted before adding, so that the order of the notes cannot change a sum's last digit.
  const sums = [...lengths]
    .sort(([a], [b]) => a - b)
    .map(([midi, durations]) => {
      const ordered = durations.sort((a, b) => a - b);
      const time = ordered.reduce((sum, duration) => sum + duration, 0);
      const held = ordered.reduce((sum, duration) => sum + duration * holdWeight(duration), 0);
      return { midi, time, held };
    });
  const total = sums.reduce((sum, { time }) => sum + time, 0);
  return sums.map(({ midi, time, held }) => ({ midi, share: time / total, heldShare: held / total }));
}

function spanPitches(lowMidi: number, highMidi: number): TunePitch[] {
  if (!(lowMidi >= 0 && lowMidi <= highMidi && highMidi <= 127))
    throw new RangeError("a span runs from low to high, MIDI 0 to 127");
  const low = nearestSemitone(lowMidi);
  const high = nearestSemitone(highMidi);
  const weights = Array.from({ length: high - low + 1 }, (_, k) => 1 + Math.min(k, high - low - k));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  return weights.map((weight, k) => {
    const share = weight / total;
    return { midi: low + k, share, heldShare: share * passingWeight };
  });
}
