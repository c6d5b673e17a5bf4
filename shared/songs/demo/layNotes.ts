import type { MelodyNote } from "../melody";

/**
 * Lays notes one behind the other.
 *
 * @param line pitch and length of each, in quarter notes, with commas between: "66 0.5, 67 1/3, - 1"; "-" is a rest
 * @returns the notes, times in quarter notes
 * @example layNotes("62 1, - 1, 64 2") // => [{ start: 0, duration: 1, midi: 62 }, { start: 2, duration: 2, midi: 64 }]
 */
export function layNotes(line: string): MelodyNote[] {
  let start = 0;
  const notes: MelodyNote[] = [];
  for (const sign of line.split(",")) {
    const [pitch, length] = sign.trim().split(/\s+/);
    const duration = length === "1/3" ? 1 / 3 : Number(length);
    if (pitch !== "-") notes.push({ start, duration, midi: Number(pitch) });
    start += duration;
  }
  return notes;
}
