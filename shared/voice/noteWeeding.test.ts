import { weedNotes } from "./noteWeeding";
import type { HeardNote } from "./sungNotes";

/** A line of notes that follow each other; each half a second long, loud and clear unless said otherwise. */
function line(...notes: (Partial<HeardNote> & { midi: number })[]): HeardNote[] {
  let at = 0;
  return notes.map((note) => {
    const lengthS = note.heldS ?? 0.5;
    const start = note.start ?? at;
    at = start + lengthS;
    return {
      steadinessCents: 8,
      vibrato: null,
      levelDb: -20,
      sustained: true,
      clear: true,
      clarity: 0.95,
      heldS: lengthS,
      end: at,
      ...note,
      start,
    };
  });
}

const believed = (notes: HeardNote[]) => weedNotes(notes).map((n) => n.clear);

test("an ordinary line is believed, a note that was not held never", () => {
  expect(believed(line({ midi: 60 }, { midi: 64 }, { midi: 67 }))).toEqual([true, true, true]);
  expect(believed(line({ midi: 60 }, { midi: 64, sustained: false }))).toEqual([true, false]);
});

test("a short note far from every other is a slip; a long one, or one with company, is not", () => {
  expect(believed(line({ midi: 60 }, { midi: 62 }, { midi: 80, heldS: 0.25 }))).toEqual([true, true, false]);
  expect(believed(line({ midi: 60 }, { midi: 62 }, { midi: 80, heldS: 0.4 }))).toEqual([true, true, true]);
  expect(believed(line({ midi: 60 }, { midi: 77 }, { midi: 80, heldS: 0.25 }))).toEqual([true, true, true]);
});

test("an unclear note far off must be longer to be believed", () => {
  expect(believed(line({ midi: 60 }, { midi: 62 }, { midi: 80, heldS: 0.4, clarity: 0.8 }))).toEqual([
    true,
    true,
    false,
  ]);
});

test("what is both soft and unclear, or very soft, is an echo or something next door", () => {
  expect(believed(line({ midi: 60 }, { midi: 62, levelDb: -36, clarity: 0.8 }))).toEqual([true, false]);
  expect(believed(line({ midi: 60 }, { midi: 62, levelDb: -36 }))).toEqual([true, true]);
  expect(believed(line({ midi: 60 }, { midi: 62, levelDb: -45 }))).toEqual([true, false]);
});

test("soft low notes in the rests do not vouch for each other", () => {
  expect(believed(line({ midi: 60 }, { midi: 40, levelDb: -34 }, { midi: 62 }, { midi: 42, levelDb: -34 }))).toEqual([
    true,
    false,
    true,
    false,
  ]);
});

test("the common period of a note and the echo of the one before is no note, unless there was a rest or it lasts", () => {
  const [third, fifth] = [12 * Math.log2(5), 12 * Math.log2(4)];
  const low = 40;
  expect(believed(line({ midi: low + fifth }, { midi: low, heldS: 0.35 }, { midi: low + third }))).toEqual([
    true,
    false,
    true,
  ]);
  expect(believed(line({ midi: low + fifth }, { midi: low, heldS: 0.35, start: 0.7 }, { midi: low + third }))).toEqual([
    true,
    true,
    true,
  ]);
  expect(believed(line({ midi: low + fifth }, { midi: low, heldS: 0.7 }, { midi: low + third }))).toEqual([
    true,
    true,
    true,
  ]);
});
