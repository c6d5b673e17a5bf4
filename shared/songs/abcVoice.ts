import { type AbcBarText, type AbcNote, type AbcSetting, AbcTooLarge } from "./abcBars";
import { createAbcJumpPlaces, readAbcJumps } from "./abcJumps";
import { readAbcBar, readAbcEnding, readAbcLength, readAbcTuplet } from "./abcSigns";
import type { WordPlace } from "./abcWords";

/** One voice while it is read. */
export interface AbcVoice {
  setting: AbcSetting;
  bars: AbcBarText[];
  /** reads a stretch of music code without fields, of the given part of the tune */
  read(text: string, part: string): void;
  /** closes the last bar */
  end(): void;
  /** a new line of music begins, under which words may stand */
  beginLine(): void;
  /** notes of the present line, for its words */
  line: (WordPlace & { start: number })[];
}

const letters: Record<string, number> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const signs: Record<string, number> = { "^^": 2, "^": 1, "=": 0, _: -1, __: -2 };
const note = /(?:(\^\^?|__?|=)(\d*\/*\d*))?([A-Ga-g])([,']*)(\d*\/*\d*)/y;
const tokens = {
  skipped:
    /(?:[\s`*$]|y\d*|"[^"]*"?|![^!\s]{1,40}!|!D\.[CS]\.[^!]{1,20}!|\+[A-Za-z0-9.()<>^]{1,30}\+|\{[^}]*\}?|\[\])+/y,
  bar: /\.?(?:\[(?=\|)|[|:]|(?<=\|)\])+/y,
  ending: /\[?\s*(\d[\d,.-]*)/y,
  tuplet: /\((\d+(?::\d*){0,2})/y,
  note,
  rest: /([zxZX])(\d*\/*\d*)/y,
  broken: /(>+|<+)/y,
  tie: /\.?-/y,
};

const most = { notes: 100_000, bars: 50_000, quarters: 50_000, overlays: 2_000 };

/**
 * Makes a reader of one voice's music code.
 *
 * @param setting what the fields before it say
 * @returns the voice, still without bars
 * @see ABC music standard 2.1, section 4
 */
export function createAbcVoice(setting: AbcSetting): AbcVoice {
  let bar: AbcBarText = { notes: [], words: [], length: 0, signs: {}, part: "" };
  let now = 0;
  let layer = 0;
  let held = new Map<string, number>();
  let barNumber = 0;
  let inEnding = false;
  let last: { start: number; duration: number; notes: AbcNote[] } | null = null;
  let nextFactor = 1;
  let tuplets: { factor: number; left: number }[] = [];
  const tiedPitches = new Map<string, number>();
  const jumps = createAbcJumpPlaces();
  const count = { notes: 0, overlays: 0, quarters: 0 };

  const openBar = (part: string) => {
    bar = { notes: [], words: [], length: 0, signs: {}, part };
    now = 0;
    layer = 0;
  };
  const closeBar = () => {
    bar.length = Math.max(bar.length, now);
    if (bar.length > 0 || bar.notes.length > 0) {
      voice.bars.push(bar);
      barNumber += 1;
      count.quarters += bar.length;
      if (voice.bars.length > most.bars || count.quarters > most.quarters) throw new AbcTooLarge();
      return true;
    }
    return false;
  };
  const step = (length: number): number => {
    let factor = nextFactor;
    nextFactor = 1;
    for (const tuplet of tuplets) {
      factor *= tuplet.factor;
      tuplet.left -= 1;
    }
    tuplets = tuplets.filter((tuplet) => tuplet.left > 0);
    return length * factor;
  };
  /** The pitch that a note as written has here; remembers its accidental to the end of the bar. */
  const pitch = (sign: string | undefined, fraction: string, letter: string, octave: string): number => {
    const upper = letter.toUpperCase();
    const name = `${letter}${octave}`;
    const { signature, clef } = voice.setting;
    let alter = held.get(upper) ?? signature[upper] ?? 0;
    if (sign !== undefined) {
      // A microtone is sung as the note it bends.
      const part = fraction === "" ? 1 : (readAbcLength(fraction) ?? 1);
      alter = Math.sign(signs[sign]!) * Math.floor(Math.abs(signs[sign]!) * part);
      held.set(upper, alter);
    } else if (tiedPitches.has(name)) alter = tiedPitches.get(name)!;
    const octaves = (letter === upper ? 0 : 1) + octave.split("'").length - octave.split(",").length;
    lastName = [name, alter];
    return 60 + letters[upper]! + alter + 12 * (octaves + clef.octaves + clef.clefOctaves) + clef.semitones;
  };
  let lastName: [string, number] = ["", 0];
  let names: [string, number][] = [];

  const place = (length: number, notes: { midi: number; length: number; tied: boolean }[]) => {
    jumps.sound(bar.signs);
    const duration = step(length);
    const factor = duration / length;
    const placed = notes
      .filter(({ midi }) => midi >= 0 && midi <= 127)
      .map(({ midi, length: own, tied }) => ({ start: now, duration: own * factor, midi, tied, layer }));
    count.notes += placed.length;
    if (count.notes > most.notes) throw new AbcTooLarge();
    bar.notes.push(...placed);
    if (notes.length > 0 && layer === 0) {
      const word = { start: now, bar: barNumber, verses: [] };
      bar.words.push(word);
      voice.line.push(word);
    }
    last = { start: now, duration, notes: placed };
    now += duration;
    tiedPitches.clear();
  };
  const tie = () => {
    if (!last) return;
    for (const each of last.notes) each.tied = true;
    for (const [name, alter] of names) tiedPitches.set(name, alter);
  };
  const breakRhythm = (marks: string) => {
    if (!last || marks.length > 3) return;
    const small = 2 ** -marks.length;
    const factor = marks.startsWith(">") ? 2 - small : small;
    for (const each of last.notes) each.duration *= factor;
    last.duration *= factor;
    now = last.start + last.duration;
    nextFactor = 2 - factor;
  };
  const passBar = (sign: string, part: string) => {
    const { timesBefore, repeatAfter, section } = readAbcBar(sign);
    held = new Map();
    if (sign === ":") return;
    closeBar();
    const before = voice.bars.at(-1);
    const arriving = jumps.pass(before?.signs);
    if (before && timesBefore > 1) before.signs.repeatEnd = timesBefore;
    if (before && inEnding && section) {
      before.signs.endingEnd = true;
      inEnding = false;
    }
    const opened = bar.length === 0 && bar.notes.length === 0 ? bar.signs : {};
    openBar(part);
    bar.signs = { ...opened, ...arriving };
    if (repeatAfter) bar.signs.repeatStart = true;
    if (section) bar.signs.section = true;
  };
  const beginEnding = (numbers: string, part: string) => {
    if (now > 0) {
      closeBar();
      openBar(part);
    }
    const before = voice.bars.at(-1);
    if (before && inEnding) before.signs.endingEnd = true;
    bar.signs.endingStart = readAbcEnding(numbers);
    inEnding = true;
  };
  /** Reads a chord from behind its bracket; returns where it ends. */
  const readChord = (text: string, from: number): number => {
    const close = text.indexOf("]", from);
    const end = close < 0 ? text.length : close;
    const notes: { midi: number; length: number; tied: boolean }[] = [];
    names = [];
    let at = from;
    while (at < end) {
      const found = matchAt(note, text, at) ?? null;
      if (!found) {
        if (matchAt(tokens.tie, text, at) && notes.length > 0) {
          notes.at(-1)!.tied = true;
          tiesInside.push(names.at(-1)!);
        }
        at = matchAt(tokens.skipped, text, at) ? Math.min(end, tokens.skipped.lastIndex) : at + 1;
        continue;
      }
      const [, sign, fraction = "", letter, octave, length] = found;
      notes.push({ midi: pitch(sign, fraction, letter!, octave!), length: lengthOf(length!), tied: false });
      names.push(lastName);
      at = note.lastIndex;
    }
    const outer = matchAt(/(\d*\/*\d*)/y, text, end + 1)?.[1] ?? "";
    const times = lengthOf(outer) / voice.setting.unit;
    if (notes.length > 0) {
      place(
        notes[0]!.length * times,
        // A chord is as long as its first note (standard 2.1, section 4.17).
        notes.map((each) => ({ ...each, length: notes[0]!.length * times })),
      );
      for (const [name, alter] of tiesInside) tiedPitches.set(name, alter);
    }
    tiesInside = [];
    return end + 1 + outer.length;
  };
  let tiesInside: [string, number][] = [];
  const lengthOf = (text: string): number => {
    const length = readAbcLength(text);
    if (length === null) throw new AbcTooLarge();
    return length * voice.setting.unit;
  };
  const rest = (kind: string, text: string) => {
    if (kind === "z" || kind === "x") {
      names = [];
      place(lengthOf(text), []);
      return;
    }
    const bars = text === "" ? 1 : Number(text);
    if (!(bars <= 2_000)) throw new AbcTooLarge();
    jumps.sound(bar.signs);
    now += bars * (voice.setting.bar ?? 4);
    last = null;
  };
  const overlay = () => {
    count.overlays += 1;
    if (count.overlays > most.overlays) throw new AbcTooLarge();
    bar.length = Math.max(bar.length, now);
    now = 0;
    layer += 1;
    last = null;
    held = new Map();
  };

  const voice: AbcVoice = {
    setting,
    bars: [],
    line: [],
    beginLine() {
      voice.line = [];
    },
    read(text, part) {
      if (now === 0) bar.part = part;
      let at = 0;
      while (at < text.length) {
        let found: RegExpExecArray | null;
        if ((found = matchAt(tokens.skipped, text, at))) {
          at = tokens.skipped.lastIndex;
          jumps.stand(readAbcJumps(found[0]));
        } else if ((found = matchAt(tokens.note, text, at))) {
          at = tokens.note.lastIndex;
          const [, sign, fraction = "", letter, octave, length] = found;
          const midi = pitch(sign, fraction, letter!, octave!);
          names = [lastName];
          const own = lengthOf(length!);
          place(own, [{ midi, length: own, tied: false }]);
        } else if ((found = matchAt(tokens.bar, text, at))) {
          at = tokens.bar.lastIndex;
          passBar(found[0], part);
          const ending = matchAt(tokens.ending, text, at);
          if (ending) {
            at = tokens.ending.lastIndex;
            beginEnding(ending[1]!, part);
          }
        } else if ((found = matchAt(/\[\s*(\d[\d,.-]*)/y, text, at))) {
          at += found[0].length;
          beginEnding(found[1]!, part);
        } else if (text[at] === "[") at = readChord(text, at + 1);
        else if ((found = matchAt(tokens.tuplet, text, at))) {
          at = tokens.tuplet.lastIndex;
          const tuplet = readAbcTuplet(found[1]!, voice.setting.compound);
          if (tuplet && tuplets.length < 4) tuplets.push(tuplet);
        } else if ((found = matchAt(tokens.rest, text, at))) {
          at = tokens.rest.lastIndex;
          rest(found[1]!, found[2]!);
        } else if ((found = matchAt(tokens.broken, text, at))) {
          at = tokens.broken.lastIndex;
          breakRhythm(found[1]!);
        } else if (matchAt(tokens.tie, text, at)) {
          at = tokens.tie.lastIndex;
          tie();
        } else {
          if (text[at] === "&") overlay();
          else jumps.stand(readAbcJumps(voice.setting.symbols[text[at]!] ?? ""));
          at += 1;
        }
      }
    },
    end() {
      closeBar();
      jumps.pass(voice.bars.at(-1)?.signs);
      openBar("");
    },
  };
  return voice;
}

function matchAt(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}
