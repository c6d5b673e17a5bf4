import { median } from "@/shared/signal/median";
import { hzToMidi } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";

/** The note that sounds now. */
export interface NoteNow {
  /** nearest semitone */
  midi: number;
  /** cents above (+) or below (-) it */
  cents: number;
  heldS: number;
  words: "On the line" | "A little flat" | "Flat" | "A little sharp" | "Sharp";
}

/** A breath or a consonant this short does not end a note. */
const gapFrames = 8;
const sameNoteSemitones = 0.6;
/** Frames of the same note that its pitch is the middle of: about one period of a vibrato. */
const recentFrames = 20;
/** A pitch this far from the newest one belongs to another note; a semitone away always does. */
const otherNoteSemitones = 0.8;
/** A single stray frame names nothing. */
const newestFrames = 3;

/**
 * What is being sung at the end of `frames` (one per 10 ms), or null where nobody sings. A new note is named as soon as
 * two frames hold it. Vibrato and a short breath do not end a note: its pitch is the median of its last 0.2 s, and it is
 * held as long as pitch stays within 60 cents.
 */
export function noteNow(frames: readonly LiveFrame[]): NoteNow | null {
  const centre = centreNow(frames);
  if (centre === null) return null;
  let held = 0;
  let gap = 0;
  for (let k = frames.length - 1; k >= 0; k -= 1) {
    const hz = frames[k]?.hz ?? null;
    if (hz === null || Math.abs(hzToMidi(hz) - centre) > sameNoteSemitones) gap += 1;
    else {
      gap = 0;
      held = frames.length - k;
    }
    if (gap > gapFrames) break;
  }
  const midi = Math.round(centre);
  const cents = Math.round(100 * (centre - midi));
  return { midi, cents, heldS: held / 100, words: wordsFor(cents) };
}

/** The newest pitch, smoothed over as much of the same note as has sounded without another one between. */
function centreNow(frames: readonly LiveFrame[]): number | null {
  const lately = frames.slice(-gapFrames).flatMap(({ hz }) => (hz === null ? [] : [hzToMidi(hz)]));
  if (lately.length === 0) return null;
  const newest = median(lately.slice(-newestFrames));
  const same: number[] = [];
  let other = 0;
  for (let k = frames.length - 1; k >= Math.max(0, frames.length - recentFrames) && other < newestFrames; k -= 1) {
    const hz = frames[k]?.hz ?? null;
    if (hz === null) continue;
    const midi = hzToMidi(hz);
    if (Math.abs(midi - newest) < otherNoteSemitones) same.push(midi);
    else other += 1;
  }
  return same.length === 0 ? null : median(same);
}

function wordsFor(cents: number): NoteNow["words"] {
  if (Math.abs(cents) <= 15) return "On the line";
  if (cents < 0) return cents < -30 ? "Flat" : "A little flat";
  return cents > 30 ? "Sharp" : "A little sharp";
}
