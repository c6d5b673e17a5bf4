import { type KeyName, keyOfFifths } from "../music/keyName";
import { type WrittenFile, type WrittenVoice, laterChanges } from "./melodyVoice";
import { readMidiTracks } from "./midiTracks";
import { giveMidiWords, midiWords } from "./midiWords";

const drumChannel = 9;
/** The part of a speed by which another still is the same: programs round it. */
const slack = 0.01;

/**
 * Reads a Standard MIDI File of any format; each track, or each channel where a track holds several, becomes a voice.
 *
 * @param bytes the file
 * @returns the voices, times in quarter notes, or why the file cannot be read
 * @see Standard MIDI File 1.0 (MMA RP-001, 1996)
 */
export function readMidi(bytes: Uint8Array): WrittenFile {
  const file = readMidiTracks(bytes);
  if (!file.ok) return file;
  const stated = file.keys[0];
  const key = stated ? statedKey(stated.fifths, stated.minor) : null;
  let filled = 0;
  const voices = file.tracks.flatMap((track, index) => {
    const channels = [...track.channels].filter(([, { notes }]) => notes.some((note) => note.ticks > 0));
    if (channels.length > 0) filled += 1;
    return channels.map(([channel, { notes, program }]): WrittenVoice & { track: number } => {
      const own = track.name || `Track ${filled}`;
      return {
        name: channels.length > 1 ? `${own}, channel ${channel + 1}` : own,
        notes: notes
          .filter((note) => note.ticks > 0)
          .map(({ tick, ticks, midi }) => ({ start: tick / file.division, duration: ticks / file.division, midi })),
        lyrics: [],
        key,
        signature: null,
        program,
        percussion: channel === drumChannel,
        track: index,
      };
    });
  });
  if (voices.length === 0) return { ok: false, reason: "There are no notes in this MIDI file." };
  const words = midiWords(file);
  if (words.syllables.length > 0) giveMidiWords(voices, words);
  // The first track of a file with several is the conductor's: its name is that of the piece.
  const first = file.tracks[0]!;
  const named = first.channels.size === 0 || file.tracks.length === 1 ? first.name : "";
  const [tempo, metre] = [file.tempos[0]?.quartersAMinute ?? null, file.metres[0]?.beats ?? null];
  return {
    ok: true,
    title: (words.title ?? named) || null,
    voices: voices.map(({ track: _, ...voice }) => voice),
    tempo,
    beatsPerBar: metre,
    cautions: laterChanges({
      tempo: file.tempos.some(({ quartersAMinute }) => Math.abs(quartersAMinute - tempo!) > slack * tempo!),
      metre: file.metres.some(({ beats }) => beats !== metre),
    }),
  };
}

/** C major is what stands where nobody set a key. */
function statedKey(fifths: number, minor: boolean): KeyName | null {
  if (Math.abs(fifths) > 7 || (fifths === 0 && !minor)) return null;
  return keyOfFifths(fifths, minor ? "minor" : "major");
}
