import { findPreset } from "./presets";
import { identifyString, loadNow, planTuning, type StringPlace } from "./stringTuning";

const guitar = findPreset("guitar")!;
const banjo = findPreset("banjo")!;
const box = findPreset("box-gbd")!;

/** Where the strings of a plan may be, the first so many of its order being done. */
function places(instrument: typeof guitar, retune: number, done = 0): StringPlace[] {
  const plan = planTuning(instrument, { retune, capo: 0 });
  return plan.strings.map(({ index, fromMidi, toMidi }) => {
    const isDone = plan.order.indexOf(index) < done;
    const ends = isDone ? [toMidi, toMidi] : [fromMidi, toMidi];
    return { index, lowMidi: Math.min(...ends), highMidi: Math.max(...ends), done: isDone };
  });
}

test("strings are tuned from the thickest to the thinnest, and a banjo's short one last", () => {
  expect(planTuning(guitar, { retune: -2, capo: 0 }).order).toEqual([0, 1, 2, 3, 4, 5]);
  expect(planTuning(banjo, { retune: 0, capo: 2 }).order).toEqual([1, 2, 3, 4, 0]);
});

test("a capo raises every string, and the banjo's short one needs its own stop at the same distance", () => {
  const plan = planTuning(banjo, { retune: -1, capo: 2 });
  expect(plan.strings.map(({ clampedMidi }) => clampedMidi)).toEqual([68, 51, 56, 60, 63]);
  expect(plan.strings.map(({ ownStop }) => ownStop)).toEqual([7, null, null, null, null]);
});

test("each open string is recognised, also half-way on its way down", () => {
  const at = places(guitar, -2);
  for (const [index, midi] of [40, 45, 50, 55, 59, 64].entries()) {
    for (const down of [0, 1, 2]) expect(identifyString(midi - down, at, 0)).toEqual({ kind: "string", index });
  }
});

test("a slack string that was asked for is believed two semitones off", () => {
  expect(identifyString(42.9, places(guitar, 0), 1)).toEqual({ kind: "string", index: 1 });
});

test("a pitch that is one string's old note and another's new one is asked about", () => {
  expect(identifyString(55, places(box, -4), 1)).toEqual({ kind: "ask", indices: [1, 0] });
});

test("once the one string stands, the pitch belongs to the other", () => {
  expect(identifyString(55, places(box, -4, 1), 1)).toEqual({ kind: "string", index: 1 });
});

test("the right note an octave off is said to be that", () => {
  expect(identifyString(28, places(guitar, 0), 0)).toEqual({ kind: "octave", index: 0, octaves: -1 });
  expect(identifyString(76.2, places(guitar, 0), 5)).toEqual({ kind: "octave", index: 5, octaves: 1 });
});

test("far from every string, the person is asked, nearest string first", () => {
  expect(identifyString(70, places(guitar, 0), 0)).toEqual({ kind: "ask", indices: [5, 4, 3, 2, 1, 0] });
});

test("two strings of the same note: the asked one is meant", () => {
  const at = [0, 1].map((index) => ({ index, lowMidi: 57, highMidi: 57, done: false }));
  expect(identifyString(57.1, at, 1)).toEqual({ kind: "string", index: 1 });
});

test("a wound string a tone above its note is to be let down at once; a thin plain one at its own note is fine", () => {
  expect(loadNow(guitar.strings[0]!, guitar.scaleMm, 42)).toBe("unsafe");
  expect(loadNow(guitar.strings[0]!, guitar.scaleMm, 41)).toBe("tight");
  expect(loadNow(guitar.strings[5]!, guitar.scaleMm, 64.2)).toBe("fine");
  expect(loadNow(guitar.strings[5]!, guitar.scaleMm, 68)).toBe("unsafe");
});
