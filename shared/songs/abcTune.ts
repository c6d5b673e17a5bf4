import type { AbcTuneText } from "./abcBook";
import { abcSymbols, readAbcSymbol } from "./abcJumps";
import { type AbcKey, readAbcClef, readAbcKey } from "./abcKey";
import type { AbcSetting } from "./abcBars";
import { type AbcVoice, createAbcVoice } from "./abcVoice";
import { type WordCursor, layWords, plainWord } from "./abcWords";

/** A voice of a tune with what is known about it. */
export interface AbcPart {
  name: string | null;
  program: number | null;
  percussion: boolean;
  voice: AbcVoice;
}

/** One tune of an ABC file, read but not yet played. */
export interface AbcTune {
  title: string | null;
  key: AbcKey["key"];
  parts: AbcPart[];
  /** what P: says in the head, or null */
  order: string | null;
  /** quarter notes a minute, or null */
  tempo: number | null;
  beatsPerBar: number | null;
  /** whether the speed or the metre changes after the beginning */
  changes: { tempo: boolean; metre: boolean };
  /** ids of voices beyond the first 64, which are not read */
  unread: Set<string>;
}

/** Voices of one tune that are read. */
export const mostVoices = 64;
const field = /^\s*([A-Za-z+]):(?![|:])(.*)$/;

/**
 * Reads one tune: its head, then its music voice by voice, with the words under it.
 *
 * @param text the tune's lines
 * @returns its voices as bars
 * @throws AbcTooLarge where it asks for more than any song has
 * @see ABC music standard 2.1
 */
export function readAbcTune(text: AbcTuneText): AbcTune {
  const tune: AbcTune = {
    title: null,
    key: null,
    parts: [],
    order: null,
    tempo: null,
    beatsPerBar: null,
    changes: { tempo: false, metre: false },
    unread: new Set(),
  };
  const about = new Map<string, string>();
  let setting: AbcSetting = {
    signature: {},
    unit: 0,
    bar: 4,
    compound: false,
    symbols: abcSymbols,
    clef: { octaves: 0, clefOctaves: 0, semitones: 0, percussion: false },
  };
  let metre: string | null = null;
  let program: number | null = null;
  for (const line of text.header) {
    const midi = /^%%MIDI\s+program\s+(?:\d+\s+)?(\d{1,3})\b/.exec(line);
    if (midi) program = Number(midi[1]);
    const [, letter, said = ""] = field.exec(line) ?? [];
    if (letter === "T") tune.title ??= plainWord(said.replace(/~/g, " ")) || null;
    else if (letter === "M") metre = said;
    else if (letter === "L") setting = { ...setting, unit: unitOf(said) ?? setting.unit };
    else if (letter === "Q") tune.tempo ??= tempoOf(said, setting.unit || 0.5);
    else if (letter === "P") tune.order = said;
    else if (letter === "U") setting = { ...setting, symbols: readAbcSymbol(said, setting.symbols) };
    else if (letter === "V") about.set(said.trim().split(/\s+/)[0] ?? "", said);
    else if (letter === "K") {
      const read = readAbcKey(said);
      tune.key = read.key;
      setting = { ...setting, signature: read.signature ?? {}, clef: { ...setting.clef, ...unnamed(read.clef) } };
    }
  }
  setting = { ...setting, ...metreOf(metre ?? "none") };
  tune.beatsPerBar = beatsOf(metre ?? "none");
  if (setting.unit === 0) setting.unit = setting.bar !== null && setting.bar < 3 ? 0.25 : 0.5;

  let part = "";
  let here: AbcPart | null = null;
  const enter = (said: string): AbcPart => {
    const id = said.trim().split(/\s+/)[0] ?? "";
    const known = voices.get(id);
    const words = `${known ? "" : (about.get(id) ?? "").trim().slice(id.length)} ${said.trim().slice(id.length)}`;
    const clef = readAbcClef(words);
    const entered = known ?? {
      name: null,
      program,
      percussion: setting.clef.percussion,
      voice: createAbcVoice({ ...setting, clef: { ...setting.clef } }),
    };
    if (clef.name) entered.name ??= clef.name;
    else if (!/^\d*$/.test(id)) entered.name ??= id;
    entered.percussion ||= clef.percussion === true;
    entered.voice.setting = {
      ...entered.voice.setting,
      clef: { ...entered.voice.setting.clef, ...unnamed(clef) },
    };
    if (!known && voices.size < mostVoices) {
      voices.set(id, entered);
      tune.parts.push(entered);
    } else if (!known) tune.unread.add(id);
    return entered;
  };
  const voices = new Map<string, AbcPart>();
  const change = (letter: string, said: string) => {
    if (letter === "V") {
      here = enter(said);
      return;
    }
    if (letter === "P") {
      part = said.trim();
      return;
    }
    if (letter === "U") {
      setting = { ...setting, symbols: readAbcSymbol(said, setting.symbols) };
      for (const { voice } of tune.parts) voice.setting = { ...voice.setting, symbols: setting.symbols };
      return;
    }
    here ??= enter("1");
    const { voice } = here;
    if (letter === "M") {
      voice.setting = { ...voice.setting, ...metreOf(said) };
      tune.beatsPerBar ??= beatsOf(said);
      tune.changes.metre ||= beatsOf(said) !== tune.beatsPerBar;
    } else if (letter === "L") voice.setting = { ...voice.setting, unit: unitOf(said) ?? voice.setting.unit };
    else if (letter === "K") {
      const read = readAbcKey(said);
      const clef = { ...voice.setting.clef, ...unnamed(read.clef) };
      voice.setting = { ...voice.setting, signature: read.signature ?? voice.setting.signature, clef };
    } else if (letter === "I") {
      const clef = unnamed(readAbcClef(said));
      voice.setting = { ...voice.setting, clef: { ...voice.setting.clef, ...clef } };
    } else if (letter === "Q") {
      const speed = tempoOf(said, voice.setting.unit);
      tune.tempo ??= speed;
      tune.changes.tempo ||= speed !== null && speed !== tune.tempo;
    }
  };
  const words = new Map<AbcVoice, { verse: number; cursor: WordCursor; open: boolean }>();
  const lay = (said: string, more: boolean) => {
    if (!here) return;
    const { voice } = here;
    let state = words.get(voice);
    if (!state || (!more && !state.open)) {
      state = {
        verse: state ? state.verse + 1 : 0,
        cursor: { place: 0, bar: voice.line[0]?.bar ?? 0, begun: false },
        open: false,
      };
      words.set(voice, state);
    }
    state.open = /\\\s*$/.test(said);
    layWords(said.replace(/\\\s*$/, ""), voice.line, state.verse, state.cursor);
  };
  let continued = false;
  let lastField = "";
  for (const line of text.body) {
    if (line.startsWith("%%")) {
      here ??= enter("1");
      const midi = /^%%MIDI\s+(program|channel)\s+(?:\d+\s+(?=\d))?(\d{1,3})\b/.exec(line);
      if (midi?.[1] === "program") here.program = Number(midi[2]);
      if (midi?.[1] === "channel" && midi[2] === "10") here.percussion = true;
      continue;
    }
    const [, letter, said = ""] = field.exec(line) ?? [];
    if (letter === "w" || (letter === "+" && lastField === "w")) lay(said, letter === "+");
    else if (letter !== undefined) change(letter, said);
    lastField = letter === "+" ? lastField : (letter ?? "");
    if (letter !== undefined) continue;
    here ??= enter("1");
    const music = line.replace(/\\\s*$/, "");
    if (!continued || !words) startLine(here.voice);
    let from = 0;
    for (const inline of music.matchAll(/\[([A-Za-z]):([^\]]{0,300})\]/g)) {
      here.voice.read(music.slice(from, inline.index), part);
      const before: AbcPart = here;
      change(inline[1]!, inline[2]!);
      if (here !== before) startLine(here.voice);
      from = inline.index + inline[0].length;
    }
    here.voice.read(music.slice(from), part);
    continued = music !== line;
  }
  for (const { voice } of tune.parts) voice.end();
  return tune;

  function startLine(voice: AbcVoice): void {
    voice.beginLine();
    words.delete(voice);
  }
}

