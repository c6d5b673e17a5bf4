import { strToU8 } from "fflate";
import { type MidiEvent, parseMidi } from "midi-file";
import { decodeText } from "./textBytes";

/** A note of a MIDI track, in ticks. */
interface MidiNote {
  tick: number;
  ticks: number;
  midi: number;
}
/** A track of a MIDI file: what sounds, by channel 0 to 15, and what is said, in ticks. */
interface MidiTrack {
  name: string;
  channels: Map<number, { notes: MidiNote[]; program: number | null }>;
  /** meta events 1 (text) and 5 (lyric) */
  texts: { tick: number; text: string; lyric: boolean }[];
}
/** A Standard MIDI File taken apart. */
export interface MidiTracks {
  ok: true;
  /** ticks of a quarter note */
  division: number;
  tracks: MidiTrack[];
  tempos: { tick: number; quartersAMinute: number }[];
  metres: { tick: number; beats: number }[];
  keys: { tick: number; fifths: number; minor: boolean }[];
}
type Refusal = { ok: false; reason: string };

const most = {
  bytes: 1_200_000,
  notes: 100_000,
  atOnce: 256,
  strays: 2_000,
  events: 400_000,
  tracks: 1_000,
  texts: 20_000,
  quarters: 50_000,
};
const damaged: Refusal = { ok: false, reason: "This MIDI file cannot be read; it is damaged or cut off." };
const tooMany: Refusal = { ok: false, reason: "This file holds too many notes." };
const tooLong: Refusal = { ok: false, reason: "This MIDI file lasts longer than any song." };

class Refused extends Error {
  constructor(readonly refusal: Refusal) {
    super(refusal.reason);
  }
}

/** Bytes that let nobody read a stretch that is not there: lengths that a damaged file states lead nowhere. */
class WatchedBytes extends Uint8Array {
  override slice(from = 0, to = this.length): Uint8Array<ArrayBuffer> {
    if (from < 0 || to < from || to > this.length) throw new Refused(damaged);
    // Whatever is cut out of it is watched as well: a typed array cuts its own kind.
    return super.slice(from, to);
  }
}

/**
 * Takes a Standard MIDI File apart: any format, running status, notes paired with their ends.
 *
 * @param bytes the file
 * @returns its tracks, or why it is not read
 * @see Standard MIDI File 1.0 (MMA RP-001, 1996): chunks, variable-length quantities, running status, meta events
 */
export function readMidiTracks(bytes: Uint8Array): MidiTracks | Refusal {
  if (!hasTag(bytes, 0, "MThd")) return { ok: false, reason: "This is no MIDI file." };
  if (bytes.length < 14) return damaged;
  const division = bytes[12]! * 256 + bytes[13]!;
  if (division >= 0x8000)
    return { ok: false, reason: "This MIDI file counts film frames, not beats; it cannot be read." };
  if (division === 0) return damaged;
  const file: MidiTracks = { ok: true, division, tracks: [], tempos: [], metres: [], keys: [] };
  const count = { notes: 0, events: 0, texts: 0 };
  try {
    for (const events of parsed(bytes)) file.tracks.push(readTrack(events, file, count));
  } catch (error) {
    if (error instanceof Refused) return error.refusal;
    throw error;
  }
  if (file.tracks.length === 0) return damaged;
  for (const events of [file.tempos, file.metres, file.keys]) events.sort((a, b) => a.tick - b.tick);
  return file;
}

/** The events of each track. Chunks of unknown kind are left out, as the standard asks. */
function parsed(bytes: Uint8Array): MidiEvent[][] {
  const chunks: Uint8Array[] = [];
  let place = 8 + uint32(bytes, 4);
  while (place + 8 <= bytes.length) {
    const end = place + 8 + uint32(bytes, place + 4);
    if (end > bytes.length) throw new Refused(damaged);
    if (hasTag(bytes, place, "MTrk")) chunks.push(bytes.subarray(place, end));
    if (chunks.length > most.tracks)
      throw new Refused({ ok: false, reason: "This MIDI file has far more tracks than a song." });
    place = end;
  }
  const head = [...strToU8("MThd"), 0, 0, 0, 6, 0, 1, chunks.length >> 8, chunks.length & 0xff, bytes[12]!, bytes[13]!];
  const size = chunks.reduce((sum, chunk) => sum + chunk.length, head.length);
  if (size > most.bytes) throw new Refused(tooMany);
  const file = new WatchedBytes(size);
  file.set(head);
  chunks.reduce((at, chunk) => (file.set(chunk, at), at + chunk.length), head.length);
  try {
    return parseMidi(file).tracks;
  } catch {
    // The library says in words of its own what is wrong with the bytes.
    throw new Refused(damaged);
  }
}

