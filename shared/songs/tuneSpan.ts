import type { MelodyNote } from "./melody";

/** A tune as a song keeps it: all its notes, or only its span. Pitches are MIDI numbers. */
type KeptTune =
  | { kind: "melody"; notes: readonly MelodyNote[]; home: string }
  | { kind: "span"; lowMidi: number; highMidi: number; home: string };

/**
 * How far a tune reaches.
 *
 * @param tune a tune with at least one note, or null
 * @returns its lowest and highest note and its home note; null without a tune
 * @example tuneSpan({ kind: "melody", notes: [{ start: 0, duration: 1, midi: 62 }, { start: 1, duration: 1, midi: 57 }], home: "D" }) // => { lowMidi: 57, highMidi: 62, home: "D" }
 */
export function tuneSpan(tune: KeptTune | null): { lowMidi: number; highMidi: number; home: string } | null {
  if (tune === null) return null;
  const { home } = tune;
  if (tune.kind === "span") return { lowMidi: tune.lowMidi, highMidi: tune.highMidi, home };
  const pitches = tune.notes.map(({ midi }) => midi);
  return { lowMidi: Math.min(...pitches), highMidi: Math.max(...pitches), home };
}
