import { findPreset } from "@/shared/instruments/presets";
import { planTuning } from "@/shared/instruments/stringTuning";
import { midiToHz } from "@/shared/music/pitch";
import { startTuner, tuner, type TunerState } from "./tunerState";
import { heardWords, stepWords } from "./tunerWords";

const box = findPreset("box-adf")!;
const plan = planTuning(box, { retune: -2, capo: 0 });

/** One pluck at a pitch, read for so many seconds, 50 times a second. */
function pluck(state: TunerState, midi: number, seconds: number, number: number, of = plan): TunerState {
  const readings = Array.from({ length: Math.round(seconds * 50) }, (_, k) => ({
    ...{ t: number * 10 + 0.2 + k / 50, sincePluckS: 0.2 + k / 50, hz: midiToHz(midi), inharmonicity: 0, fit: 1 },
    pluck: number,
  }));
  return tuner(of, state, { kind: "heard", readings, a4: 440 });
}

test("a string in tune for a second is ticked, and the next is asked for", () => {
  const state = pluck(startTuner(plan), 55.02, 1.3, 1);
  expect(state.done).toEqual([0]);
  expect(state.asked).toBe(1);
});

test("the second may be made of two short plucks, but not with a wrong one between", () => {
  const once = pluck(startTuner(plan), 55, 0.8, 1);
  expect(once.done).toEqual([]);
  expect(pluck(once, 55, 0.8, 2).done).toEqual([0]);
  const wrong = pluck(once, 55.3, 0.3, 2);
  expect(pluck(wrong, 55, 0.8, 3).done).toEqual([]);
});

test("a flat string says so, and its old pitch is no other string", () => {
  const state = pluck(startTuner(plan), 54.88, 0.6, 1);
  expect(heardWords(box, plan, state, state.heard!)).toMatchObject({
    off: "12 cents low",
    turn: "Turn the peg up a little.",
  });
  expect(pluck(startTuner(plan), 57, 0.6, 1).heard).toMatchObject({ index: 0 });
});

test("another string than the one asked for is named and ticks nothing", () => {
  const state = pluck(startTuner(plan), 62, 1.5, 1);
  expect(heardWords(box, plan, state, state.heard!).off).toBe("That is the D4 string");
  expect(state).toMatchObject({ asked: 0, done: [] });
});

test("a pitch that may be two strings is asked about, and the answer holds while the pitch goes on", () => {
  const gbd = findPreset("box-gbd")!;
  const down = planTuning(gbd, { retune: -4, capo: 0 });
  const asking = pluck(tuner(down, startTuner(down), { kind: "choose", index: 1 }), 55, 0.6, 1, down);
  expect(asking.question?.indices).toEqual([1, 0]);
  const said = tuner(down, asking, { kind: "answer", index: 0, a4: 440 });
  expect(said.asked).toBe(0);
  expect(pluck(said, 54, 0.4, 2, down).heard).toMatchObject({ index: 0 });
});

test("the ringing of a string that stands is not taken for the next one's", () => {
  const state = pluck(startTuner(plan), 55, 2.5, 1);
  expect(state).toMatchObject({ asked: 1, heard: null });
});

test("a string that rises past what it bears says stop", () => {
  const guitar = findPreset("guitar")!;
  const as = planTuning(guitar, { retune: 0, capo: 0 });
  const state = pluck(startTuner(as), 42, 0.6, 1, as);
  expect(heardWords(guitar, as, state, state.heard!)).toMatchObject({ stop: true });
});

test("with a capo the strings are checked at the raised pitches once it is clamped, and then all once more", () => {
  const banjo = findPreset("banjo")!;
  const clamped = planTuning(banjo, { retune: 0, capo: 2 });
  const next = (state: TunerState) => tuner(clamped, state, { kind: "next" });
  let state = startTuner(clamped);
  for (let k = 0; k < 5; k += 1) state = next(state);
  expect(state).toMatchObject({ pass: "capo", clamped: false, asked: 1 });
  expect(pluck(state, 52, 0.6, 1, clamped).heard).toBeNull();
  state = tuner(clamped, state, { kind: "clamped" });
  expect(pluck(state, 52.05, 0.6, 1, clamped).heard?.cents).toBeCloseTo(5);
  for (let k = 0; k < 5; k += 1) state = next(state);
  expect(stepWords(banjo, clamped, state)).toBe("Check the D3 string: E3");
  for (let k = 0; k < 5; k += 1) state = next(state);
  expect(state.pass).toBe("done");
});
