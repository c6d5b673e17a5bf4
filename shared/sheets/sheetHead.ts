import { keySign } from "../music/keyWords";
import { glyphs } from "../music/pitch";
import type { Sheet, SheetOptions } from "./sheet";
import type { SheetPiece } from "./sheetPiece";
import { textPiece, textWidth, wrapText } from "./textPiece";
import { semitoneWords } from "../music/moveWords";

/** What to do before the first chord, as it stands under the title. */
export interface SheetFact {
  heading: string;
  words: string;
}

/**
 * What the player does before the first chord: capo, strings, first note.
 *
 * @param sheet what is to be played
 * @param shows chord names of the shapes, or of what is heard
 * @returns the facts in order, with glyphs; none for a sheet without an instrument and without a first note
 */
export function sheetFacts({ instrument, key, firstNote }: Sheet, shows: SheetOptions["shows"]): SheetFact[] {
  const facts: SheetFact[] = [];
  if (instrument) {
    const { capo, retune, shapeKey, strings, tuned } = instrument;
    const heard = glyphs(key ? keySign(key) : "");
    const shapes = glyphs(keySign(shapeKey));
    const moved = capo > 0 || retune !== 0;
    const play =
      shows === "played"
        ? `Play the shapes of ${shapes}. You hear ${heard}.`
        : `Shapes of ${shapes}. Chords are named as heard.`;
    facts.push({
      heading: capo > 0 ? `Capo ${capo}` : "No capo",
      words: moved ? play : `Played and heard in ${heard}.`,
    });
    const far = `${semitoneWords(Math.abs(retune))} ${retune < 0 ? "down" : "up"}`;
    facts.push({
      heading: stringNames(tuned),
      words: retune === 0 ? `${instrument.name}, as tuned` : `all strings ${far} from ${stringNames(strings)}`,
    });
  }
  if (firstNote !== null) facts.push({ heading: "First note", words: `${glyphs(firstNote)} is sung first` });
  return facts;
}

function stringNames(notes: readonly string[]): string {
  return glyphs(notes.map((note) => note.replace(/-?\d+$/, "")).join("-"));
}

/** Left and right edge of what is printed, px. */
interface Edges {
  left: number;
  right: number;
}

/**
 * The head of the first page: title, facts, the sounding key at the right, and what to do first.
 *
 * @param sheet what is to be played
 * @param options what is shown
 * @param edges left and right edge, px
 * @param top upper edge, px
 * @returns its pieces, and where it ends
 */
export function firstHead(
  sheet: Sheet,
  options: SheetOptions,
  { left, right }: Edges,
  top: number,
): { pieces: SheetPiece[]; bottom: number } {
  const pieces: SheetPiece[] = [];
  const sign = sheet.key ? glyphs(keySign(sheet.key)) : null;
  const beside = sheet.singer === null ? ["sounding key"] : ["sounding key", `for ${sheet.singer}`];
  const words = beside.map((line) => wrapText(line, "text", 13, 120)[0] ?? "");
  const keyWidth =
    sign === null
      ? 0
      : textWidth(sign, "title", 52) + 12 + Math.max(...words.map((line) => textWidth(line, "text", 13)));
  let y = top;
  for (const line of wrapText(sheet.title, "title", 36, right - left - keyWidth - 24)) {
    y += 36;
    pieces.push(textPiece(line, { x: left, y: y - 4, size: 36, face: "title", tone: "ink", role: "title" }));
  }
  y += 5;
  for (const line of wrapText(sheet.facts, "text", 14, right - left - keyWidth - 24)) {
    y += 20;
    pieces.push(textPiece(line, { x: left, y: y - 5, size: 14, face: "text", tone: "soft" }));
  }
  const foot = Math.max(y, top + 61);
  if (sign !== null) {
    const x = right - keyWidth;
    pieces.push(textPiece(sign, { x, y: foot - 5, size: 52, face: "title", tone: "plum" }));
    words.forEach((line, k) =>
      pieces.push(
        textPiece(line, {
          x: x + textWidth(sign, "title", 52) + 12,
          y: foot - 5 - 17 * (words.length - 1 - k),
          ...{ size: 13, face: "text", tone: "soft" },
        }),
      ),
    );
  }
  y = foot + 12;
  pieces.push({ kind: "line", x1: left, y1: y, x2: right, y2: y, width: 2, tone: "ink" });
  const facts = sheetFacts(sheet, options.shows);
  if (facts.length === 0) return { pieces, bottom: y };
  const width = (right - left - 36 * (facts.length - 1)) / facts.length;
  const lines = facts.map(({ words: said }) => wrapText(said, "text", 13, width));
  facts.forEach(({ heading }, k) => {
    const x = left + k * (width + 36);
    const size = Math.min(20, (20 * width) / Math.max(width, textWidth(heading, "title", 20)));
    pieces.push(textPiece(heading, { x, y: y + 32, size, face: "title", tone: "ink" }));
    lines[k]!.forEach((line, n) =>
      pieces.push(textPiece(line, { x, y: y + 55 + 18 * n, size: 13, face: "text", tone: "soft" })),
    );
  });
  y += 55 + 18 * (Math.max(...lines.map(({ length }) => length)) - 1) + 18;
  pieces.push({ kind: "line", x1: left, y1: y, x2: right, y2: y, width: 1, tone: "line" });
  return { pieces, bottom: y };
}

/**
 * The head of every later page: title and capo in one line.
 *
 * @param sheet what is to be played
 * @param options what is shown
 * @param edges left and right edge, px
 * @param top upper edge, px
 * @returns its pieces, and where it ends
 */
export function laterHead(
  sheet: Sheet,
  options: SheetOptions,
  { left, right }: Edges,
  top: number,
): { pieces: SheetPiece[]; bottom: number } {
  const said = sheetFacts({ ...sheet, firstNote: null }, options.shows)[0];
  const words = said ? `${said.heading}. ${said.words}` : sheet.key ? `Sounds in ${glyphs(keySign(sheet.key))}` : "";
  const room = right - left - textWidth(words, "text", 13) - 24;
  const title = wrapText(sheet.title, "title", 16, Math.max(120, room));
  const y = top + 18;
  return {
    pieces: [
      textPiece(title.length > 1 ? `${title[0]} …` : (title[0] ?? ""), {
        x: left,
        y,
        size: 16,
        face: "title",
        tone: "ink",
      }),
      textPiece(words, { x: right, y, size: 13, face: "text", tone: "soft", anchor: "end" }),
      { kind: "line", x1: left, y1: y + 9, x2: right, y2: y + 9, width: 1, tone: "line" },
    ],
    bottom: y + 9,
  };
}

/**
 * What stands at the foot of a page about how the chords are written.
 *
 * @param sheet what is to be played
 * @param shows chord names of the shapes, or of what is heard
 * @returns a short line
 */
export function namingWords({ instrument }: Pick<Sheet, "instrument">, shows: SheetOptions["shows"]): string {
  if (!instrument || shows === "sounding") return "Chords are named as they sound";
  if (instrument.capo > 0) return "Chords are written as shapes, played above the capo";
  return instrument.retune === 0
    ? "Chords are named as they sound"
    : "Chords are written as shapes on the retuned strings";
}
