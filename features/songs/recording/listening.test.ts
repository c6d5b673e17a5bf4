import { beginListening, listening, type ListeningEvent } from "./listening";

const after = (...events: ListeningEvent[]) => events.reduce(listening, beginListening(96, null));

test("the first part starts the clock, and the end closes it", () => {
  const state = after(
    { kind: "part", name: "Intro", atS: 100 },
    { kind: "part", name: "Verse", atS: 108 },
    { kind: "over", atS: 124 },
    { kind: "part", name: "Solo", atS: 130 },
  );
  expect(state).toMatchObject({
    marks: [
      { name: "Intro", atS: 0 },
      { name: "Verse", atS: 8 },
    ],
    endS: 24,
  });
});

test("undo takes back the end first, then part after part, and at last the clock", () => {
  const state = after({ kind: "part", name: "Intro", atS: 100 }, { kind: "over", atS: 124 }, { kind: "undoPart" });
  expect(state).toMatchObject({ endS: null, startedS: 100 });
  expect(listening(state, { kind: "undoPart" })).toMatchObject({ marks: [], startedS: null });
});

test("new taps set a chosen tempo aside, and only the latest are kept", () => {
  const taps = Array.from({ length: 30 }, (_, k): ListeningEvent => ({ kind: "tap", atS: k }));
  expect(after(...taps)).toMatchObject({ tempo: null });
  expect(after(...taps).taps).toHaveLength(24);
  expect(after(...taps, { kind: "forgetTaps" }).taps).toEqual([]);
  expect(after({ kind: "over", atS: 3 }).endS).toBeNull();
});
