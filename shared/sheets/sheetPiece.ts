/** The product's faces; the two mono faces have one width for every letter. */
export type SheetFace = "mono" | "monoBold" | "title" | "text" | "textBold";

/** Colours by what they are for. */
export type SheetTone = "ink" | "soft" | "line" | "plum" | "lagoon" | "comfort" | "reach" | "paper" | "onPlum";

/** Letters in one face beside each other; signs of the music font stand in runs of their own. */
export interface SheetRun {
  text: string;
  /** left edge, and base line */
  x: number;
  y: number;
  /** height of the letters, px */
  size: number;
  music: boolean;
}

/** One line of words. */
export interface SheetText {
  kind: "text";
  runs: SheetRun[];
  face: SheetFace;
  tone: SheetTone;
  /** what the line is for those who do not see it */
  role: "title" | "heading" | "plain";
}

/** A straight line. */
export interface SheetLine {
  kind: "line";
  x1: number;
  y1: number;
  x2: number;
  y2: number;
  width: number;
  tone: SheetTone;
}

/** A filled box with round corners. */
interface SheetBox {
  kind: "box";
  x: number;
  y: number;
  width: number;
  height: number;
  radius: number;
  tone: SheetTone;
}

/** A dot, or a ring where it has a stroke. */
export interface SheetDot {
  kind: "dot";
  x: number;
  y: number;
  radius: number;
  /** width of the ring's line; null for a filled dot */
  stroke: number | null;
  tone: SheetTone;
}

/** What belongs together as a picture and has words of its own. */
export interface SheetPicture {
  kind: "picture";
  what: "grid" | "strokes" | "tune" | "mark";
  /** the picture in words */
  words: string;
  pieces: (SheetText | SheetLine | SheetBox | SheetDot)[];
}

/** One thing on the paper, in px from its upper left corner. */
export type SheetPiece = SheetText | SheetLine | SheetBox | SheetDot | SheetPicture;
