import fc from "fast-check";
import { parseChord, transposeChord } from "../music/chord";
import { chartChords, parseChart } from "../songs/chart";
import type { Sheet, SheetOptions } from "./sheet";
import { sheetPages, type SheetPage } from "./sheetPages";
import type { SheetPiece, SheetText } from "./sheetPiece";
import { textWidth } from "./textPiece";

const usual: SheetOptions = {
  paper: "A4",
  grids: "side",
  numbers: false,
  letters: "usual",
  shows: "played",
  leftHanded: false,
};
const options: fc.Arbitrary<SheetOptions> = fc.record({
  paper: fc.constantFrom("A4", "Letter"),
  grids: fc.constantFrom("side", "top", "none"),
  numbers: fc.boolean(),
  letters: fc.constantFrom("small", "usual", "large", "largest"),
  shows: fc.constantFrom("played", "sounding"),
  leftHanded: fc.boolean(),
});

const symbols = ["G", "Em", "C", "D7", "F#m7b5", "Bbmaj7", "A/C#", "Bsus4", "E7#9", "Dm", "F", "Cdim7"];
const word = fc.string({ unit: fc.constantFrom(..."abcdefghilmnorstuvw'"), minLength: 1, maxLength: 14 });
const line = fc
  .array(fc.record({ word, chord: fc.option(fc.constantFrom(...symbols), { freq: 2 }) }), {
    minLength: 1,
    maxLength: 16,
  })
  .map((cells) => {
    let [chords, words] = ["", ""];
    for (const cell of cells) {
      if (cell.chord !== null) chords = `${chords.padEnd(Math.max(words.length, chords.length + 1))}${cell.chord}`;
      words += `${cell.word} `;
    }
    return chords === "" ? words.trimEnd() : `${chords}\n${words.trimEnd()}`;
  });
const part = fc
  .record({
    heading: fc.constantFrom("Verse", "Chorus", "Bridge", "Intro", "[Something of my own]"),
    lines: fc.array(fc.oneof({ weight: 6, arbitrary: line }, fc.constant("")), { minLength: 1, maxLength: 14 }),
  })
  .map(({ heading, lines }) => `${heading}\n${lines.join("\n")}`);
const chart = fc.array(part, { minLength: 1, maxLength: 8 }).map((parts) => parts.join("\n\n"));

const shape = { frets: [0, 2, 3], fingers: [0, 1, 2], barre: null, reachMm: 60, ease: 0.8, roots: [1] };

const tune = {
  range: { lowMidi: 53, highMidi: 74 },
  comfort: { lowMidi: 57, highMidi: 71 },
  comfortNames: { low: "A3", high: "B4" },
  marks: [60, 62, 64, 69].map((midi) => ({ midi, share: 0.25 })),
  words: "All of it sits in your comfort band. 5 semitones of room above.",
};

/** A song in G that sounds in B flat, on a box guitar with its capo at the third fret. */
function sheetOf(text: string): Sheet {
  const from = { tonic: "G", mode: "major" } as const;
  const key = { tonic: "Bb", mode: "major" } as const;
  const chords = chartChords(parseChart(text)).map((written) => {
    const sounding = transposeChord(parseChord(written)!, 3, key, from);
    return { written, sounding, played: written, shape };
  });
  const strings = ["A3", "D4", "F#4"];
  return {
    title: "Rope and Tar",
    facts: "4 beats in a bar, 112 a minute",
    ...{ chart: text, from, key, singer: "Maren", firstNote: "D4", strokes: null, chords },
    tune,
    order: "Verse, chorus.",
    instrument: {
      ...{ name: "Box guitar", strings, tuned: strings, fretNames: null, leftHanded: false },
      ...{ retune: 0, capo: 3, shapeKey: from },
    },
  };
}

const flat = (pieces: readonly SheetPiece[]) =>
  pieces.flatMap((piece) => (piece.kind === "picture" ? piece.pieces : [piece]));
const texts = (page: SheetPage) => flat(page.pieces).filter((piece): piece is SheetText => piece.kind === "text");
const said = (text: SheetText) => text.runs.map((run) => run.text).join("");
const lines = (page: SheetPage) => texts(page).map(said);
/** Signs of one cell that stand over words of the same row, as a stranger would read the paper. */
const letters = (text: string) => text.replace(/\s/g, "");

const runs = { numRuns: 50 };

