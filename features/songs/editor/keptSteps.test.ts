import fc from "fast-check";
import { changeTo, redo, startHistory, undo } from "./editHistory";
import { packSteps, unpackSteps } from "./keptSteps";
import { emptyDraft, type SongDraft } from "./songDraft";

const through = (texts: readonly string[]) =>
  texts.reduce(
    (history, chart, index) => changeTo(history, { ...history.present, chart }, null, index),
    startHistory<SongDraft>(emptyDraft),
  );
const asKept = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T;

test("every step back and forth is there again after a reload, whatever was typed", () => {
  fc.assert(
    fc.property(fc.array(fc.string({ unit: "binary", maxLength: 12 }), { maxLength: 8 }), fc.nat(8), (texts, back) => {
      let history = through(texts);
      for (let step = 0; step < back; step += 1) history = undo(history);
      expect(unpackSteps(history.present, asKept(packSteps(history)))).toEqual({ ...history, typing: null });
    }),
  );
});

test("fields that are no texts come back too, and the key that was found makes no difference", () => {
  let history = startHistory<SongDraft>({ ...emptyDraft, key: { tonic: "D", mode: "major" } });
  history = changeTo(history, { ...history.present, key: null, tune: "span" }, null, 0);
  const kept = asKept(packSteps(history));
  const found = { ...history.present, key: { tonic: "G", mode: "major" } as const };
  expect(undo(unpackSteps(found, kept)).present).toMatchObject({ key: { tonic: "D", mode: "major" }, tune: "none" });
});

test("steps of another draft are none", () => {
  const kept = packSteps(through(["D", "D  A"]));
  expect(unpackSteps({ ...emptyDraft, chart: "G" }, kept).past).toEqual([]);
  expect(unpackSteps(emptyDraft, null).past).toEqual([]);
});

test("what is kept stays small: sixty steps, and no more letters than a long song", () => {
  const many = Array.from({ length: 90 }, (_, index) => "x".repeat(index));
  expect(packSteps(through(many)).past).toHaveLength(60);
  const large = Array.from({ length: 9 }, (_, index) => String(index).repeat(50_000));
  const packed = packSteps(through(large));
  expect(packed.past).toHaveLength(3);
  expect(
    redo(undo(unpackSteps(large.at(-1)!.length ? { ...emptyDraft, chart: large.at(-1)! } : emptyDraft, packed))).present
      .chart,
  ).toBe(large.at(-1));
});
