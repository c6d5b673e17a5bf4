import fc from "fast-check";
import type { MelodyNote } from "./melody";
import {
  deleteNote,
  insertNote,
  mergeWithNext,
  moveNote,
  moveTune,
  replaceNotes,
  setLength,
  splitNote,
} from "./noteEdits";

const tune: MelodyNote[] = [
  { start: 0, duration: 1, midi: 60, lyric: "la" },
  { start: 1, duration: 2, midi: 62 },
  { start: 4, duration: 1, midi: 64 },
];

const tunes = fc
  .array(
    fc.record({
      rest: fc.integer({ min: 0, max: 8 }).map((n) => n / 4),
      duration: fc.integer({ min: 1, max: 16 }).map((n) => n / 4),
      midi: fc.integer({ min: 40, max: 80 }),
    }),
    { minLength: 1, maxLength: 12 },
  )
  .map((steps) => {
    let at = 0;
    return steps.map(({ rest, duration, midi }) => {
      const start = at + rest;
      at = start + duration;
      return { start, duration, midi };
    });
  });

const rests = (notes: readonly MelodyNote[]) =>
  notes.slice(1).map((note, k) => note.start - notes[k]!.start - notes[k]!.duration);
const inOrder = (notes: readonly MelodyNote[]) => rests(notes).every((rest) => rest >= -1e-9);

test("a note is cut into halves, and its word stays with the first", () => {
  expect(splitNote(tune, 0).slice(0, 2)).toEqual([
    { start: 0, duration: 0.5, midi: 60, lyric: "la" },
    { start: 0.5, duration: 0.5, midi: 60 },
  ]);
});

test("joined notes have the pitch of the longer and reach over the rest between them", () => {
  expect(mergeWithNext(tune, 0)[0]).toEqual({ start: 0, duration: 3, midi: 62, lyric: "la" });
  expect(mergeWithNext(tune, 1)[1]).toEqual({ start: 1, duration: 4, midi: 62 });
  expect(mergeWithNext(tune, 2)).toEqual(tune);
});

test("a note taken out lets the rest move up, one put in makes room", () => {
  expect(deleteNote(tune, 1).map(({ start }) => start)).toEqual([0, 1]);
  expect(insertNote(tune, 0, { duration: 0.5, midi: 65 }).map(({ start }) => start)).toEqual([0, 1, 1.5, 4.5]);
  expect(insertNote(tune, -1, { duration: 1, midi: 65 }).map(({ start }) => start)).toEqual([0, 1, 2, 5]);
});

test("a part sung again stands where the old one began, and the rest before the next note stays", () => {
  const sung = [
    { start: 0.7, duration: 1, midi: 67 },
    { start: 2, duration: 2, midi: 69 },
  ];
  const changed = replaceNotes(tune, 0, 1, sung);
  expect(changed.map(({ midi }) => midi)).toEqual([67, 69, 64]);
  expect(changed[0]!.start).toBe(0);
  expect(rests(changed)[1]).toBeCloseTo(1);
});

test("a whole tune moves, but never out of the MIDI numbers", () => {
  expect(moveTune(tune, -2)?.map(({ midi }) => midi)).toEqual([58, 60, 62]);
  expect(moveTune(tune, 70)).toBeNull();
  expect(moveNote(tune, 0, 100)[0]!.midi).toBe(127);
});

test("what is not there cannot be changed", () => {
  for (const edit of [splitNote, mergeWithNext, deleteNote]) expect(() => edit(tune, 3)).toThrow(RangeError);
  expect(() => setLength(tune, 0, 0)).toThrow(RangeError);
  expect(() => replaceNotes(tune, 2, 1, tune)).toThrow(RangeError);
  expect(() => replaceNotes(tune, 0, 1, [])).toThrow(RangeError);
});

test("cutting and joining gives the note back; putting in and taking out gives the tune back", () => {
  fc.assert(
    fc.property(tunes, fc.nat(), fc.integer({ min: 1, max: 8 }), (notes, pick, length) => {
      const at = pick % notes.length;
      expect(mergeWithNext(splitNote(notes, at), at)).toEqual(notes);
      const put = insertNote(notes, at, { duration: length / 2, midi: 60 });
      expect(put).toHaveLength(notes.length + 1);
      const back = deleteNote(put, at + 1);
      expect(back.map(({ midi, duration }) => [midi, duration])).toEqual(
        notes.map(({ midi, duration }) => [midi, duration]),
      );
    }),
    { numRuns: 200 },
  );
});

test("every edit leaves the notes in order and without overlap", () => {
  fc.assert(
    fc.property(tunes, tunes, fc.nat(), fc.nat(), (notes, sung, a, b) => {
      const [from, to] = [a % notes.length, b % notes.length].sort((x, y) => x - y) as [number, number];
      const edits = [
        splitNote(notes, from),
        mergeWithNext(notes, from),
        deleteNote(notes, from),
        setLength(notes, from, 3.25),
        insertNote(notes, from, { duration: 2, midi: 50 }),
        replaceNotes(notes, from, to, sung),
      ];
      for (const edited of edits) expect(inOrder(edited)).toBe(true);
    }),
    { numRuns: 200 },
  );
});
