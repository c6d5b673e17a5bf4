import type { SingingVoice } from "@/shared/keys/keyScore";
import type { Scale } from "./ladderGeometry";

/** Width of a row, half a semitone of air at both ends. */
export function keySpanWidth(scale: Scale, perSemitone: number): number {
  return Math.max(0, (scale.high - scale.low + 2) * perSemitone);
}

/** Horizontal place of a pitch; one scale for all rows. */
export function keySpanX(midi: number, scale: Scale, perSemitone: number): number {
  return (midi - scale.low + 1) * perSemitone;
}

/** Where the bands end: half a semitone outside their outer notes. */
export function edges(voice: SingingVoice, scale: Scale, perSemitone: number) {
  const x = (midi: number) => keySpanX(midi, scale, perSemitone);
  const half = perSemitone / 2;
  return {
    left: x(voice.range.lowMidi) - half,
    right: x(voice.range.highMidi) + half,
    softLeft: x(voice.comfort.lowMidi) - half,
    softRight: x(voice.comfort.highMidi) + half,
  };
}

/** Height of a mark: the longest note stands `tallest` high, none under 8. */
export function markHeight(share: number, longest: number, tallest: number): number {
  return Math.max(8, 4 + ((tallest - 4) * share) / longest);
}

/** Pitch of the hatch and lengths of the dashes that repeat wholly within a row, so that rows join without a seam. */
export function seamless(height: number, pitch: number): { pitch: number; dash: string } {
  const lines = Math.max(1, Math.round(height / (pitch * Math.SQRT2)));
  const period = height / Math.max(1, Math.round(height / 8));
  return { pitch: height / lines / Math.SQRT2, dash: `${(period * 5) / 8} ${(period * 3) / 8}` };
}

/** Whether a natural gets its name over the rows: all of them where there is room, then C and G, C alone, every second C. */
export function isNamed(midi: number, perSemitone: number): boolean {
  const pc = ((midi % 12) + 12) % 12;
  if (perSemitone >= 9) return true;
  if (perSemitone >= 4.5) return pc === 0 || pc === 7;
  if (perSemitone >= 2) return pc === 0;
  return midi % 24 === 0;
}
