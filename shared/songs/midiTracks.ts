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
  let place = 8 + uint32(bytes, 4);
  try {
    while (place + 8 <= bytes.length) {
      const end = place + 8 + uint32(bytes, place + 4);
      if (end > bytes.length) return damaged;
      if (hasTag(bytes, place, "MTrk")) {
        if (file.tracks.length >= most.tracks)
          return { ok: false, reason: "This MIDI file has far more tracks than a song." };
        file.tracks.push(readTrack(bytes, place + 8, end, file, count));
      }
      place = end;
    }
  } catch (error) {
    if (error instanceof Refused) return error.refusal;
    throw error;
  }
  if (file.tracks.length === 0) return damaged;
  for (const events of [file.tempos, file.metres, file.keys]) events.sort((a, b) => a.tick - b.tick);
  return file;
}

function readTrack(
  bytes: Uint8Array,
  from: number,
  end: number,
  file: MidiTracks,
  count: { notes: number; events: number; texts: number },
): MidiTrack {
  const track: MidiTrack = { name: "", channels: new Map(), texts: [] };
  const sounding = new Map<number, MidiNote[]>();
  let place = from;
  let tick = 0;
  let status = 0;
  let held = 0;
  let strays = 0;
  const quantity = (): number => {
    let value = 0;
    for (let digits = 0; digits < 4 && place < end; digits += 1) {
      const byte = bytes[place]!;
      place += 1;
      value = value * 128 + (byte & 0x7f);
      if (byte < 0x80) return value;
    }
    throw new Refused(damaged);
  };
  while (place < end) {
    count.events += 1;
    if (count.events > most.events) throw new Refused(tooMany);
    tick += quantity();
    if (tick > most.quarters * file.division) throw new Refused(tooLong);
    if (place >= end) throw new Refused(damaged);
    const first = bytes[place]!;
    if (first === 0xff || first === 0xf0 || first === 0xf7) {
      const kind = first === 0xff ? bytes[place + 1]! : -1;
      place += first === 0xff ? 2 : 1;
      const length = quantity();
      if (place + length > end) throw new Refused(damaged);
      if (kind >= 0) readMeta(kind, bytes.subarray(place, place + length), tick, track, file, count);
      place += length;
      if (kind === 0x2f) break;
      continue;
    }
    if (first >= 0x80) {
      if (first > 0xf0) throw new Refused(damaged);
      status = first;
      place += 1;
    } else if (status === 0) throw new Refused(damaged);
    const kind = status & 0xf0;
    const length = kind === 0xc0 || kind === 0xd0 ? 1 : 2;
    if (place + length > end) throw new Refused(damaged);
    const [one, two] = [bytes[place]!, bytes[place + 1] ?? 0];
    place += length;
    if (kind !== 0x80 && kind !== 0x90 && kind !== 0xc0) continue;
    const channel = channelOf(track, status & 0x0f);
    if (kind === 0xc0) channel.program ??= one & 0x7f;
    else if (kind === 0x90 && two > 0) {
      count.notes += 1;
      held += 1;
      if (count.notes > most.notes || held > most.atOnce) throw new Refused(tooMany);
      const note = { tick, ticks: -1, midi: one & 0x7f };
      channel.notes.push(note);
      const name = ((status & 0x0f) << 7) | note.midi;
      const before = sounding.get(name);
      if (before) before.push(note);
      else sounding.set(name, [note]);
    } else {
      const note = sounding.get(((status & 0x0f) << 7) | (one & 0x7f))?.shift();
      if (note) {
        note.ticks = tick - note.tick;
        held -= 1;
      } else strays += 1;
      if (strays > most.strays) throw new Refused(tooMany);
    }
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

function readMeta(
  kind: number,
  data: Uint8Array,
  tick: number,
  track: MidiTrack,
  file: MidiTracks,
  count: { texts: number },
): void {
  if (kind === 1 || kind === 5) {
    count.texts += 1;
    if (count.texts <= most.texts)
      track.texts.push({ tick, text: decodeText(data.subarray(0, 400)), lyric: kind === 5 });
  } else if (kind === 3 && track.name === "") {
    track.name = decodeText(data.subarray(0, 400))
      .replace(/\p{Cc}/gu, "")
      .trim();
  } else if (kind === 0x51 && data.length >= 3 && file.tempos.length < most.texts) {
    const micros = data[0]! * 65_536 + data[1]! * 256 + data[2]!;
    if (micros > 0) file.tempos.push({ tick, quartersAMinute: 60_000_000 / micros });
  } else if (kind === 0x58 && data.length >= 2 && file.metres.length < most.texts) {
    file.metres.push({ tick, beats: data[0]! });
  } else if (kind === 0x59 && data.length >= 2 && file.keys.length < most.texts) {
    file.keys.push({ tick, fifths: (data[0]! << 24) >> 24, minor: data[1] === 1 });
  }
}

function hasTag(bytes: Uint8Array, place: number, tag: string): boolean {
  return [...tag].every((character, index) => bytes[place + index] === character.charCodeAt(0));
}

function uint32(bytes: Uint8Array, place: number): number {
  return [0, 1, 2, 3].reduce((value, index) => value * 256 + (bytes[place + index] ?? 0), 0);
}
