import type { HeardNote } from "./sungNotes";
import type { TrackFrame } from "./trackFrame";
import type { RoomFloor } from "./roomFloor";

/**
 * How sure the range of a heard take is, and why, in plain words.
 *
 * @param notes all notes of the take
 * @param frames the track
 * @param room what the room sounded like
 * @returns certainty 0 to 1 and its reasons
 */
export function weighCertainty(
  notes: readonly HeardNote[],
  frames: readonly TrackFrame[],
  room: RoomFloor,
): { certainty: number; reasons: string[] } {
  const clear = notes.filter((n) => n.clear);
  const long = notes.filter((n) => n.sustained || n.heldS >= 0.15);
  const heldS = clear.reduce((sum, n) => sum + n.heldS, 0);
  const low = Math.min(...clear.map((n) => n.midi));
  const high = Math.max(...clear.map((n) => n.midi));
  const sightings = Math.min(countNear(clear, low), countNear(clear, high));
  const clarity = clear.reduce((sum, n) => sum + n.clarity * n.heldS, 0) / heldS;
  const loud = frames.filter((f) => f.hz !== null).reduce((sum, f) => sum + 10 ** (f.levelDb / 10), 0);
  const voiced = frames.filter((f) => f.hz !== null).length;
  const aboveRoom = room.levelDb === null ? null : 10 * Math.log10(loud / Math.max(1, voiced)) - room.levelDb;

  const seen = heldS / (heldS + 3);
  const agreement = clear.length / Math.max(1, long.length);
  const quiet = aboveRoom === null ? 0.9 : Math.max(0, Math.min(1, (aboveRoom - 3) / 22));
  const ends = sightings >= 3 ? 1 : sightings === 2 ? 0.9 : 0.7;
  const certainty = Math.max(
    0.05,
    Math.min(0.98, (0.35 * seen + 0.3 * agreement + 0.2 * quiet + 0.15 * Math.max(0, 2 * clarity - 1)) * ends),
  );

  const reasons = [`Heard clearly in ${clear.length} of ${long.length} ${long.length === 1 ? "note" : "notes"}.`];
  reasons.push(`You held notes for ${heldS.toFixed(1)} seconds in all.`);
  if (sightings === 1) reasons.push("The lowest or the highest note was sung only once; sing it again to make sure.");
  if (aboveRoom !== null && aboveRoom < 15) reasons.push("The room was noisy, which makes quiet notes less sure.");
  return { certainty, reasons };
}

function countNear(notes: readonly HeardNote[], midi: number): number {
  return notes.filter((n) => Math.abs(n.midi - midi) < 1).length;
}
