import { respellChart } from "./respellChart";

// Common practice: the notes of a scale have one letter each; borrowed major chords are named flat of the letter.
test.each([
  ["F  A#  D#", { tonic: "F", mode: "major" }, "F  Bb  Eb"],
  ["E  Ab  C#m  B", { tonic: "E", mode: "major" }, "E  G#  C#m  B"],
  ["C  A#  F", { tonic: "C", mode: "major" }, "C  Bb  F"],
  ["D  D/Gb  G", { tonic: "D", mode: "major" }, "D  D/F#  G"],
  ["Gm  D#  A#/F", { tonic: "G", mode: "minor" }, "Gm  Eb  Bb/F"],
  ["(A♯)  F", { tonic: "F", mode: "major" }, "(B♭)  F"],
] as const)("%s becomes as its key calls it", (written, key, expected) => {
  expect(respellChart(`Verse\n${written}\nlow tide and still`, key)?.text).toBe(
    `Verse\n${expected}\nlow tide and still`,
  );
});

test("a chart that is spelled by its key is left alone, and so are passing chords that lead up", () => {
  expect(respellChart("F  Bb  F#dim  Gm\nLow tide", { tonic: "F", mode: "major" })).toBeNull();
  expect(respellChart("words alone", { tonic: "F", mode: "major" })).toBeNull();
});

test("each change is told once, and doing it again changes nothing", () => {
  const key = { tonic: "F", mode: "major" } as const;
  const once = respellChart("A#  F  A#\nlow tide and still", key)!;
  expect(once.changes).toEqual([{ from: "A#", to: "Bb" }]);
  expect(respellChart(once.text, key)).toBeNull();
});
