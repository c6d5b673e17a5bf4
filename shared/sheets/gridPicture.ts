import { glyphs } from "../music/pitch";
import { gridWindow } from "../ways/gridWindow";
import type { Shape } from "../ways/way";
import type { SheetChord, SheetInstrument } from "./sheet";
import type { SheetDot, SheetPicture } from "./sheetPiece";
import { cellWidth, textPiece } from "./textPiece";

/** Width that a grid takes on paper, px. */
export const gridWidth = 82;
const left = 18;
const right = 10;
const nutY = 40;
const ringY = 28;

/** What is written under and over a grid. */
interface GridWords {
  /** over the grid */
  name: string;
  /** under it: what is heard, where that is called otherwise; else null */
  sounds: string | null;
}

interface Measure {
  string: number;
  fret: number;
  dot: number;
}

/** Strings and frets of an instrument's grids: the more strings, the nearer together. */
function measureFor(strings: number): Measure {
  const string = Math.min(17, (gridWidth - left - right) / Math.max(1, strings - 1));
  return { string, fret: Math.min(19, string * 1.3), dot: Math.min(7.6, string * 0.45) };
}

/**
 * How high a chord's grid is on paper.
 *
 * @param chord with its shape
 * @param strings of the instrument
 * @returns px
 */
export function gridHeight({ shape }: Pick<SheetChord, "shape">, strings: number): number {
  const rows = shape ? gridWindow(shape).rows : 4;
  return nutY + rows * measureFor(strings).fret + 22;
}

/**
 * A chord grid on paper: the neck from the front, the bass side left or, for the other hand, right. Rings are open
 * strings, short strokes silent ones; the capo is a thick bar with its fret at the left; dots of the root are plum.
 *
 * @param chord with its shape; without one its name and words that say so
 * @param words over and under it
 * @param instrument its strings, frets and capo
 * @param leftHanded mirrored
 * @param at upper left corner of the room it has, which is `gridWidth` wide
 * @returns the picture with the grid in words
 */
export function gridPicture(
  chord: Pick<SheetChord, "shape">,
  { name, sounds }: GridWords,
  instrument: SheetInstrument,
  leftHanded: boolean,
  at: { x: number; y: number },
): SheetPicture {
  const strings = instrument.strings.length;
  const size = measureFor(strings);
  const across = (strings - 1) * size.string;
  // In the middle of the room between the fret's number and the right edge.
  const x0 = at.x + left + (gridWidth - left - right - across) / 2;
  const middle = x0 + across / 2;
  const label = (text: string, y: number, most: number, face: "mono" | "monoBold") =>
    textPiece(text, {
      x: middle,
      y: at.y + y,
      size: Math.min(most, gridWidth / Math.max(1, text.length * cellWidth)),
      face,
      tone: face === "mono" ? "soft" : "ink",
      anchor: "middle",
    });
  const pieces: SheetPicture["pieces"] = [label(name, 15, 16, "monoBold")];
  const { shape } = chord;
  if (!shape) {
    pieces.push(label("no shape", 44, 12, "mono"), label("here", 58, 12, "mono"));
    return { kind: "picture", what: "grid", words: `${name}: no shape on this instrument`, pieces };
  }
  const window = gridWindow(shape);
  const top = at.y + nutY;
  const bottom = top + window.rows * size.fret;
  const x = (string: number) => x0 + (leftHanded ? strings - 1 - string : string) * size.string;
  const y = (fret: number) => top + (fret - window.first + 0.5) * size.fret;
  const upTheNeck = window.first > 1;
  for (let row = 0; row <= window.rows; row += 1)
    pieces.push(straight(x0, top + row * size.fret, x0 + across, top + row * size.fret, 1.2, "line"));
  for (let string = 0; string < strings; string += 1)
    pieces.push(straight(x(string), top, x(string), bottom, 1.2, "soft"));
  const fretLabel = (text: string, height: number) =>
    textPiece(text, { x: x0 - 12, y: height + 4, size: 12, face: "monoBold", tone: "ink", anchor: "end" });
  if (instrument.capo > 0) {
    pieces.push({ kind: "box", x: x0 - 8, y: top - 4, width: across + 16, height: 8, radius: 4, tone: "ink" });
    pieces.push(fretLabel(String(instrument.capo), top + 0.5));
  } else if (!upTheNeck) pieces.push(straight(x0 - 0.6, top, x0 + across + 0.6, top, 3, "ink"));
  const called = (fret: number) => (instrument.capo === 0 ? instrument.fretNames?.[fret] : undefined) ?? String(fret);
  if (upTheNeck || (instrument.fretNames && instrument.capo === 0))
    pieces.push(fretLabel(called(window.first), y(window.first)));
  const { barre } = shape;
  if (barre) {
    const ends = [x(barre.fromString), x(barre.toString)];
    const from = Math.min(...ends) - size.dot;
    const width = Math.max(...ends) + size.dot - from;
    const height = 2 * size.dot;
    pieces.push({ kind: "box", x: from, y: y(barre.fret) - size.dot, width, height, radius: size.dot, tone: "ink" });
  }
  shape.frets.forEach((fret, string) => {
    const root = shape.roots.includes(string);
    if (fret === null) pieces.push(straight(x(string) - 3.5, at.y + ringY, x(string) + 3.5, at.y + ringY, 2, "soft"));
    else if (fret === 0) pieces.push(ring(x(string), at.y + ringY, Math.min(4.3, size.dot * 0.8), root));
    else pieces.push(...stopped(shape, string, { x: x(string), y: y(fret) }, size.dot));
  });
  if (sounds !== null) pieces.push(label(`sounds ${sounds}`, nutY + window.rows * size.fret + 18, 12, "mono"));
  return { kind: "picture", what: "grid", words: inWords(name, sounds, shape, instrument), pieces };
}

function straight(x1: number, y1: number, x2: number, y2: number, width: number, tone: "ink" | "soft" | "line") {
  return { kind: "line", x1, y1, x2, y2, width, tone } as const;
}

function ring(x: number, y: number, radius: number, root: boolean): SheetDot {
  return { kind: "dot", x, y, radius, stroke: root ? 2.4 : 1.4, tone: root ? "plum" : "ink" };
}

function stopped(shape: Shape, string: number, { x, y }: { x: number; y: number }, radius: number) {
  const root = shape.roots.includes(string);
  const finger = shape.fingers[string] ?? 0;
  const dot: SheetDot = { kind: "dot", x, y, radius, stroke: null, tone: root ? "plum" : "ink" };
  if (finger === 0) return [dot];
  const size = radius * 1.45;
  return [
    dot,
    textPiece(String(finger), { x, y: y + size * 0.35, size, face: "monoBold", tone: "paper", anchor: "middle" }),
  ];
}

function inWords(name: string, sounds: string | null, shape: Shape, { tuned, capo, fretNames }: SheetInstrument) {
  const strings = shape.frets.map((fret, index) => {
    const string = `${glyphs((tuned[index] ?? "").replace(/-?\d+$/, ""))} string`;
    if (fret === null) return `${string} silent`;
    if (fret === 0) return `${string} open`;
    const finger = shape.fingers[index] ?? 0;
    const called = (capo === 0 ? fretNames?.[fret] : undefined) ?? String(fret);
    return `${string} fret ${called}${finger > 0 ? `, finger ${finger}` : ""}`;
  });
  if (capo > 0) strings.push(`frets counted from the capo at ${capo}`);
  if (sounds !== null) strings.push(`sounds ${sounds}`);
  return `${name}: ${strings.join("; ")}`;
}
