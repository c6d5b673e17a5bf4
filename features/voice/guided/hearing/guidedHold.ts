import { hzToMidi } from "@/shared/music/pitch";
import { HELD_IN_HOLD_S } from "@/shared/voice/sungNotes";
import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport, Verdict } from "@/shared/voice/takeReport";

/** One note that was held under guidance. */
export interface HeldNote {
  /** as sung */
  midi: number;
  heldS: number;
  steadinessCents: number;
}

/** How a try went. */
export type TryOutcome =
  | { kind: "held"; note: HeldNote }
  /** a note was held, but it is not the one asked for and no step on */
  | { kind: "elsewhere"; note: HeldNote }
  /** a voice was heard, but nothing was held long enough */
  | { kind: "unsteady" }
  /** the recording says nothing about the voice */
  | { kind: "unheard"; why: Exclude<Verdict, "heard"> };

const sameNote = 0.6;
/** A voice was there if so many frames of 10 ms have a pitch. */
const soundedFrames = 25;
const noHold = new Set<Verdict>(["heard", "not-singing", "too-short"]);
/** Who does not sing the very note asked for may still be a step on: this far from it, the sung note itself counts. */
const nearby = 3.5;

export interface Asked {
  midi: number;
  /** from here on a note is farther than all that were held; null for the first note, which may be any near one */
  beyond: { midi: number; side: -1 | 1 } | null;
}

/** Reads one try. Without `asked` any held note counts: the first comfortable hum. */
export function readTry(report: TakeReport, asked: Asked | null): TryOutcome {
  const notes = report.notes.filter(({ sustained }) => sustained);
  if (report.verdict !== "heard" || notes.length === 0) {
    // A note that slides or breaks is no singing to the engine, but it is a try of this voice.
    const sounded = report.f0.filter((hz) => hz !== null).length >= soundedFrames;
    if (sounded && noHold.has(report.verdict)) return { kind: "unsteady" };
    return { kind: "unheard", why: report.verdict === "heard" ? "too-short" : report.verdict };
  }
  const held = notes
    .map(({ start, end, midi, steadinessCents }) => ({ midi, heldS: end - start, steadinessCents }))
    .sort((a, b) => b.heldS - a.heldS);
  const longest = held[0] as HeldNote;
  if (!asked) return { kind: "held", note: longest };
  const exact = held.find(({ midi }) => Math.abs(midi - asked.midi) <= sameNote);
  if (exact) return { kind: "held", note: exact };
  const { beyond } = asked;
  const stepOn = held.find(
    ({ midi }) =>
      Math.abs(midi - asked.midi) <= nearby && (beyond === null || beyond.side * (midi - beyond.midi) >= sameNote),
  );
  return stepOn ? { kind: "held", note: stepOn } : { kind: "elsewhere", note: longest };
}

/** A breath or a consonant this short does not end a note. */
const gapFrames = 6;
const settleFrames = 20;

/** The note being held at the end of `frames` (one per 10 ms), and since when; null where nobody holds one. */
export function holdNow(frames: readonly LiveFrame[]): { midi: number; heldS: number } | null {
  const recent = frames.slice(-settleFrames).flatMap(({ hz }) => (hz === null ? [] : [hzToMidi(hz)]));
  if (recent.length < settleFrames / 2) return null;
  const centre = [...recent].sort((a, b) => a - b)[recent.length >> 1] as number;
  let held = 0;
  let gap = 0;
  for (let k = frames.length - 1; k >= 0 && gap <= gapFrames; k -= 1) {
    const hz = frames[k]?.hz ?? null;
    if (hz === null || Math.abs(hzToMidi(hz) - centre) > sameNote) gap += 1;
    else {
      gap = 0;
      held = frames.length - k;
    }
  }
  return { midi: centre, heldS: held / 100 };
}

/** Whether somebody sang and then fell silent: the try is over before its time. */
export function fellSilent(frames: readonly LiveFrame[]): boolean {
  const silent = frames.slice(-silentFrames).every(({ hz }) => hz === null);
  return silent && frames.filter(({ hz }) => hz !== null).length >= soundedFrames;
}

const silentFrames = 120;

/** A note counts from here on, in seconds. */
export const leastHoldS = HELD_IN_HOLD_S;
/** Held so long, the next one can come. */
export const enoughHoldS = 1.5;
/** A try ends by itself after this many seconds. */
export const longestTryS = 7;
