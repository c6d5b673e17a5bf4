import { stageAct, tappedTempo, withTap } from "./stageKeys";

const press = (key: string, changes: object = {}) => ({
  key,
  ctrlKey: false,
  metaKey: false,
  altKey: false,
  ...changes,
});

// Pedals for tablets send page, arrow, space or return keys, as their makers' manuals say (common practice).
it.each([
  ["PageDown", "forward"],
  ["ArrowDown", "forward"],
  ["ArrowRight", "forward"],
  ["PageUp", "back"],
  ["ArrowUp", "back"],
  ["ArrowLeft", "back"],
  [" ", "start-stop"],
  ["Enter", "start-stop"],
  ["q", null],
])("a pedal that sends %j: %s", (key, act) => {
  expect(stageAct(press(key), false)).toBe(act);
});

it("leaves keys to the browser with a modifier, and to the button that has the focus", () => {
  expect(stageAct(press("ArrowLeft", { altKey: true }), false)).toBeNull();
  expect(stageAct(press("+", { ctrlKey: true }), false)).toBeNull();
  expect(stageAct(press(" "), true)).toBeNull();
  expect(stageAct(press("PageDown"), true)).toBe("forward");
});

it("finds the tempo from three taps on, and one late tap does not change it", () => {
  const tap = (times: number[]) => tappedTempo(times.reduce<number[]>(withTap, []));
  expect(tap([0, 500])).toBeNull();
  expect(tap([0, 500, 1000])).toBe(120);
  expect(tap([0, 500, 1000, 1500, 2300])).toBe(120);
  expect(tap([0, 500, 1000, 9000])).toBeNull();
});