function unnamed(clef: ReturnType<typeof readAbcClef>): Omit<ReturnType<typeof readAbcClef>, "name"> {
  const { name: _, ...rest } = clef;
  return rest;
}

/** Unit length in quarter notes. */
function unitOf(said: string): number | null {
  const found = /^\s*(\d{1,3})\s*(?:\/\s*(\d{1,3}))?/.exec(said);
  const length = found ? (4 * Number(found[1])) / Number(found[2] ?? 1) : 0;
  return Number.isFinite(length) && length > 0 ? length : null;
}

function metreOf(said: string): Pick<AbcSetting, "bar" | "compound"> {
  if (/^\s*C/.test(said)) return { bar: 4, compound: false };
  const found = /^\s*\(?([\d\s+]{1,20})\)?\s*(?:\/\s*(\d{1,3}))?/.exec(said);
  const beats = found ? sum(found[1]!) : 0;
  // A lone 2 is two halves, a lone 3 three quarters (common practice).
  const bar = found ? (4 * beats) / Number(found[2] ?? (beats === 2 ? 2 : 4)) : NaN;
  if (!Number.isFinite(bar) || bar <= 0 || bar > 64) return { bar: null, compound: false };
  return { bar, compound: beats % 3 === 0 && beats > 3 && found?.[2] === "8" };
}

function beatsOf(said: string): number | null {
  if (/^\s*C\|/.test(said)) return 2;
  if (/^\s*C/.test(said)) return 4;
  const found = /^\s*\(?([\d\s+]{1,20})\)?\s*(?:\/|$)/.exec(said);
  return found ? sum(found[1]!) || null : null;
}

function sum(text: string): number {
  return text.split("+").reduce((all, each) => all + Number(each.trim() || 0), 0);
}

/** Quarter notes a minute. */
function tempoOf(said: string, unit: number): number | null {
  const plain = said.replace(/"[^"]*"/g, " ");
  const [lengths = "", speed] = plain.includes("=") ? plain.split("=") : ["", plain];
  const bpm = Number(/\d{1,4}(?:\.\d+)?/.exec(speed ?? "")?.[0] ?? NaN);
  const beats = [...lengths.matchAll(/(\d{1,3})\s*\/\s*(\d{1,3})/g)].reduce(
    (all, [, a, b]) => all + (4 * Number(a)) / Number(b),
    0,
  );
  const tempo = bpm * (beats > 0 ? beats : /\d/.test(lengths) || lengths === "" || /C/.test(lengths) ? unit : 1);
  return Number.isFinite(tempo) && tempo > 0 ? tempo : null;
}
