import type { HeardNote } from "./sungNotes";

/** A short note farther than this from every other is taken for a tracker's slip or a squeak. */
const LONE_DISTANCE_SEMITONES = 5.5;
const LONE_SHORT_S = 0.3;
const LONE_UNCLEAR_SHORT_S = 0.6;
const SOFT_DB = 14;
const VERY_SOFT_DB = 24;
const UNCLEAR = 0.85;
/**
 * A note this far under the loud ones may be an instrument's, heard in the rests; other soft notes do not vouch for it,
 * since an instrument's notes stand near each other. Singers' own levels differ by up to about 10 dB within a phrase.
 */
const BACKGROUND_DB = 12;
/** Notes this near in time, in seconds, follow each other without a rest. */
const TOUCHING_S = 0.05;
/** How far two pitches in a ratio of whole numbers may be off it, in semitones, and the numbers looked at. */
const IN_RATIO = 0.35;
const RATIOS = [2, 3, 4, 5, 6];
/** Echoes do not cover a new note for longer than this, in seconds. */
const COVERED_S = 0.5;

/**
 * Marks the notes that should not count for a range although they were sustained: a lone short one more than
 * 5.5 semitones from every other, one in the background that far from every note of the foreground, one both soft and
 * unclear (an instrument's bleed, an echo), one very soft, and the common period of the notes before and after it, which
 * is heard while the echo of the one still sounds under the other.
 *
 * @param notes in order of time; not modified
 * @returns the same notes with `clear` decided
 */
export function weedNotes(notes: readonly HeardNote[]): HeardNote[] {
  const loud = weightedLevel(notes.filter((n) => n.sustained));
  const believed = notes.map((note) => {
    const under = loud - note.levelDb;
    const faint = under > VERY_SOFT_DB || (under > SOFT_DB && note.clarity < UNCLEAR);
    return { ...note, clear: note.sustained && !faint };
  });
  return believed.map((note, k) => {
    if (!note.clear) return note;
    if (isCommonPeriod(note, believed[k - 1], believed[k + 1])) return { ...note, clear: false };
    const background = loud - note.levelDb > BACKGROUND_DB;
    const short = note.heldS < (note.clarity < UNCLEAR ? LONE_UNCLEAR_SHORT_S : LONE_SHORT_S);
    if (!short && !background) return note;
    const witnesses = believed.filter(
      (other) => other.clear && other.start !== note.start && !(background && loud - other.levelDb > BACKGROUND_DB),
    );
    const lone =
      witnesses.length > 0 && witnesses.every((other) => Math.abs(other.midi - note.midi) > LONE_DISTANCE_SEMITONES);
    return { ...note, clear: !lone };
  });
}

/** Nobody leaps more than an octave down and at once another such leap up, each to a whole multiple. */
function isCommonPeriod(note: HeardNote, before: HeardNote | undefined, after: HeardNote | undefined): boolean {
  if (!before || !after || note.heldS > COVERED_S) return false;
  if (note.start - before.end > TOUCHING_S || after.start - note.end > TOUCHING_S) return false;
  const [one, other] = [multiple(before.midi - note.midi), multiple(after.midi - note.midi)];
  return one !== null && other !== null && one !== other;
}

function multiple(semitones: number): number | null {
  return RATIOS.find((ratio) => Math.abs(semitones - 12 * Math.log2(ratio)) < IN_RATIO) ?? null;
}

/** Level that the louder half of the sung time reaches, in dBFS. */
function weightedLevel(notes: readonly HeardNote[]): number {
  const sorted = [...notes].sort((a, b) => b.levelDb - a.levelDb);
  const whole = sorted.reduce((sum, n) => sum + n.heldS, 0);
  let seen = 0;
  for (const note of sorted) {
    seen += note.heldS;
    if (seen >= whole / 3) return note.levelDb;
  }
  return -Infinity;
}
