import { beginHistory, noteHistory, stepsToKeep } from "./noteHistory";

const tune = [
  { start: 0, duration: 1, midi: 60 },
  { start: 1, duration: 1, midi: 62 },
];
const other = [{ start: 0, duration: 1, midi: 65 }];

test("an edit is undone and done again, with what was chosen", () => {
  const begun = noteHistory(beginHistory(tune), { kind: "choose", chosen: { from: 1, to: 1 } });
  const edited = noteHistory(begun, { kind: "edit", notes: other, chosen: { from: 1, to: 1 } });
  expect(edited).toMatchObject({ notes: other, chosen: { from: 0, to: 0 } });
  const undone = noteHistory(edited, { kind: "undo" });
  expect(undone).toMatchObject({ notes: tune, chosen: { from: 1, to: 1 }, past: [] });
  expect(noteHistory(undone, { kind: "redo" })).toMatchObject({ notes: other, future: [] });
  expect(noteHistory(undone, { kind: "undo" })).toBe(undone);
});

test("an edit after going back forgets what was undone; choosing does not", () => {
  const edited = noteHistory(beginHistory(tune), { kind: "edit", notes: other, chosen: null });
  const back = noteHistory(edited, { kind: "undo" });
  expect(noteHistory(back, { kind: "choose", chosen: { from: 1, to: 0 } })).toMatchObject({
    chosen: { from: 0, to: 1 },
    future: [{ notes: other }],
  });
  expect(noteHistory(back, { kind: "edit", notes: [], chosen: null }).future).toEqual([]);
});

test("the latest thirty steps are kept with a draft, fewer of long tunes", () => {
  const after = (steps: number, notes: typeof tune) =>
    Array.from({ length: steps }).reduce<ReturnType<typeof beginHistory>>(
      (state) => noteHistory(state, { kind: "edit", notes: [...notes], chosen: null }),
      beginHistory(notes),
    );
  const short = after(40, tune);
  expect(stepsToKeep(short)).toEqual(short.past.slice(-30));
  const long = after(
    5,
    Array.from({ length: 1_000 }, (_, start) => ({ start, duration: 1, midi: 60 })),
  );
  expect(stepsToKeep(long)).toHaveLength(3);
  expect(stepsToKeep(beginHistory(tune))).toEqual([]);
});
