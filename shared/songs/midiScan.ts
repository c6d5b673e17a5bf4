const mostNotes = 100_000;
const mostAtOnce = 256;
const mostStrays = 2_000;
const mostEvents = 400_000;

/** A pass over a MIDI file's bytes that costs little: is it whole, and is it of a size to be read? */
export type MidiScan = { ok: true; notes: number } | { ok: false; reason: string };

const damaged: MidiScan = { ok: false, reason: "This MIDI file cannot be read; it is damaged or cut off." };
const tooMany: MidiScan = { ok: false, reason: "This file holds too many notes." };

/**
 * Walks through the events of a Standard MIDI File before it is read in earnest.
 *
 * @param bytes the file
 * @returns how many notes it starts, or why it will not be read
 * @see Standard MIDI File 1.0 (MMA RP-001, 1996): chunks, variable-length quantities, running status
 */
export function scanMidi(bytes: Uint8Array): MidiScan {
  if (!hasTag(bytes, 0, "MThd")) return { ok: false, reason: "This is no MIDI file." };
  if (bytes.length < 14) return damaged;
  const division = bytes[12]! * 256 + bytes[13]!;
  if (division >= 0x8000)
    return { ok: false, reason: "This MIDI file counts film frames, not beats; it cannot be read." };
  if (division === 0) return damaged;
  let place = 8 + uint32(bytes, 4);
  let notes = 0;
  let tracks = 0;
  while (place + 8 <= bytes.length) {
    const end = place + 8 + uint32(bytes, place + 4);
    if (end > bytes.length) return damaged;
    if (hasTag(bytes, place, "MTrk")) {
      const scan = scanTrack(bytes, place + 8, end);
      if (!scan.ok) return scan;
      notes += scan.notes;
      tracks += 1;
      if (notes > mostNotes) return tooMany;
    }
    place = end;
  }
  if (tracks === 0) return damaged;
  return notes === 0 ? { ok: false, reason: "There are no notes in this MIDI file." } : { ok: true, notes };
}

function scanTrack(bytes: Uint8Array, from: number, end: number): MidiScan {
  const sounding = new Map<number, number>();
  let place = from;
  let status = 0;
  let notes = 0;
  let held = 0;
  let strays = 0;
  let events = 0;
  /** Reads a variable-length quantity; -1 where it is none. */
  const quantity = (): number => {
    let value = 0;
    for (let count = 0; count < 4 && place < end; count += 1) {
      const byte = bytes[place]!;
      place += 1;
      value = value * 128 + (byte & 0x7f);
      if (byte < 0x80) return value;
    }
    return -1;
  };
  while (place < end) {
    events += 1;
    if (events > mostEvents) return tooMany;
    if (quantity() < 0 || place >= end) return damaged;
    const first = bytes[place]!;
    if (first === 0xff || first === 0xf0 || first === 0xf7) {
      place += first === 0xff ? 2 : 1;
      const length = quantity();
      if (length < 0 || place + length > end) return damaged;
      place += length;
      continue;
    }
    if (first >= 0x80) {
      if (first > 0xf0) return damaged;
      status = first;
      place += 1;
    } else if (status === 0) return damaged;
    const kind = status & 0xf0;
    const length = kind === 0xc0 || kind === 0xd0 ? 1 : 2;
    if (place + length > end) return damaged;
    if (kind === 0x80 || kind === 0x90) {
      const name = ((status & 0x0f) << 7) | bytes[place]!;
      const before = sounding.get(name) ?? 0;
      const on = kind === 0x90 && bytes[place + 1]! > 0;
      if (on) notes += 1;
      if (on || before > 0) {
        sounding.set(name, before + (on ? 1 : -1));
        held += on ? 1 : -1;
      } else strays += 1;
      if (notes > mostNotes || held > mostAtOnce || strays > mostStrays) return tooMany;
    }
    place += length;
  }
  return { ok: true, notes };
}

function hasTag(bytes: Uint8Array, place: number, tag: string): boolean {
  return [...tag].every((character, index) => bytes[place + index] === character.charCodeAt(0));
}

function uint32(bytes: Uint8Array, place: number): number {
  return [0, 1, 2, 3].reduce((value, index) => value * 256 + (bytes[place + index] ?? 0), 0);
}
