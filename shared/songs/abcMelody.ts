import { parseOnly } from "abcjs";
import type { KeyName, Mode } from "../music/keyName";
import type { WrittenFile, WrittenVoice } from "./melodyVoice";

/** The parts of a parsed tune that are read here. */
interface AbcElement {
  el_type: string;
  type?: string;
  startChar?: number;
  decoration?: unknown;
  gracenotes?: unknown;
  chord?: unknown;
  lyric?: { syllable?: string }[];
}
interface AbcTune {
  lines: { staff?: { voices?: AbcElement[][] }[] }[];
  metaText: { title?: string | { text?: string }[] };
  getKeySignature(): { root?: string; acc?: string; mode?: string } | undefined;
  setUpAudio(options: { chordsOff: boolean }): { tracks: AbcEvent[][] };
}
interface AbcEvent {
  cmd: string;
  type?: string;
  text?: string;
  pitch?: number;
  start?: number;
  duration?: number;
  instrument?: number;
  startChar?: number;
}

const mostTunes = 50;
/**
 * Beyond these the parser takes time that grows with their square, or so much memory for one endless note that the whole
 * program stops; no song comes near them.
 */
const most = {
  characters: 200_000,
  lines: 5_000,
  notes: 20_000,
  lineLength: 10_000,
  signs: 2_000,
  bars: 10_000,
  overlays: 200,
  restedBars: 2_000,
  digits: 4,
};
/** Fine enough for tuplets of 3, 5 and 7 down to a sixty-fourth; undoes the parser's rounding to six places. */
const grid = 6720;
const modes: Record<string, Mode> = {
  "": "major",
  m: "minor",
  dor: "dorian",
  phr: "phrygian",
  lyd: "lydian",
  mix: "mixolydian",
  loc: "locrian",
};

/**
 * Reads tunes in ABC notation: ties joined, repeats and endings unrolled, grace notes and ornaments left out,
 * octave clefs and transposing voices as they sound.
 *
 * @param text the file's text; several tunes (X:) become several voices
 * @returns the voices as written, or why the text cannot be read
 * @see ABC music standard 2.1 (2011)
 */
export function readAbc(text: string): WrittenFile {
  if (!/^\s*K:/m.test(text)) return { ok: false, reason: "This is no ABC tune: its K: line is missing." };
  const book = firstTunes(text);
  if (!sizeOfASong(book))
    return { ok: false, reason: "This ABC file holds too many notes or signs, or lengths that no song has." };
  try {
    const tunes = parseOnly(book) as unknown as AbcTune[];
    const voices = tunes.flatMap((tune) => readTune(tune, tunes.length > 1));
    if (voices.every((voice) => voice.notes.length === 0))
      return { ok: false, reason: "There are no notes in this ABC file." };
    return { ok: true, title: tunes[0] ? titleOf(tunes[0]) : null, voices };
  } catch {
    return { ok: false, reason: "This ABC file cannot be read; something in its notes is malformed." };
  }
}

/** What stands before the first tune, and the first tunes of a book, without directives: they shape pages and players. */
function firstTunes(text: string): string {
  const starts = [...text.matchAll(/^X:/gm)].map((match) => match.index);
  return text.slice(0, starts[mostTunes] ?? text.length).replace(/^%%.*$/gm, "%");
}

function sizeOfASong(text: string): boolean {
  const lines = text.split("\n");
  const music = lines.filter((line) => !/^\s*(?:[A-Zw+]:|%)/.test(line)).join("\n");
  const lengths = lines.filter((line) => /^\s*[LMQ]:/.test(line)).join("\n") + music.replace(/"[^"\n]*"/g, "");
  const restedBars = [...music.matchAll(/[ZX](\d+)/g)].reduce((sum, match) => sum + Number(match[1]), 0);
  const count = (signs: RegExp) => music.match(signs)?.length ?? 0;
  return (
    text.length <= most.characters &&
    lines.length <= most.lines &&
    lines.every((line) => line.length <= most.lineLength) &&
    count(/[A-Ga-g]/g) <= most.notes &&
    count(/[{}!"+]/g) <= most.signs * 4 &&
    count(/\|/g) <= most.bars &&
    count(/[{]/g) <= most.signs &&
    count(/&/g) <= most.overlays &&
    restedBars <= most.restedBars &&
    !/[<>]{4}/.test(music) &&
    !/\/\s*0/.test(lengths) &&
    !(lengths.match(/\d+/g) ?? []).some((number) => number.length > most.digits)
  );
}

function readTune(tune: AbcTune, several: boolean): WrittenVoice[] {
  const syllables = new Map<number, string>();
  for (const line of tune.lines) {
    for (const staff of line.staff ?? []) {
      staff.voices = (staff.voices ?? []).map((voice) => voice.filter((element) => element.el_type !== "tempo"));
      // Unrolling loses a last note that no bar line follows.
      if (line === tune.lines.at(-1))
        for (const voice of staff.voices) voice.push({ el_type: "bar", type: "bar_thin" });
      for (const element of staff.voices.flat()) {
        delete element.gracenotes;
        delete element.decoration;
        const text = element.lyric?.[0]?.syllable;
        if (text && element.startChar !== undefined) syllables.set(element.startChar, text);
      }
    }
  }
  const title = titleOf(tune);
  const { tracks } = tune.setUpAudio({ chordsOff: true });
  return tracks.map((track, index) => {
    const written = track.find((event) => event.cmd === "text" && event.type === "name")?.text?.trim();
    const own = written || (tracks.length > 1 ? `Voice ${index + 1}` : (title ?? "Tune"));
    const sounding = track.filter(
      ({ cmd, pitch = -1, duration = 0 }) => cmd === "note" && pitch >= 0 && pitch <= 127 && duration > 0,
    );
    const notes = sounding.map((event) => {
      const start = onGrid((event.start ?? 0) * 4);
      return { start, duration: onGrid((event.start ?? 0) * 4 + event.duration! * 4) - start, midi: event.pitch! };
    });
    const lyrics = sounding.flatMap((event) => {
      const text = event.startChar === undefined ? undefined : syllables.get(event.startChar);
      return text ? [{ start: onGrid((event.start ?? 0) * 4), text }] : [];
    });
    return {
      name: several && title !== null && own !== title ? `${title}, ${own}` : own,
      notes: notes.filter((note) => note.duration > 0),
      lyrics,
      key: keyOf(tune),
      signature: null,
      program: null,
      percussion: false,
    };
  });
}

function onGrid(quarters: number): number {
  return Math.round(quarters * grid) / grid;
}

function titleOf(tune: AbcTune): string | null {
  const { title } = tune.metaText;
  const text = typeof title === "string" ? title : title?.map((part) => part.text ?? "").join("");
  return text?.trim() || null;
}

function keyOf(tune: AbcTune): KeyName | null {
  const key = tune.getKeySignature();
  if (!key || !/^[A-G]$/.test(key.root ?? "")) return null;
  const mode = modes[(key.mode ?? "").toLowerCase()];
  return mode ? { tonic: `${key.root}${key.acc ?? ""}`, mode } : null;
}
