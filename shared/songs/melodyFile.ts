import { keyFifths } from "../music/keyName";
import { readAbc } from "./abcMelody";
import { rankKeys } from "./findKey";
import type { Melody, MelodyNote } from "./melody";
import { type MelodyVoice, type WrittenFile, type WrittenVoice, singleLine } from "./melodyVoice";
import { readMidi } from "./midiMelody";
import { readMusicXml } from "./musicXmlMelody";
import { unpackMxl } from "./mxlArchive";
import { decodeText } from "./textBytes";
import { vocalLikelihood } from "./vocalLikelihood";

/** What a melody file holds: its voices, and which of them is proposed as the sung one. */
export type MelodyFile =
  | {
      ok: true;
      voices: MelodyVoice[];
      proposed: number;
      title: string | null;
      /** quarter notes a minute at the beginning; null where the file states no speed */
      tempo: number | null;
      /** beats of a bar at the beginning as the metre counts them (3 in 3/4, 6 in 6/8); null where none is stated */
      beatsPerBar: number | null;
      /** sentences that say what of the file is not in what was read: voices, tunes, later speeds and metres */
      cautions: string[];
    }
  | { ok: false; reason: string };

const mostBytes = 5_000_000;
const mostNotes = 10_000;
const mostVoices = 64;
/** of one syllable */
const mostLetters = 100;

/**
 * Reads a melody from a Standard MIDI File, a MusicXML score (plain or compressed) or ABC notation. The kind is told
 * from the content where it can be, else from the name.
 *
 * @param name file name with extension .mid, .midi, .musicxml, .xml, .mxl or .abc
 * @param bytes the file, at most 5 MB
 * @returns its voices with times in quarter notes, each a single line of at most 10,000 notes, and the index of the
 *   likeliest vocal line; or a sentence that says why the file is not read
 * @see Standard MIDI File 1.0; MusicXML 4.0; ABC music standard 2.1
 */
export function readMelodyFile(name: string, bytes: Uint8Array): MelodyFile {
  if (bytes.length === 0) return { ok: false, reason: "This file is empty." };
  if (bytes.length > mostBytes)
    return { ok: false, reason: "This file is larger than 5 MB, more than a melody needs." };
  const written = readWritten(name, bytes);
  if (!written.ok) return written;
  const filled = written.voices.filter((voice) => voice.notes.length > 0);
  const short = filled.filter((voice) => voice.notes.length <= mostNotes);
  const kept = short.slice(0, mostVoices);
  if (kept.length === 0) {
    const reason =
      filled.length === 0 ? "There are no notes in this file." : "No voice of this file has fewer than 10,000 notes.";
    return { ok: false, reason };
  }
  const likelihoods = kept.map(vocalLikelihood);
  const points = likelihoods.map((likelihood) => likelihood.points);
  return {
    ok: true,
    voices: kept.map((voice, index) => finished(voice, likelihoods[index]!.reasons)),
    proposed: points.indexOf(Math.max(...points)),
    title: written.title,
    tempo: written.tempo !== null && written.tempo >= 20 && written.tempo <= 400 ? round(written.tempo) : null,
    beatsPerBar:
      written.beatsPerBar !== null && written.beatsPerBar >= 1 && written.beatsPerBar <= 16
        ? written.beatsPerBar
        : null,
    cautions: [
      ...leftOut(short.length - kept.length, `only the first ${mostVoices} are read`),
      ...leftOut(filled.length - short.length, `more than 10,000 notes are no melody`),
      ...written.cautions,
    ],
  };
}

function leftOut(count: number, why: string): string[] {
  return count === 0 ? [] : [`${count === 1 ? "One voice is" : `${count} voices are`} left out: ${why}.`];
}

function readWritten(name: string, bytes: Uint8Array): WrittenFile {
  const extension = /\.([a-z0-9]+)$/i.exec(name)?.[1]?.toLowerCase() ?? "";
  if (startsWith(bytes, "MThd")) return readMidi(bytes);
  if (startsWith(bytes, "PK\x03\x04")) {
    const unpacked = unpackMxl(bytes);
    return unpacked.ok ? readMusicXml(unpacked.source) : unpacked;
  }
  if (extension === "mid" || extension === "midi") return { ok: false, reason: "This is no MIDI file." };
  if (extension === "mxl") return { ok: false, reason: "This is no compressed MusicXML file." };
  const text = decodeText(bytes);
  if (extension === "abc") return readAbc(text);
  if (["xml", "musicxml"].includes(extension) || /^\s*<\?xml/.test(text)) return readMusicXml(text);
  if (/^X:\s*\d/m.test(text) && /^K:/m.test(text)) return readAbc(text);
  return { ok: false, reason: "This kind of file is not known. MIDI, MusicXML and ABC files can be read." };
}

function finished(voice: WrittenVoice, reasons: string[]): MelodyVoice {
  const line = singleLine(voice.notes);
  const starts = new Set(line.map((note) => note.start));
  const lyrics = voice.lyrics.filter((syllable) => starts.has(syllable.start));
  const syllables = new Map(lyrics.map(({ start, text }) => [start, text.slice(0, mostLetters)]));
  const notes = line.map((note): MelodyNote => {
    const lyric = syllables.get(note.start);
    return lyric === undefined ? note : { ...note, lyric };
  });
  const melody: Melody = { notes, ...homeOf(voice, notes) };
  return { name: voice.name, melody, stated: voice.key, reasons, ...(lyrics.length > 0 ? { lyrics } : {}) };
}

/** What the file says; where it names only a signature, or nothing, the notes themselves are asked. */
function homeOf(voice: WrittenVoice, notes: Melody["notes"]): Pick<Melody, "home" | "mode"> {
  const ranked = voice.key ? [] : rankKeys({ notes });
  const signed = ranked.find(({ key }) => keyFifths(key) === voice.signature);
  const key = voice.key ?? signed?.key ?? ranked[0]?.key;
  return { home: key?.tonic ?? null, mode: key?.mode ?? null };
}

function startsWith(bytes: Uint8Array, tag: string): boolean {
  return [...tag].every((character, index) => bytes[index] === character.charCodeAt(0));
}

function round(tempo: number): number {
  return Math.round(tempo * 10) / 10;
}
