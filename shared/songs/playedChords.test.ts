import { parseChart } from "./chart";
import { playedChords } from "./playedChords";

const played = (text: string) => playedChords(parseChart(text)).join(" ");

test("chords come in the order they are played, again and again", () => {
  expect(played("C       G\nLamps on the harbour\nC     G    C\nburning all night\n")).toBe("C G C G C");
});

test("a part that is called back is played again, and a verse without chords takes those of the first", () => {
  expect(
    played(
      "Verse 1\nC       G\nLamps on the harbour\n\nChorus\nF     C\nburning low\n\nVerse 2\nnobody knows\n\nChorus\n",
    ),
  ).toBe("C G F C C G F C");
});

test("repeats within a line are unrolled, and silence is no chord", () => {
  expect(played("| C | G | x2\n")).toBe("C G C G");
  expect(played("| C | N.C. | F |\n")).toBe("C F");
});