test("nothing on a page leaves it, and nothing of the chart reaches into the foot", () => {
  fc.assert(
    fc.property(chart, options, (text, chosen) => {
      for (const page of sheetPages(sheetOf(text), chosen)) {
        const outside = texts(page).filter(({ runs: [...own], face }) => {
          const [first, last] = [own[0], own.at(-1)];
          if (!first || !last) return false;
          const right = last.x + textWidth(last.text, face, last.size);
          return first.x < 28 || right > page.width - 28 || last.y > page.height - 28;
        });
        expect(outside).toEqual([]);
      }
    }),
    runs,
  );
});

test("no page begins or ends with a blank row, and no page break parts a heading from its first line", () => {
  fc.assert(
    fc.property(chart, options, (text, chosen) => {
      const pages = sheetPages(sheetOf(text), chosen);
      for (const { rows } of pages) {
        const kinds = rows.map(({ row }) => row.kind);
        expect([kinds[0], kinds.at(-1)]).not.toContain("blank");
        const last = rows.at(-1);
        const all = pages.flatMap((page) => page.rows.map(({ row }) => row));
        const headed = all.some(
          ({ part: of, kind }) => of === last?.row.part && kind !== "heading" && kind !== "blank",
        );
        if (last?.row.kind === "heading") expect(headed).toBe(false);
      }
    }),
    runs,
  );
});

test("a chord stands on the page of its words, over the letter it was written over", () => {
  fc.assert(
    fc.property(chart, options, (text, chosen) => {
      const written = parseChart(text).sections.flatMap(({ lines: own }) => own);
      const pages = sheetPages(sheetOf(text), { ...chosen, numbers: false, shows: "played" });
      const rows = pages.flatMap((page) => page.rows.map(({ row }) => row));
      let [at, words, over] = [0, "", [] as number[]];
      // Rows of one line follow one another; the letters before a chord are the same as in the chart.
      for (const each of written) {
        if (each.kind !== "sung" && each.kind !== "chords" && each.kind !== "lyrics") continue;
        [words, over] = ["", []];
        do {
          while (["heading", "blank"].includes(rows[at]!.kind)) at += 1;
          const row = rows[at]!;
          for (const { column, chord } of row.signs)
            if (chord) over.push(letters(words + row.words.slice(0, column)).length);
          words += row.words;
          at += 1;
        } while (rows[at]?.continued);
        const lyrics = each.kind === "chords" ? "" : each.lyrics;
        expect(letters(words)).toBe(letters(lyrics));
        const wanted = "chords" in each ? each.chords.filter(({ chord }) => chord) : [];
        expect(over).toEqual(wanted.map(({ column }) => letters(lyrics.slice(0, column)).length));
      }
    }),
    runs,
  );
});

test("every row of the chart stands on some page exactly once, in order, and none over another", () => {
  fc.assert(
    fc.property(chart, options, (text, chosen) => {
      const pages = sheetPages(sheetOf(text), chosen);
      const words = pages.flatMap((page) => page.rows.map(({ row }) => letters(row.words))).join("");
      const wanted = parseChart(text).sections.flatMap(({ label, lines: own }) => [
        label ?? "",
        ...own.map((each) => ("lyrics" in each ? each.lyrics : each.kind === "comment" ? each.text : "")),
      ]);
      expect(words).toBe(letters(wanted.join("")));
      for (const { rows } of pages)
        rows.forEach(({ top, height }, k) => {
          if (k > 0) expect(top).toBeGreaterThanOrEqual(rows[k - 1]!.top + rows[k - 1]!.height - 1e-6);
          expect(height).toBeGreaterThan(0);
        });
    }),
    runs,
  );
});

const song = "Verse 1\nG         C\nCoil the rope\nEm        D\nand stir the tar\n\nChorus\nC    G\nRope and tar";

test("a sheet says the capo, the strings, the shapes and what is heard", () => {
  const sheet = sheetOf(song);
  const [page] = sheetPages({ ...sheet, chords: sheet.chords.slice(0, 2) }, usual);
  const all = lines(page!);
  for (const words of ["Rope and Tar", "B♭", "for Maren", "Capo 3", "Play the shapes of G. You hear B♭.", "A-D-F♯"])
    expect(all).toContain(words);
  expect(all).toContain("Chords are written as shapes, played above the capo");
  // Chords that are not listed are moved like the rest.
  expect(all.filter((text) => text === "Em")).toHaveLength(1);
});

