import fc from "fast-check";
import { findPreset, presets } from "@/shared/instruments/presets";
import { tensionChanges } from "@/shared/instruments/tension";
import { parseChord } from "@/shared/music/chord";
import { spellTonic, type KeyName } from "@/shared/music/keyName";
import { findWays } from "@/shared/ways/findWays";
import { handPath, lineCost, travelMm, type HandOption } from "@/shared/ways/handPath";
import { playedKey } from "@/shared/ways/playedKey";
import { neckStock, stockOf, type StockShape } from "@/shared/ways/shapeLibrary";
import { songFlow } from "@/shared/ways/songFlow";
import { defaultPreferences, wayCandidates } from "@/shared/ways/wayCandidates";

const names = ["C", "F", "G", "Am", "Dm"];
const sequence = (count: number) => fc.array(fc.integer({ min: 0, max: count - 1 }), { minLength: 1, maxLength: 24 });
const option: fc.Arbitrary<HandOption> = fc.record({
  cost: fc.integer({ min: 0, max: 40 }).map((value) => value / 10),
  dislike: fc.integer({ min: 0, max: 20 }).map((value) => value / 10),
  handMm: fc.option(fc.integer({ min: 0, max: 400 }), { nil: null }),
});

/** Every way to take one of each. */
function everyLine<T>(layers: readonly (readonly T[])[]): T[][] {
  return layers.reduce<T[][]>((lines, layer) => lines.flatMap((line) => layer.map((each) => [...line, each])), [[]]);
}

test("the line of shapes that is chosen costs what the cheapest of all lines costs", () => {
  const layers = fc.array(fc.array(option, { minLength: 1, maxLength: 5 }), { minLength: 1, maxLength: 5 });
  fc.assert(
    fc.property(layers, sequence(5), (chords, order) => {
      const flow = songFlow(
        chords.map((_, k) => names[k]!),
        order.map((k) => names[k]!),
      );
      const { taken, total } = handPath(chords, flow);
      const cheapest = Math.min(...everyLine(chords).map((line) => lineCost(line, flow).total));
      expect(total).toBeCloseTo(cheapest, 9);
      const line = taken.map((index, k) => chords[k]![index]!);
      expect(lineCost(line, flow).total).toBeCloseTo(cheapest, 9);
    }),
    { numRuns: 300 },
  );
});

test("of every shape that the neck has, the song gets the line that costs least", () => {
  const weight = fc.constantFrom(0, 0.2, 1);
  const wishes = fc.record({
    barre: weight,
    ringing: weight,
    familiar: weight,
    knownMarks: fc.constantFrom([], ["0 0 0", "2 0 1"], ["1 1 1"]),
  });
  const flow = songFlow(["D", "G", "A"], ["D", "G", "D", "A", "A", "D", "G", "A"]);
  fc.assert(
    fc.property(fc.constantFrom("box-adf", "ukulele"), fc.integer({ min: 0, max: 11 }), wishes, (id, pc, wished) => {
      const instrument = findPreset(id)!;
      const chords = [0, 5, 7].map((step) => {
        const name = spellTonic((pc + step) % 12, "major");
        return { name, chord: parseChord(name) };
      });
      const preferences = { ...defaultPreferences, ...wished };
      const neck = neckStock(instrument, 0);
      const played = playedKey(chords, { instrument, capo: 0, neck, flow, wishes: preferences });
      const cost = (shape: StockShape): HandOption => ({
        cost: shape.cost.bare,
        dislike:
          (wished.barre * 4 * shape.load.barreStrings) / 6 +
          (wished.ringing * 2 * (instrument.strings.length - shape.load.openStrings)) / instrument.strings.length +
          (wished.knownMarks.length > 0 && !isKnown(shape.frets, wished.knownMarks) ? wished.familiar * 3 : 0),
        handMm: shape.handMm,
      });
      const layers = chords.map(({ chord }) => stockOf(chord!, instrument, neck, 0).every().map(cost));
      let cheapest = Infinity;
      for (const a of layers[0]!)
        for (const b of layers[1]!)
          for (const c of layers[2]!) cheapest = Math.min(cheapest, lineCost([a, b, c], flow).total);
      expect(played.total).toBeCloseTo(cheapest, 9);
    }),
    { numRuns: 12 },
  );
});

/** Whether a shape is among those ticked, written down anew: a shape without open strings counts at every fret. */
function isKnown(frets: readonly (number | null)[], marks: readonly string[]): boolean {
  const stopped = frets.filter((fret) => fret !== null);
  const down = stopped.includes(0) ? 0 : Math.min(...stopped) - 1;
  return marks.includes(frets.map((fret) => (fret === null ? "x" : fret - down)).join(" "));
}

test("every retune and capo that is safe is weighed, and what is not shown costs no less than the best that is", () => {
  const inKey = (tonic: string): KeyName => ({ tonic, mode: "major" });
  fc.assert(
    fc.property(fc.constantFrom(...presets), fc.integer({ min: 0, max: 11 }), (instrument, pc) => {
      const question = { chords: ["C", "F", "G"], from: inKey("C"), to: inKey(spellTonic(pc, "major")), instrument };
      const candidates = wayCandidates(question);
      const safe = [0, -1, -2, -3, -4, 1].filter((retune) =>
        tensionChanges(instrument, retune).every(({ verdict }) => verdict !== "unsafe"),
      );
      expect(candidates).toHaveLength(safe.length * (Math.min(9, instrument.capoTo) + 1));
      const ways = findWays(question);
      const [first] = ways;
      const best = candidates.find(({ retune, capo }) => retune === first!.retune && capo === first!.capo)!;
      for (const { missing, total } of candidates)
        expect(missing > best.missing || (missing === best.missing && total >= best.total)).toBe(true);
    }),
    { numRuns: 40 },
  );
});

test("the hand's travel is that of the song as it is played, change by change", () => {
  const at = (handMm: number | null) => ({ handMm });
  const flow = songFlow(["C", "F", "G"], ["C", "F", "C", "F", "G", "C"]);
  expect(travelMm([at(10), at(60), at(200)], flow)).toBe(50 + 50 + 50 + 140 + 190);
  expect(travelMm([at(10), at(null), at(200)], flow)).toBe(190);
  expect(travelMm([at(10), at(60), at(200)], songFlow(["C", "F", "G"]))).toBe(50 + 140);
});

test("the order of the song decides where on the neck a chord is played", () => {
  const low = { cost: 1, dislike: 0, handMm: 0 };
  const high = { cost: 1.4, dislike: 0, handMm: 300 };
  const chords = [[low], [{ ...low, handMm: 300 }], [{ ...low, cost: 1.2 }, high]];
  const seldom = songFlow(["C", "F", "G"], ["C", "F", "C", "G", "C", "G"]);
  const often = songFlow(["C", "F", "G"], ["C", "F", "G", "F", "G", "F", "G"]);
  expect(handPath(chords, seldom).taken).toEqual([0, 0, 0]);
  expect(handPath(chords, often).taken).toEqual([0, 0, 1]);
});
