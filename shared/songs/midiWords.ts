import type { MelodySyllable, WrittenVoice } from "./melodyVoice";
import { singleLine } from "./melodyVoice";
import type { MidiTracks } from "./midiTracks";

/** What the texts of a MIDI file say: syllables with their track, and a title. */
export interface MidiWords {
  title: string | null;
  syllables: { track: number; start: number; text: string; newLine: boolean }[];
}

/** How far a syllable may stand from its note, in quarter notes. */
const reach = 0.25;

/**
 * Reads the words of a MIDI file: lyric events, or the text events of a karaoke file, where "/" begins a line, "\" a
 * paragraph and "@" a remark.
 *
 * @param file the file, taken apart
 * @returns the syllables, those whose word goes on with a "-" at the end
 * @see Standard MIDI File 1.0 (MMA RP-001), meta events 01 and 05; karaoke marks: common practice
 */
export function midiWords(file: MidiTracks): MidiWords {
  const all = file.tracks.flatMap((track, index) => track.texts.map((event) => ({ ...event, track: index })));
  const lyrics = all.filter((event) => event.lyric);
  const remarks = all.filter((event) => event.text.startsWith("@"));
  const plain = (lyrics.length > 0 ? lyrics : all).filter((event) => !event.text.startsWith("@"));
  plain.sort((a, b) => a.tick - b.tick);
  const title =
    remarks
      .find((event) => event.text.startsWith("@T"))
      ?.text.slice(2)
      .trim() ?? "";
  const spaced = plain.some((event) => /^[\\/]?\s|[^\s]\s+$/.test(event.text.replace(/[\r\n]/g, "")));
  const syllables: MidiWords["syllables"] = [];
  let newLine = true;
  let open = false;
  for (const event of plain) {
    if (/^[\\/]|^[\r\n]/.test(event.text)) newLine = true;
    const text = event.text.replace(/^[\\/]+/, "");
    const word = text
      .replace(/\p{Cc}/gu, " ")
      .replace(/\s+/g, " ")
      .trim();
    const last = syllables.at(-1);
    // In a file that writes spaces, a syllable without one goes on in the next.
    if (last && open && spaced && !newLine && word !== "" && !/^\s/.test(text) && !last.text.endsWith("-"))
      last.text += "-";
    if (word !== "") {
      syllables.push({ track: event.track, start: event.tick / file.division, text: word, newLine });
      newLine = false;
      open = !/\s$/.test(text);
    } else if (/\s/.test(text)) open = false;
    if (/[\r\n]\s*$/.test(event.text)) newLine = true;
  }
  return { title: title || null, syllables };
}

/**
 * Gives words to the voice whose notes they stand with, if most of them stand with notes of one.
 *
 * @param voices the voices of the file, each with the number of its track; the chosen one gets its `lyrics`
 * @param words what the file says
 */
export function giveMidiWords(voices: readonly (WrittenVoice & { track: number })[], words: MidiWords): void {
  let best: { voice: WrittenVoice; laid: MelodySyllable[]; points: number } | null = null;
  for (const voice of voices) {
    if (voice.percussion) continue;
    const own = words.syllables.filter((syllable) => syllable.track === voice.track);
    const given = own.length >= 2 ? own : words.syllables;
    const laid = laidUnder(voice, given);
    if (laid.length < 2 && laid.length < given.length) continue;
    // Words that stand in a voice's own track are its own; a voice with few other notes fits better.
    const share = laid.length / Math.max(1, given.length);
    const points = share + (own.length >= 2 ? 1 : 0) + laid.length / Math.max(1, voice.notes.length);
    if (share > 0.5 && (!best || points > best.points)) best = { voice, laid, points };
  }
  if (best) best.voice.lyrics = best.laid;
}

function laidUnder(voice: WrittenVoice, syllables: MidiWords["syllables"]): MelodySyllable[] {
  const starts = singleLine(voice.notes).map((note) => note.start);
  const laid: MelodySyllable[] = [];
  let place = 0;
  for (const { start, text, newLine } of syllables) {
    while (place + 1 < starts.length && Math.abs(starts[place + 1]! - start) <= Math.abs(starts[place]! - start))
      place += 1;
    const at = starts[place];
    if (at === undefined || Math.abs(at - start) > reach || laid.at(-1)?.start === at) continue;
    laid.push({ start: at, text, ...(newLine ? { newLine: true as const } : {}) });
  }
  return laid;
}
