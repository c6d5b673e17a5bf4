import { presets } from "@/shared/instruments/presets";
import { neckPlaces, placeWords } from "./fretboardNotes";

const preset = (id: string) => presets.find((each) => each.id === id)!;

test("every string sounds its open note and what its frets raise it to", () => {
  const [first] = neckPlaces(preset("box-adf"), 1, 3);
  expect(first).toEqual([
    { midi: 57, fret: "0" },
    { midi: 58, fret: "1" },
    { midi: 59, fret: "2" },
    { midi: 60, fret: "3" },
  ]);
  expect(placeWords("F#4", { midi: 66, fret: "0" })).toBe("String F♯4, open");
});

test("a short drone string has no frets under its own nut, and is counted from there", () => {
  const banjo = preset("banjo");
  const drone = banjo.strings.findIndex(({ startsAtFret }) => (startsAtFret ?? 0) > 0);
  const start = banjo.strings[drone]!.startsAtFret!;
  const [open, ...frets] = neckPlaces(banjo, 1, start + 2)[drone]!;
  expect(frets.slice(0, start)).toEqual(Array(start).fill(null));
  expect(frets[start]).toEqual({ midi: open!.midi + 1, fret: String(start + 1) });
});

test("a neck ends, and a diatonic one is named as its players do", () => {
  const neck = { strings: [{ note: "D3", gaugeIn: null, material: "unknown" as const }], frets: 3, fretMap: [2, 4, 5] };
  expect(neckPlaces(neck, 2, 3)[0]).toEqual([
    { midi: 50, fret: "0" },
    { midi: 54, fret: "2" },
    { midi: 55, fret: "3" },
    null,
  ]);
});