test("what sounds is shown on demand, and numbers stand over the chords", () => {
  const [page] = sheetPages(sheetOf(song), { ...usual, shows: "sounding", numbers: true, grids: "none" });
  const all = lines(page!);
  for (const words of ["Gm", "vi", "IV", "E♭"]) expect(all).toContain(words);
  expect(all).not.toContain("Em");
});

test("an arrangement's own chords are called and drawn as it has them, with its strokes", () => {
  const sheet = sheetOf(song);
  const closed = { ...shape, frets: [5, 5, 5], fingers: [1, 1, 1] };
  const chords = sheet.chords.map((chord) =>
    chord.written === "G" ? { ...chord, played: "Gadd9", shape: closed } : chord,
  );
  const strokes = {
    ...{ beats: 4, quarters: 4, words: "Down on every beat." },
    strokes: [0, 1, 2, 3].map((at) => ({ at, kind: "down" as const, strong: at === 0 })),
  };
  const [page] = sheetPages({ ...sheet, chords, strokes }, usual);
  const pictures = page!.pieces.flatMap((piece) => (piece.kind === "picture" ? [piece.words] : []));
  expect(pictures).toContainEqual(expect.stringMatching(/^Gadd9: A string fret 5, finger 1; D string fret 5/));
  expect(pictures).toContain("Right hand, each bar: down on 1, down on 2, down on 3, down on 4");
  expect(lines(page!)).toContain("Down on every beat.");
});

test("the aside shows the tune in the singer's voice, and says the order of the parts", () => {
  const [page] = sheetPages(sheetOf(song), usual);
  expect(lines(page!)).toEqual(
    expect.arrayContaining(["The tune in your voice", "A3", "B4", "Order", "Verse, chorus."]),
  );
  const picture = page!.pieces.find((piece) => piece.kind === "picture" && piece.what === "tune");
  if (picture?.kind !== "picture") throw new Error("no picture of the tune");
  expect(picture.words).toBe(`The tune in your voice: ${tune.words}`);
  const [comfort] = picture.pieces.flatMap((piece) => (piece.kind === "box" ? [piece] : []));
  const marks = picture.pieces.flatMap((piece) => (piece.kind === "line" && piece.width > 4 ? [piece.x1] : []));
  expect(marks).toHaveLength(4);
  for (const x of marks) {
    expect(x).toBeGreaterThan(comfort!.x);
    expect(x).toBeLessThan(comfort!.x + comfort!.width);
  }
  const outside = { ...tune, marks: [...tune.marks, { midi: 79, share: 0.1 }] };
  const beyond = sheetPages({ ...sheetOf(song), tune: outside }, usual)[0]!.pieces.flatMap((piece) =>
    piece.kind === "picture" && piece.what === "tune" ? piece.pieces : [],
  );
  const right = Math.max(...beyond.flatMap((piece) => (piece.kind === "line" ? [piece.x1, piece.x2] : [])));
  expect(right).toBeLessThan(page!.width - 56);
});

test("the order stands at the side of something, never alone", () => {
  const bare = { ...sheetOf(song), tune: null, instrument: null, chords: [] };
  expect(sheetPages(bare, usual).flatMap(lines)).not.toContain("Order");
});

test("a left-handed grid mirrors the strings", () => {
  const dots = (leftHanded: boolean) =>
    sheetPages(sheetOf(song), { ...usual, leftHanded })[0]!.pieces.flatMap((piece) =>
      piece.kind === "picture" && piece.what === "grid"
        ? [piece.pieces.flatMap((each) => (each.kind === "dot" ? [each.x] : []))]
        : [],
    );
  const [right, left] = [dots(false)[0]!, dots(true)[0]!];
  // Both sum to twice the middle of the grid.
  const sums = right.map((x, k) => x + left[k]!);
  expect(new Set(sums.map((sum) => sum.toFixed(6))).size).toBe(1);
  expect(left).not.toEqual(right);
});

test("a chart without chords or key is a sheet of words", () => {
  const bare = { ...sheetOf(song), ...{ chart: "Low tide and still", from: null, key: null }, instrument: null };
  const pages = sheetPages({ ...bare, chords: [] }, usual);
  expect(pages).toHaveLength(1);
  expect(lines(pages[0]!)).toContain("Low tide and still");
  expect(sheetPages({ ...bare, chords: [], chart: "" }, usual)).toHaveLength(1);
});
