import { Midi } from "@tonejs/midi";
import { keyFifths, keyOfFifths, type KeyName, parseKeyName } from "../music/keyName";
import { scanMidi } from "./midiScan";
import type { WrittenFile, WrittenVoice } from "./melodyVoice";

/**
 * Reads a Standard MIDI File; each track (of a one-track file: each channel) becomes a voice.
 *
 * @param bytes the file
 * @returns the voices, times in quarter notes, or why the file cannot be read
 * @see Standard MIDI File 1.0 (MMA RP-001, 1996)
 */
export function readMidi(bytes: Uint8Array): WrittenFile {
  const scan = scanMidi(bytes);
  if (!scan.ok) return scan;
  try {
    const file = new Midi(bytes);
    const { ppq } = file.header;
    const stated = file.header.keySignatures[0];
    const key = stated ? statedKey(stated.key, stated.scale) : null;
    const tracks = file.tracks.filter((track) => track.notes.length > 0);
    const words = file.header.meta.filter((event) => event.type === "lyrics");
    const voices = tracks.map((track, index): WrittenVoice => {
      const notes = track.notes.flatMap((note) =>
        note.durationTicks > 0
          ? [{ start: note.ticks / ppq, duration: note.durationTicks / ppq, midi: note.midi }]
          : [],
      );
      return {
        name: track.name.replace(/\p{Cc}/gu, "").trim() || `Track ${index + 1}`,
        notes,
        lyrics: [],
        key,
        signature: null,
        program: track.instrument.number,
        percussion: track.channel === 9,
      };
    });
    giveWords(
      voices,
      words.map((word) => ({ start: word.ticks / ppq, text: word.text.trim() })),
    );
    const title = file.name.replace(/\p{Cc}/gu, "").trim();
    return { ok: true, title: title || null, voices };
  } catch {
    return { ok: false, reason: "This MIDI file cannot be read; it is damaged." };
  }
}

/** The reader names the signature by its major key in minor keys too. C major is what stands where nobody set a key. */
function statedKey(major: string | undefined, scale: string): KeyName | null {
  const signature = major === undefined ? null : parseKeyName(major);
  if (!signature || (signature.tonic === "C" && scale === "major")) return null;
  return keyOfFifths(keyFifths(signature), scale === "minor" ? "minor" : "major");
}

/** Words of the file belong to the track whose notes start with them. */
function giveWords(voices: WrittenVoice[], words: { start: number; text: string }[]): void {
  const sung = words.filter((word) => word.text !== "");
  if (sung.length === 0) return;
  let best: WrittenVoice | null = null;
  let most = sung.length / 2;
  for (const voice of voices) {
    const starts = new Set(voice.notes.map((note) => Math.round(note.start * 8)));
    const hits = sung.filter((word) => starts.has(Math.round(word.start * 8))).length;
    if (hits > most) [best, most] = [voice, hits];
  }
  if (best) best.lyrics = sung;
}
