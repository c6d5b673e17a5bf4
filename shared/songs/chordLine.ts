import { type Chord, parseChord } from "../music/chord";
import type { NoteNaming } from "../music/noteNaming";

/** What one sign of a chord line is. Everything but "chord" and "unread" is left alone by transposition and is no mistake. */
type ChartSign = "chord" | "no-chord" | "bar" | "repeat" | "beat" | "remark" | "unread";

/** One sign of a chord line. */
export interface ChartToken {
  /** index of its first character in the line, from 0 */
  column: number;
  /** exactly as written, with brackets or marks around the chord: "(Am7)", "D*" */
  text: string;
  /** null unless kind is "chord"; its own text is the bare symbol */
  chord: Chord | null;
  kind: ChartSign;
}

const bar = /^(?::?\|{1,2}:?|\|\]|\[\||:\|:)$/;
const repeat =
  /^(?:%|(?:[x×]\s?\d{1,2}|\d{1,2}\s?[x×])\.?|\((?:[x×]\s?\d{1,2}|\d{1,2}\s?[x×])\)|:\|[x×]?\d{1,2}|[12]\.)$/i;
const beat = /^(?:[/\\.,…~*·•↑↓>]+|[-–—=]+>?)$/;
const noChord = /^[([]?(?:N\.C\.?|NC\.?|n\.c\.?)[)\]]?[*,]?$/;
/** An unreadable sign that still looks meant as a chord: a note letter, then more than small letters. */
const chordish = /^[([]?[A-H](?:[#b♯♭]|$|[^a-z\s]|[a-z]{1,4}\d|(?:m|maj|min|dim|aug|sus|add)(?![a-z]))/;
/** No note letter, but a capital with a figure or a sign of chord symbols behind it: no word is written like that. */
const symbolish = /^[([]?[A-Z][A-Za-z]{0,4}[\d#♯♭&+°ø∆Δ/][\w#♯♭&+°ø∆Δ/()]{0,8}[)\]]?$/;
const meantAsChord = (text: string) => chordish.test(text) || symbolish.test(text);

/**
 * Reads a line as chords, deciding by all that it holds.
 *
 * @param line one line of a chart, without line break
 * @param naming how the writer calls notes
 * @returns its signs in order, or null if the line as a whole is not a chord line (a lyric may hold "A" or "Am")
 */
export function readChordLine(line: string, naming: NoteNaming = "english"): ChartToken[] | null {
  if (line.length > 2000) return null;
  const tokens = splitSigns(line, naming);
  const counted = (kind: ChartSign) => tokens.filter((token) => token.kind === kind).length;
  const chords = tokens.filter((token) => token.kind === "chord");
  const words = tokens.filter((token) => token.kind === "unread" && !meantAsChord(token.text));
  if (chords.length === 0) {
    const musical = counted("bar") > 0 || counted("no-chord") > 0 || tokens.some((token) => token.text === "%");
    return musical && counted("unread") === 0 ? tokens : null;
  }
  if (chords.every(readsAsWord)) return null;
  if (words.length === 0) return tokens;
  const barred = counted("bar") > 0 && chords.length >= words.length;
  return barred || chords.length > words.length ? tokens : null;
}

/** "A!" or "Go" alone says nothing for a chord line: English has them too. */
function readsAsWord(token: ChartToken): boolean {
  return /^[A-G]o$/.test(token.text) || /^A[.,!?]$/.test(token.text);
}

function splitSigns(line: string, naming: NoteNaming): ChartToken[] {
  const tokens: ChartToken[] = [];
  const pieces = /\([^()|]*\)|[^\s|()]*\([^\s()|]*\)[^\s|()]*|\[\||\|\]|:?\|{1,2}:?|[^\s|]+/g;
  for (const match of line.matchAll(pieces)) addPiece(tokens, match[0], match.index, naming);
  return tokens;
}

function addPiece(tokens: ChartToken[], text: string, column: number, naming: NoteNaming): void {
  const add = (kind: ChartSign, chord: Chord | null = null) => tokens.push({ column, text, chord, kind });
  if (noChord.test(text)) add("no-chord");
  else if (bar.test(text)) add("bar");
  else if (repeat.test(text)) add("repeat");
  else if (beat.test(text)) add("beat");
  else {
    const chord = bareChord(text, naming);
    if (chord) add("chord", chord);
    else if (!addSeveral(tokens, text, column, naming)) add(/^\(.*\)$/.test(text) ? "remark" : "unread");
  }
}

/** Chords run together or bracketed together: "(G D)", "G-D-Em", "Am,F". */
function addSeveral(tokens: ChartToken[], text: string, column: number, naming: NoteNaming): boolean {
  const parts = [...text.matchAll(/[^-–,\s]+/g)].map((match) => ({ text: match[0], column: column + match.index }));
  if (parts.length < 2) return false;
  const read = parts.map((part) => ({ ...part, chord: bareChord(part.text, naming) }));
  if (!read.every((part) => part.chord || noChord.test(part.text) || beat.test(part.text))) return false;
  for (const part of read) {
    tokens.push({ ...part, kind: part.chord ? "chord" : noChord.test(part.text) ? "no-chord" : "beat" });
  }
  return true;
}

/** The chord inside optional brackets and behind-the-chord marks. */
function bareChord(text: string, naming: NoteNaming): Chord | null {
  if (text.length > 40) return null;
  const whole = parseChord(text, naming);
  if (whole) return whole;
  const core = /^[([{]*(.*?)[*,.?!~…:;'"↑↓]*[)\]}]*[*,.?!~…:;]*$/.exec(text)?.[1] ?? "";
  return parseChord(core, naming) ?? parseChord(`${core})`, naming);
}
