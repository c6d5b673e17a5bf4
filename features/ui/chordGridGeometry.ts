import { stringWords } from "@/shared/instruments/stringWords";
import type { GridWindow } from "@/shared/ways/gridWindow";
import type { Shape } from "@/shared/ways/way";

/** Distances of a chord grid in px. */
export interface GridMeasure {
  string: number;
  fret: number;
  dot: number;
}

export const cardMeasure: GridMeasure = { string: 16, fret: 17, dot: 6.5 };
export const pieceMeasure: GridMeasure = { string: 17, fret: 18, dot: 7.6 };

/** Horizontal place of a string; left-handed grids are mirrored. */
export function stringX(index: number, strings: number, measure: GridMeasure, leftHanded: boolean): number {
  return 20 + (leftHanded ? strings - 1 - index : index) * measure.string;
}

/** Height of the middle of a fret's space. */
export function fretY(fret: number, window: GridWindow, top: number, measure: GridMeasure): number {
  return top + (fret - window.first + 0.5) * measure.fret;
}

/** Width of a grid's drawing. */
export function gridWidth(strings: number, measure: GridMeasure = pieceMeasure): number {
  return 30 + (strings - 1) * measure.string;
}

/** Signs of a chord's name that stand in one line over a grid. */
const lineLength = 9;

/** A chord's name in the lines that it takes: it breaks before "/" and "(" only, and only where it is too long. */
export function nameLines(name: string): string[] {
  const lines: string[] = [];
  for (const part of name.split(/(?=[/(])/)) {
    const last = lines[lines.length - 1];
    if (last !== undefined && last.length + part.length <= lineLength) lines[lines.length - 1] = last + part;
    else lines.push(part);
  }
  return lines;
}

export interface SpokenGrid {
  name: string;
  shape: Shape;
  capo: number;
  sounds?: string | undefined;
  /** note names of the strings with their octaves, in playing order */
  stringNames?: readonly string[] | undefined;
  /** what the frets are called, from the open string on; their numbers unless told otherwise */
  fretNames?: readonly string[] | undefined;
}

/** The whole grid in words, string by string from the bass side. */
export function spokenGrid({ name, shape, capo, sounds, stringNames, fretNames }: SpokenGrid): string {
  const called = (fret: number) => fretNames?.[fret] ?? String(fret);
  const strings = shape.frets.map((fret, index) => {
    const words = stringWords(index, stringNames);
    if (fret === null) return `${words} silent`;
    if (fret === 0) return `${words} open`;
    const finger = shape.fingers[index] ?? 0;
    return `${words} fret ${called(fret)}${finger > 0 ? `, finger ${finger}` : ""}`;
  });
  const parts = [...strings];
  if (shape.barre) parts.push(`barre at fret ${called(shape.barre.fret)}`);
  if (capo > 0) parts.push(`capo at fret ${capo}, frets counted from it`);
  if (sounds !== undefined) parts.push(`sounds ${sounds}`);
  return `${name}: ${parts.join("; ")}`;
}
