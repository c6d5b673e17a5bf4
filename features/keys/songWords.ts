import type { Song } from "@/shared/contract/song";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { keySign } from "@/shared/music/keyWords";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import { spellingIn } from "./keyRows";
import { writtenKeyOf } from "./songKeys";

/** The line under a song's title: "Written in G, tune D4 to E5 · your voice Evenings, E♭3 to D5 · box guitar, A D F♯" */
export function songWords(
  song: Song,
  voiceName: string | null,
  voice: SingingVoice | null,
  instrument: string,
): string {
  const written = writtenKeyOf(song);
  const spelling = written ? spellingIn(written) : "common";
  const ends = (low: number, high: number, kind: Spelling) =>
    glyphs(`${noteName(low, kind)} to ${noteName(high, kind)}`);
  const key = written ? `Written in ${glyphs(keySign(written))}` : "No key yet";
  const tune = song.tune && spanOf(song.tune);
  return [
    tune ? `${key}, tune ${ends(tune.low, tune.high, spelling)}` : key,
    voice && `${voiceWords(voiceName)}, ${heardWords(voice, ends)}`,
    `strings ${instrument}`,
  ]
    .filter((part) => part !== null)
    .join(" · ");
}

/** A voice in a sentence. A name such as "My voice" is already said by "your voice". */
export function voiceWords(name: string | null): string {
  return name === null || /^(my|your) voice$/i.test(name.trim()) ? "your voice" : `your voice ${name.trim()}`;
}

/** Whom the keys are for: "for your voice", or "for Evenings". */
export function forWords(name: string): string {
  return /^(my|your)\b/i.test(name.trim()) ? `for ${name.trim().replace(/^my\b/i, "your")}` : `for ${name.trim()}`;
}

function heardWords({ range, heard }: SingingVoice, ends: (low: number, high: number, kind: Spelling) => string) {
  const words = (band: SingingVoice["range"]) => ends(band.lowMidi, band.highMidi, "common");
  return heard ? `sung so far ${words(heard)}, probably ${words(range)}` : words(range);
}

function spanOf(tune: NonNullable<Song["tune"]>): { low: number; high: number } {
  if (tune.kind === "span") return { low: tune.lowMidi, high: tune.highMidi };
  const midis = tune.notes.map((note) => note.midi);
  return {
    low: midis.reduce((a, b) => Math.min(a, b), Infinity),
    high: midis.reduce((a, b) => Math.max(a, b), -Infinity),
  };
}
