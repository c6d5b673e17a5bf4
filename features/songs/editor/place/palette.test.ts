import { parseChart } from "@/shared/songs/chart";
import { chordPalette } from "./palette";

const texts = (list: readonly { text: string }[]) => list.map(({ text }) => text);

test("the song's own chords by their numbers, I IV V first, then the rest of the key", () => {
  const chart = parseChart("Em  Bm7  D   A7   G  Bb  A  D/F#\nlow tide and still we row along home\n");
  const { own, others } = chordPalette(chart, { tonic: "D", mode: "major" });
  expect(texts(own)).toEqual(["D", "G", "A", "Bm7", "Em", "D/F#", "A7", "Bb"]);
  expect(own.map(({ roman }) => roman)).toEqual(["I", "IV", "V", "vi7", "ii", "I/3", "V7", "bVI"]);
  expect(texts(others)).toEqual(["Bm", "F#m", "C#dim"]);
});

test("a minor key has its own triads", () => {
  const { others } = chordPalette(parseChart(""), { tonic: "A", mode: "minor" });
  expect(texts(others)).toEqual(["Am", "Dm", "Em", "F", "Bdim", "C", "G"]);
});

test("without a key they stand as they came", () => {
  expect(chordPalette(parseChart("Em  C\nlow tide"), null).own).toEqual([
    { text: "Em", roman: null },
    { text: "C", roman: null },
  ]);
});

test("words without any chord yet are offered chords to begin with, none of them twice", () => {
  const { own, others } = chordPalette(parseChart("low tide and still we row along home\n"), null);
  expect(own).toEqual([]);
  expect(texts(others)).toEqual(["C", "G", "D", "A", "E", "F", "Am", "Em", "Dm"]);
  expect(texts(chordPalette(parseChart("Em  C\nlow tide"), null).others)).not.toContain("Em");
});
