import { render, screen } from "@testing-library/react";
import type { Shape } from "@/shared/ways/way";
import { ChordGrid } from "./ChordGrid";
import { gridWindow } from "@/shared/ways/gridWindow";
import { cardMeasure, fretY, nameLines, pieceMeasure, spokenGrid, stringX } from "./chordGridGeometry";

function shape(frets: (number | null)[], fingers: number[], roots: number[], barre: Shape["barre"] = null): Shape {
  return { frets, fingers, roots, barre, reachMm: 0, ease: 1 };
}

describe("gridWindow", () => {
  it.each([
    ["an open shape", [0, 2, 3], { first: 1, rows: 4 }],
    ["nothing stopped", [0, 0, null], { first: 1, rows: 4 }],
    ["four frets from the nut", [4, 2, 3], { first: 1, rows: 4 }],
    ["a movable shape up the neck", [5, 4, 3], { first: 3, rows: 4 }],
    ["a shape that needs five frets", [1, 5, 3], { first: 1, rows: 5 }],
    ["a wide shape up the neck", [7, 11, 9], { first: 7, rows: 5 }],
  ])("shows %s", (_, frets, window) => {
    expect(gridWindow({ frets })).toEqual(window);
  });
});

describe("places on the grid", () => {
  it("stand 17 by 18 apart on wide screens and 16 by 17 on cards", () => {
    expect(stringX(1, 3, pieceMeasure, false) - stringX(0, 3, pieceMeasure, false)).toBe(17);
    expect(stringX(1, 3, cardMeasure, false) - stringX(0, 3, cardMeasure, false)).toBe(16);
    const window = { first: 1, rows: 4 };
    expect(fretY(2, window, 18, pieceMeasure) - fretY(1, window, 18, pieceMeasure)).toBe(18);
  });

  it("are mirrored for left hands", () => {
    for (const index of [0, 1, 2, 3])
      expect(stringX(index, 4, pieceMeasure, true)).toBe(stringX(3 - index, 4, pieceMeasure, false));
  });
});

describe("ChordGrid", () => {
  it("says each string, the capo and what sounds", () => {
    render(
      <ChordGrid
        name="A"
        shape={shape([4, 0, null], [3, 0, 0], [1])}
        strings={3}
        capo={3}
        sounds="C"
        stringNames={["A3", "D4", "F#4"]}
      />,
    );
    expect(
      screen.getByRole("img", {
        name: "A: A string fret 4, finger 3; D string open; F♯ string silent; capo at fret 3, frets counted from it; sounds C",
      }),
    ).toBeTruthy();
  });

  it("fills roots plum, rings open strings and strokes silent ones", () => {
    const { container } = render(<ChordGrid name="D" shape={shape([null, 0, 2], [0, 0, 1], [1, 2])} strings={3} />);
    const rings = Array.from(container.querySelectorAll("circle")).filter(
      (circle) => circle.getAttribute("fill") === "none",
    );
    expect(rings).toHaveLength(1);
    expect(rings[0]?.getAttribute("stroke")).toBe("var(--plum)");
    const dots = Array.from(container.querySelectorAll("circle")).filter(
      (circle) => circle.getAttribute("fill") === "var(--plum)",
    );
    expect(dots).toHaveLength(1);
    expect(container.querySelectorAll('line[y1="7"]')).toHaveLength(1);
  });

  it("draws a barre over all its strings", () => {
    const { container } = render(
      <ChordGrid
        name="F"
        shape={shape([3, 3, 3], [1, 1, 1], [1], { fret: 3, fromString: 0, toString: 2 })}
        strings={3}
        measure={pieceMeasure}
      />,
    );
    const bar = container.querySelector("rect");
    expect(Number(bar?.getAttribute("width"))).toBeCloseTo(2 * 17 + 2 * 7.6, 6);
  });

  it("numbers the first fret of a shape up the neck, and draws no nut there", () => {
    const { container } = render(<ChordGrid name="D" shape={shape([5, 4, 3], [3, 2, 1], [0])} strings={3} />);
    expect(Array.from(container.querySelectorAll("text")).map((text) => text.textContent)).toContain("3");
    expect(container.querySelector('line[stroke-width="3"]')).toBeNull();
  });
});

describe("the name over a grid", () => {
  it.each([
    ["C", ["C"]],
    ["F♯m7♭5", ["F♯m7♭5"]],
    ["C/B♭", ["C/B♭"]],
    ["B♭m(maj7)/A♭", ["B♭m(maj7)", "/A♭"]],
    ["C♯maj7(♯11)/G♯", ["C♯maj7", "(♯11)/G♯"]],
  ])("%s breaks only before a slash or a bracket", (name, lines) => {
    expect(nameLines(name)).toEqual(lines);
  });

  it("keeps the room that its neighbours need", () => {
    const { container } = render(
      <ChordGrid name="C" shape={shape([0, 0, 0], [0, 0, 0], [0])} strings={3} nameHeight={2} />,
    );
    expect(container.querySelector('[style*="min-height: 36px"]')?.textContent).toBe("C");
  });
});

describe("strings in words", () => {
  const open = shape([0, 0, 0], [0, 0, 0], []);
  const spoken = (stringNames: string[]) => spokenGrid({ name: "G", shape: open, capo: 0, stringNames });

  it.each([
    [["G2", "D3", "G3"], "G: low G string open; D string open; high G string open"],
    [["G4", "D3", "G3"], "G: high G string open; D string open; low G string open"],
    [["D3", "D3", "A3"], "G: first string, D, open; second string, D, open; A string open"],
    [["D2", "D3", "D4"], "G: first string, D, open; second string, D, open; third string, D, open"],
    [["A3", "D4", "F♯4"], "G: A string open; D string open; F♯ string open"],
  ])("%j are told apart", (names, words) => {
    expect(spoken(names)).toBe(words);
  });
});

it("calls the frets of a diatonic fretboard as its players do, in picture and words", () => {
  const fretNames = ["0", "1", "2", "3", "4", "5", "6", "6½", "7"];
  const { container } = render(
    <ChordGrid name="E" shape={shape([7, 8, 7], [1, 2, 1], [0])} strings={3} fretNames={fretNames} />,
  );
  expect(screen.getByRole("img").getAttribute("aria-label")).toMatch(/fret 6½, finger 1.*fret 7, finger 2/);
  const labels = Array.from(container.querySelectorAll("text")).map((text) => text.textContent);
  expect(labels).toEqual(expect.arrayContaining(["6½", "7"]));
});
