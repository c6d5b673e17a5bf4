import type { Way } from "@/shared/ways/way";
import { difficultyWord, shortCost, shortWay, takeLabel, takeLabelIn, wayKept } from "./wayWords";

const way = (retune: number, capo: number, shapeKey: string): Way => ({
  kind: "as-is",
  retune,
  capo,
  shapeKey,
  soundingKey: "C",
  chords: [],
  difficulty: 0.2,
  strings: ["A3", "D4", "F#4"].map((from) => ({
    from,
    to: retune === 0 ? from : "X",
    beforeLb: null,
    afterLb: null,
    verdict: "fine",
  })),
  title: "",
  cost: "",
  cautions: [],
  why: "",
  travelMm: 0,
  travel: "",
});

test.each([
  [way(0, 0, "C"), "Use it as tuned", "As tuned, shapes in C"],
  [way(0, 3, "A"), "Use capo 3", "Capo 3, shapes in A"],
  [way(-2, 0, "D"), "Use this tuning", "Retuned 2 down, shapes in D"],
  [way(-1, 1, "Bb"), "Use this tuning and capo 1", "Retuned 1 down, capo 1, shapes in B♭"],
  [way(1, 0, "F#"), "Use this tuning", "Retuned 1 up, shapes in F♯"],
])("%# has its words", (each, label, short) => {
  expect([takeLabel(each), shortWay(each)]).toEqual([label, short]);
});

test("beside no key's name the button says the key too", () => {
  expect(
    [way(0, 0, "C"), way(0, 3, "A"), way(-2, 0, "D"), way(-1, 1, "Bb")].map((each) => takeLabelIn("C", each)),
  ).toEqual(["Use C as tuned", "Use C with capo 3", "Use C in this tuning", "Use C in this tuning, capo 1"]);
});

test("the cost says how hard it is and what is retuned", () => {
  expect(shortCost(way(0, 3, "A"))).toBe("easy, nothing retuned");
  expect(shortCost({ ...way(-2, 0, "D"), difficulty: 0.5 })).toBe("some work, 3 strings retuned");
  const shape = { frets: [0], fingers: [0], barre: null, reachMm: 0, ease: 1, roots: [0] };
  const chord = { sounding: "C", written: "D", played: "A", shape: null };
  expect(shortCost({ ...way(0, 0, "C"), chords: [chord, { ...chord, played: "N.C." }, { ...chord, shape }] })).toBe(
    "1 of 2 chords has no shape here",
  );
  expect(shortCost({ ...way(0, 0, "C"), chords: [chord, chord] })).toBe("none of the chords has a shape here");
});

test("difficulty has three words", () => {
  expect([0, 0.34, 0.67, 1].map(difficultyWord)).toEqual(["easy", "some work", "hard", "hard"]);
});

test("a kept way is found again only if it is still there", () => {
  const ways = [way(0, 0, "C"), way(0, 3, "A")];
  expect(wayKept(ways, { retune: 0, capo: 3, shapeKey: "A" })).toBe(ways[1]);
  expect(wayKept(ways, { retune: 0, capo: 5, shapeKey: "G" })).toBeNull();
  expect(wayKept(ways, null)).toBeNull();
});
