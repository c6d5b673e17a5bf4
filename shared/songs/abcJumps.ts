import { type ScoreSigns, readJumpWords } from "./scoreSigns";

/**
 * Reads decorations and annotations that send a player elsewhere.
 *
 * @param text what stands before a note or bar line: decorations between ! or +, words between quotation marks
 * @returns the signs they stand for; none for all others
 * @see ABC music standard 2.1, sections 4.14 and 4.19
 * @example readAbcJumps("!segno!") // => { segno: true }
 */
export function readAbcJumps(text: string): ScoreSigns {
  const signs: ScoreSigns = {};
  for (const [, words, strokes, crosses] of text.matchAll(/"[\^_<>@]?([^"]*)"|!([^!]*)!|\+([^+]*)\+/g)) {
    const name = strokes ?? crosses ?? "";
    if (name === "segno") signs.segno = true;
    else if (name === "coda") signs.codaSign = true;
    else Object.assign(signs, readJumpWords(words ?? name));
  }
  return signs;
}

/** Letters that stand for decorations unless a U: field says otherwise (section 4.16). */
export const abcSymbols: Readonly<Record<string, string>> = { S: "!segno!", O: "!coda!" };

/**
 * Reads a U: field.
 *
 * @param text what stands behind U:
 * @param known the letters known so far
 * @returns the letters with what each stands for
 * @see ABC music standard 2.1, section 4.16
 * @example readAbcSymbol("T = !D.C.!", {}) // => { T: "!D.C.!" }
 */
export function readAbcSymbol(text: string, known: Readonly<Record<string, string>>): Record<string, string> {
  const [, letter, meaning] = /^\s*([H-Wh-w~])\s*=\s*([!+"].*[!+"])\s*$/.exec(text) ?? [];
  return letter && meaning ? { ...known, [letter]: meaning } : { ...known };
}

/** Gives jumps to the bars they belong to, while a voice is read. */
export interface AbcJumpPlaces {
  /** signs stand here */
  stand: (signs: ScoreSigns) => void;
  /** a note or rest follows: what waited belongs to the present bar */
  sound: (bar: ScoreSigns) => void;
  /** a bar line follows: `before` is the bar that ends there; returns what the next bar begins with */
  pass: (before: ScoreSigns | undefined) => ScoreSigns;
}

/**
 * Makes a placer of jumps. Standing before a bar line they belong to the bar that ends there, except a segno, which the
 * next bar begins with; standing before a note they belong to its bar.
 *
 * @returns the placer, with nothing waiting
 * @see common practice
 */
export function createAbcJumpPlaces(): AbcJumpPlaces {
  let waiting: ScoreSigns = {};
  return {
    stand: (signs) => {
      waiting = { ...waiting, ...signs };
    },
    sound: (bar) => {
      Object.assign(bar, waiting);
      waiting = {};
    },
    pass: (before) => {
      const { segno, ...leaving } = waiting;
      waiting = {};
      if (before) Object.assign(before, leaving);
      return segno ? { segno } : {};
    },
  };
}
