import { fireEvent, render, screen } from "@testing-library/react";
import { findPreset } from "@/shared/instruments/presets";
import type { Instrument } from "@/shared/instruments/instrument";
import { neckLayout, placeX } from "./neckGeometry";
import { NeckMap } from "./NeckMap";

const box = findPreset("box-adf")!;
const labels = (container: HTMLElement) =>
  [...container.querySelectorAll("svg text")].map((text) => (text.textContent ?? "").replaceAll("\u200B", ""));

test("says every place of the chord, string by string, and draws degrees or note names", () => {
  const view = render(<NeckMap played="G" sounding="G" instrument={box} labels="degrees" />);
  expect(screen.getByRole("img").getAttribute("aria-label")).toContain(
    "A string: 3 at fret 2; 5 at fret 5; 1 at fret 10",
  );
  expect(labels(view.container)).toContain("3");
  view.rerender(<NeckMap played="G" sounding="G" instrument={box} labels="notes" />);
  expect(screen.getByRole("img").getAttribute("aria-label")).toContain("G, the root, at fret 10");
  expect(labels(view.container)).toContain("B");
});

test("over a capo the notes are those that are heard, and the capo is told", () => {
  render(<NeckMap played="G" sounding="A" instrument={box} capo={2} labels="notes" />);
  const words = screen.getByRole("img").getAttribute("aria-label")!;
  expect(words).toMatch(/^G shapes, sounding A, on the whole neck\. Capo at fret 2\./);
  expect(words).toContain("A, the root, at fret 12");
});

test("a left-handed neck is mirrored, place by place", () => {
  const left: Instrument = { ...box, leftHanded: true };
  const [right, mirrored] = [neckLayout(box, 1), neckLayout(left, 1)];
  for (const fret of [0, 1, 7, 12])
    expect(placeX(mirrored, { string: 0, fret }, left, 0)).toBeCloseTo(
      right.width - placeX(right, { string: 0, fret }, box, 0),
    );
});

test("a short string begins at its own fret", () => {
  const banjo = findPreset("banjo")!;
  const layout = neckLayout(banjo, 1);
  expect(placeX(layout, { string: 0, fret: 0 }, banjo, 0)).toBeGreaterThan(layout.wire(4));
  expect(placeX(layout, { string: 0, fret: 0 }, banjo, 0)).toBeLessThan(layout.wire(5));
  expect(placeX(layout, { string: 1, fret: 0 }, banjo, 0)).toBeLessThan(layout.wire(0));
});

test("a press near a place means this place, one far from all means none", () => {
  const pointed: string[] = [];
  render(
    <NeckMap
      played="G"
      sounding="G"
      instrument={box}
      labels="degrees"
      onPoint={({ string, fret }) => pointed.push(`${string} ${fret}`)}
    />,
  );
  const layout = neckLayout(box, 1.12);
  const drawing = screen.getByRole("img").parentElement!;
  fireEvent.click(drawing, { clientX: layout.space(5) + 4, clientY: layout.y(0) - 5 });
  fireEvent.click(drawing, { clientX: layout.space(3), clientY: layout.y(0) + 60 });
  expect(pointed).toEqual(["0 5"]);
});
