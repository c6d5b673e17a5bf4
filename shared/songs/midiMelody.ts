import { Midi } from "@tonejs/midi";
import { parseKeyName } from "../music/keyName";
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
    const named = stated ? parseKeyName(`${stated.key} ${stated.scale}`) : null;
    // C major is what programs write when nobody set the key: it says nothing.
    const key = named?.tonic === "C" && named.mode === "major" ? null : named;
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
