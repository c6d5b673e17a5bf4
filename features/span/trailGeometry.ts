import { hzToMidi } from "@/shared/music/pitch";
import type { LiveFrame } from "@/shared/voice/liveTracker";

/** Seconds that the trail shows. */
export const trailSeconds = 6;

/** A steady stretch of the trail. */
export interface TrailNote {
  start: number;
  end: number;
  /** nearest line */
  line: number;
  /** mean pitch, fractional MIDI */
  midi: number;
  /** cents off the line, -50 to 50 */
  cents: number;
  /** what was sung in it, smoothed */
  points: readonly TrailPoint[];
}

/** One sounding point of the trail. */
export interface TrailPoint {
  t: number;
  midi: number;
}

const shortestS = 0.12;
const gapS = 0.08;

/** The sounding frames of the last seconds, as pitches. */
export function trailPoints(frames: readonly LiveFrame[], now: number): TrailPoint[] {
  return frames.flatMap((frame) =>
    frame.hz !== null && frame.t > now - trailSeconds && frame.t <= now
      ? [{ t: frame.t, midi: hzToMidi(frame.hz) }]
      : [],
  );
}

/** Slides a window of five over the points, so that a single stray frame moves nothing. */
function medianOfFive(points: readonly TrailPoint[], index: number): number {
  const near = points.slice(Math.max(0, index - 2), index + 3).map((point) => point.midi);
  near.sort((a, b) => a - b);
  return near[Math.floor(near.length / 2)] ?? 0;
}

/**
 * Joins points into steady notes: a note goes on while its pitch stays within 0.7 semitones of its mean so far
 * (so vibrato stays one note) and no silence comes between.
 */
export function trailNotes(points: readonly TrailPoint[]): TrailNote[] {
  const notes: TrailNote[] = [];
  let run: TrailPoint[] = [];
  let sum = 0;
  const close = () => {
    const first = run[0];
    const last = run[run.length - 1];
    if (first && last && last.t - first.t >= shortestS) {
      const midi = sum / run.length;
      const line = Math.round(midi);
      notes.push({ start: first.t, end: last.t, line, midi, cents: (midi - line) * 100, points: run });
    }
    run = [];
    sum = 0;
  };
  points.forEach((point, index) => {
    const midi = medianOfFive(points, index);
    const last = run[run.length - 1];
    if (last && (point.t - last.t > gapS || Math.abs(midi - sum / run.length) > 0.7)) close();
    run.push({ t: point.t, midi });
    sum += midi;
  });
  close();
  return notes;
}

/** Lean of a bar in degrees: 0.4 for each cent, 14 at most; sharp leans up (negative on a screen). */
export function lean(cents: number): number {
  return -Math.max(-14, Math.min(14, cents * 0.4));
}

/** Strength of a bar's colour in per cent: 100 now, 76 at the far end. */
export function strength(t: number, now: number): number {
  const age = Math.max(0, Math.min(trailSeconds, now - t));
  return Math.round(100 - (24 * age) / trailSeconds);
}

/** The last part of a glide and of the notes in words: "E4, 12 cents sharp". */
export function offsetWords(cents: number): string {
  const whole = Math.round(Math.abs(cents));
  if (whole <= 8) return "on the line";
  return `${whole} cents ${cents > 0 ? "sharp" : "flat"}`;
}

/** Lines shown: round what was sung, an octave and a third at least, moving only when the singing nears an edge. */
export function trailScale(
  points: readonly TrailPoint[],
  before: { low: number; high: number } | null,
): { low: number; high: number } {
  const scale = before ?? { low: 57, high: 72 };
  if (points.length === 0) return scale;
  let low = Infinity;
  let high = -Infinity;
  for (const point of points) {
    low = Math.min(low, point.midi);
    high = Math.max(high, point.midi);
  }
  const span = Math.max(15, Math.ceil(high - low) + 4);
  if (before && low >= before.low + 0.5 && high <= before.high - 0.5 && before.high - before.low <= span + 6)
    return before;
  const middle = Math.round((low + high) / 2);
  return { low: middle - Math.ceil(span / 2), high: middle - Math.ceil(span / 2) + span };
}

/** Joins neighbouring notes by glides: from the end of one to the start of the next where no silence lies between. */
export function glides(notes: readonly TrailNote[]): { from: TrailNote; to: TrailNote }[] {
  return notes.flatMap((to, index) => {
    const from = notes[index - 1];
    return from && to.start - from.end < 0.25 ? [{ from, to }] : [];
  });
}

/** Where the trail is drawn: its size in px and the lines it shows. */
export interface TrailPlace {
  width: number;
  height: number;
  low: number;
  high: number;
}

/** Left of the first second, and right of now. */
const trailMargins = { left: 52, right: 44 } as const;

/** Px for one second. */
export function trailPace({ width }: Pick<TrailPlace, "width">): number {
  return (width - trailMargins.right - trailMargins.left) / trailSeconds;
}

/** The place of a moment so many seconds from now (negative: before). */
export function trailX(place: Pick<TrailPlace, "width">): (fromNow: number) => number {
  const pace = trailPace(place);
  return (fromNow) => place.width - trailMargins.right + fromNow * pace;
}

/** The height at which a pitch stands. */
export function trailY({ height, low, high }: TrailPlace, midi: number): number {
  return 8 + ((high - midi) * (height - 48)) / (high - low);
}
