import fc from "fast-check";
import { changeTo, redo, startHistory, undo } from "./editHistory";

test("letters typed in a row are one step, a pause begins another", () => {
  let history = changeTo(startHistory(""), "L", "chart", 0);
  history = changeTo(history, "Lo", "chart", 200);
  history = changeTo(history, "Low", "chart", 3000);
  expect(undo(history).present).toBe("Lo");
  expect(undo(undo(history)).present).toBe("");
});

test("another field, or a step of its own, is never joined", () => {
  let history = changeTo(startHistory("a"), "b", "title", 0);
  history = changeTo(history, "c", "chart", 10);
  history = changeTo(history, "d", null, 20);
  history = changeTo(history, "e", null, 30);
  expect(history.past).toEqual(["a", "b", "c", "d"]);
});

test("typing on and on is cut into steps", () => {
  let history = startHistory("");
  for (let at = 0; at <= 20_000; at += 100) history = changeTo(history, String(at), "chart", at);
  expect(history.past.length).toBeGreaterThan(2);
});

test("whatever was done, undoing all of it and doing it again comes back to the same", () => {
  fc.assert(
    fc.property(fc.array(fc.tuple(fc.string(), fc.option(fc.constantFrom("a", "b")), fc.nat(2000))), (changes) => {
      let now = 0;
      let history = startHistory("start");
      for (const [value, tag, wait] of changes) history = changeTo(history, value, tag, (now += wait));
      const last = history.present;
      const steps = history.past.length;
      for (let step = 0; step < steps; step += 1) history = undo(history);
      expect(history.present).toBe("start");
      expect(undo(history)).toBe(history);
      for (let step = 0; step < steps; step += 1) history = redo(history);
      expect(history.present).toBe(last);
      expect(redo(history)).toBe(history);
    }),
  );
});
