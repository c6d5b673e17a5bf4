import type { MelodyNote } from "../melody";

/** A rest from this length on, in quarter notes, is a breath; so is a held note, once a phrase has gone on for a while. */
const restFrom = 0.5;
const heldFrom = 2;
const fewestNotes = 3;
const goneOnFor = 6;

/**
 * Where a tune without words takes breath.
 *
 * @param notes its notes in order, times in quarter notes
 * @returns indices of the notes that begin a phrase, 0 first; empty without notes
 * @see common practice: phrases end on rests and long notes
 * @example phraseBreaks([0, 1, 2, 4].map((start) => ({ start, duration: 1, midi: 60 }))) // => [0, 3]
 */
export function phraseBreaks(notes: readonly MelodyNote[]): number[] {
  const breaks: number[] = [];
  notes.forEach(({ start }, k) => {
    const before = notes[k - 1];
    const count = k - (breaks.at(-1) ?? 0);
    if (!before) breaks.push(k);
    else if (start - before.start - before.duration >= restFrom - 1e-6 && count >= fewestNotes) breaks.push(k);
    else if (before.duration >= heldFrom - 1e-6 && count >= goneOnFor) breaks.push(k);
  });
  return breaks;
}