function readTrack(
  events: readonly MidiEvent[],
  file: MidiTracks,
  count: { notes: number; events: number; texts: number },
): MidiTrack {
  const track: MidiTrack = { name: "", channels: new Map(), texts: [] };
  const sounding = new Map<number, MidiNote[]>();
  let tick = 0;
  let held = 0;
  let strays = 0;
  count.events += events.length;
  if (count.events > most.events) throw new Refused(tooMany);
  for (const event of events) {
    if (!(event.deltaTime >= 0)) throw new Refused(damaged);
    tick += event.deltaTime;
    if (tick > most.quarters * file.division) throw new Refused(tooLong);
    if (event.type === "endOfTrack") break;
    if (event.type === "programChange") channelOf(track, event.channel).program ??= inByte(event.programNumber);
    else if (event.type === "noteOn") {
      count.notes += 1;
      held += 1;
      if (count.notes > most.notes || held > most.atOnce) throw new Refused(tooMany);
      inByte(event.velocity);
      const note = { tick, ticks: -1, midi: inByte(event.noteNumber) };
      channelOf(track, event.channel).notes.push(note);
      const name = (event.channel << 7) | note.midi;
      const before = sounding.get(name);
      if (before) before.push(note);
      else sounding.set(name, [note]);
    } else if (event.type === "noteOff") {
      const note = sounding.get((event.channel << 7) | inByte(event.noteNumber))?.shift();
      if (note) {
        note.ticks = tick - note.tick;
        held -= 1;
      } else strays += 1;
      if (strays > most.strays) throw new Refused(tooMany);
    } else readMeta(event, tick, track, file, count);
  }
  // What was never let go sounds to the end of its track.
  for (const notes of sounding.values()) for (const note of notes) note.ticks = tick - note.tick;
  return track;
}

function channelOf(track: MidiTrack, number: number) {
  const channel = track.channels.get(number) ?? { notes: [], program: null };
  track.channels.set(number, channel);
  return channel;
}

function readMeta(event: MidiEvent, tick: number, track: MidiTrack, file: MidiTracks, count: { texts: number }): void {
  if (event.type === "text" || event.type === "lyrics") {
    count.texts += 1;
    if (count.texts <= most.texts) track.texts.push({ tick, text: textOf(event.text), lyric: event.type === "lyrics" });
  } else if (event.type === "trackName" && track.name === "") {
    track.name = textOf(event.text)
      .replace(/\p{Cc}/gu, "")
      .trim();
  } else if (event.type === "setTempo" && event.microsecondsPerBeat > 0 && file.tempos.length < most.texts) {
    file.tempos.push({ tick, quartersAMinute: 60_000_000 / event.microsecondsPerBeat });
  } else if (event.type === "timeSignature" && file.metres.length < most.texts) {
    file.metres.push({ tick, beats: event.numerator });
  } else if (event.type === "keySignature" && file.keys.length < most.texts) {
    file.keys.push({ tick, fifths: event.key, minor: event.scale === 1 });
  }
}

/** The library hands each byte of a text over as one character. */
function textOf(text: string): string {
  return decodeText(strToU8(text.slice(0, 400), true));
}

/** A value of a channel message; undefined where the track ends within it. */
function inByte(value: number | undefined): number {
  if (value === undefined) throw new Refused(damaged);
  return value & 0x7f;
}

function hasTag(bytes: Uint8Array, place: number, tag: string): boolean {
  return [...tag].every((character, index) => bytes[place + index] === character.charCodeAt(0));
}

function uint32(bytes: Uint8Array, place: number): number {
  return [0, 1, 2, 3].reduce((value, index) => value * 256 + (bytes[place + index] ?? 0), 0);
}
