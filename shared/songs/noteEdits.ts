import type { MelodyNote } from "./melody";

/** No note is made shorter than this, in the tune's own unit. */
const shortest = 1 / 16;
const highestMidi = 127;

/**
 * Cuts one note into two of half its length on the same pitch. What was sung on it stays with the first half.
 *
 * @param notes a tune, ordered by start
 * @param index which note, from 0
 * @returns the changed tune; the same notes where the note is too short to cut
 * @throws RangeError if there is no such note
 * @example splitNote([{ start: 0, duration: 2, midi: 60 }], 0).map((note) => note.start) // => [0, 1]
 */
export function splitNote(notes: readonly MelodyNote[], index: number): MelodyNote[] {
  const note = noteAt(notes, index);
  const half = note.duration / 2;
  if (half < shortest) return [...notes];
  const second = { start: note.start + half, duration: half, midi: note.midi };
  return [...notes.slice(0, index), { ...note, duration: half }, second, ...notes.slice(index + 1)];
}

/**
 * Makes one note of a note and the one behind it: the pitch of the longer, from the first's start to the second's end.
 *
 * @param notes a tune, ordered by start
 * @param index which note is joined with its follower, from 0
 * @returns the changed tune; the same notes where nothing follows
 * @throws RangeError if there is no such note
 */
export function mergeWithNext(notes: readonly MelodyNote[], index: number): MelodyNote[] {
  const first = noteAt(notes, index);
  const second = notes[index + 1];
  if (!second) return [...notes];
  const words = [first.lyric, second.lyric].filter((word) => word !== undefined).join("");
  const joined: MelodyNote = {
    start: first.start,
    duration: Math.max(endOf(first), endOf(second)) - first.start,
    midi: second.duration > first.duration ? second.midi : first.midi,
    ...(words === "" ? null : { lyric: words }),
  };
  return [...notes.slice(0, index), joined, ...notes.slice(index + 2)];
}

/**
 * Moves one note up or down.
 *
 * @param notes a tune
 * @param index which note, from 0
 * @param semitones how far, negative = down; stops at the ends of the MIDI numbers
 * @returns the changed tune
 * @throws RangeError if there is no such note
 */
export function moveNote(notes: readonly MelodyNote[], index: number, semitones: number): MelodyNote[] {
  const note = noteAt(notes, index);
  return notes.with(index, { ...note, midi: Math.min(highestMidi, Math.max(0, note.midi + semitones)) });
}

/**
 * Moves a whole tune.
 *
 * @param notes a tune
 * @param semitones how far, negative = down
 * @returns the moved tune, or null where a note would leave the MIDI numbers 0 to 127
 */
export function moveTune(notes: readonly MelodyNote[], semitones: number): MelodyNote[] | null {
  const moved = notes.map((note) => ({ ...note, midi: note.midi + semitones }));
  return moved.every(({ midi }) => midi >= 0 && midi <= highestMidi) ? moved : null;
}

/**
 * Gives a note another length; what follows moves along, so that its own lengths and rests stay.
 *
 * @param notes a tune, ordered by start
 * @param index which note, from 0
 * @param duration its new length, > 0; never made shorter than a sixteenth of the unit
 * @returns the changed tune
 * @throws RangeError if there is no such note or the length is not positive
 * @example setLength([{ start: 0, duration: 1, midi: 60 }, { start: 1, duration: 1, midi: 62 }], 0, 2)[1] // => { start: 2, duration: 1, midi: 62 }
 */
export function setLength(notes: readonly MelodyNote[], index: number, duration: number): MelodyNote[] {
  if (!(duration > 0) || !Number.isFinite(duration)) throw new RangeError("a note must last some time");
  const note = noteAt(notes, index);
  const length = Math.max(shortest, duration);
  const by = length - note.duration;
  return [...notes.slice(0, index), { ...note, duration: length }, ...later(notes.slice(index + 1), by)];
}

/**
 * Takes a note out; what follows moves up to its place.
 *
 * @param notes a tune, ordered by start
 * @param index which note, from 0
 * @returns the changed tune
 * @throws RangeError if there is no such note
 */
export function deleteNote(notes: readonly MelodyNote[], index: number): MelodyNote[] {
  const note = noteAt(notes, index);
  const next = notes[index + 1];
  const by = next ? note.start - next.start : 0;
  return [...notes.slice(0, index), ...later(notes.slice(index + 1), by)];
}

/**
 * Puts a note behind another one; what follows moves on by its length.
 *
 * @param notes a tune, ordered by start
 * @param after the note it follows, from 0; -1 = at the beginning
 * @param note its pitch and length
 * @returns the changed tune
 * @throws RangeError if there is no such place or the length is not positive
 * @example insertNote([], -1, { duration: 1, midi: 60 }) // => [{ start: 0, duration: 1, midi: 60 }]
 */
export function insertNote(
  notes: readonly MelodyNote[],
  after: number,
  note: Pick<MelodyNote, "duration" | "midi">,
): MelodyNote[] {
  if (!(note.duration > 0)) throw new RangeError("a note must last some time");
  const start = after === -1 ? (notes[0]?.start ?? 0) : endOf(noteAt(notes, after));
  return [...notes.slice(0, after + 1), { ...note, start }, ...later(notes.slice(after + 1), note.duration)];
}

/**
 * Puts newly sung notes in the place of some. They begin where the first of those began, and what follows moves so that
 * the rest before it stays.
 *
 * @param notes a tune, ordered by start
 * @param from first note that is replaced, from 0
 * @param to last note that is replaced, from 0, not below `from`
 * @param sung the new notes, ordered by start, starting at any time; at least one
 * @returns the changed tune
 * @throws RangeError if there are no such notes or nothing was sung
 */
export function replaceNotes(
  notes: readonly MelodyNote[],
  from: number,
  to: number,
  sung: readonly MelodyNote[],
): MelodyNote[] {
  const first = noteAt(notes, from);
  const last = noteAt(notes, to);
  const [opening] = sung;
  if (from > to || !opening) throw new RangeError("some notes must be replaced by some notes");
  const placed = later(sung, first.start - opening.start);
  const by = endOf(placed.at(-1)!) - endOf(last);
  return [...notes.slice(0, from), ...placed, ...later(notes.slice(to + 1), by)];
}

function noteAt(notes: readonly MelodyNote[], index: number): MelodyNote {
  const note = Number.isInteger(index) ? notes[index] : undefined;
  if (!note) throw new RangeError(`there is no note ${index}`);
  return note;
}

function endOf(note: MelodyNote): number {
  return note.start + note.duration;
}

/** Rounding may not push a start under zero. */
function later(notes: readonly MelodyNote[], by: number): MelodyNote[] {
  return notes.map((note) => ({ ...note, start: Math.max(0, note.start + by) }));
}
