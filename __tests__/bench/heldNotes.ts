import { median } from "../../shared/signal/median";
import type { ToolResult } from "./scoring";

const HELD_FRAMES = 24;
const WITHIN_SEMITONES = 0.6;
const SMOOTHED_FRAMES = 17;
const BRIDGED_FRAMES = 2;

/** Lowest and highest pitch of any voiced frame: what a simple tool would say. */
export function rangeByExtremes(f0: ToolResult["f0"]): ToolResult["range"] {
  return ends(midis(f0).filter((m) => m !== null));
}

/**
 * Lowest and highest note that was held: 240 ms within 60 cents of its middle, after a running median over 170 ms (about
 * one swing of a vibrato). The same simple rule for every plain tool.
 *
 * @param f0 frames 10 ms apart
 */
export function rangeByHeldNotes(f0: ToolResult["f0"]): ToolResult["range"] {
  const midi = smoothed(midis(f0));
  const centres: number[] = [];
  for (let from = 0; from < midi.length; from++) {
    let low = Infinity;
    let high = -Infinity;
    let gap = 0;
    const kept: number[] = [];
    for (let k = from; k < midi.length && gap <= BRIDGED_FRAMES; k++) {
      const m = midi[k]!;
      if (m === null) {
        gap++;
        continue;
      }
      gap = 0;
      low = Math.min(low, m);
      high = Math.max(high, m);
      if (high - low > 2 * WITHIN_SEMITONES) break;
      kept.push(m);
    }
    if (kept.length >= HELD_FRAMES) centres.push(median(kept));
  }
  return ends(centres);
}

function midis(f0: ToolResult["f0"]): (number | null)[] {
  return f0.map(({ hz }) => (hz !== null && hz > 0 ? 69 + 12 * Math.log2(hz / 440) : null));
}

function smoothed(midi: readonly (number | null)[]): (number | null)[] {
  const half = SMOOTHED_FRAMES >> 1;
  return midi.map((m, k) =>
    m === null ? null : median(midi.slice(Math.max(0, k - half), k + half + 1).filter((x) => x !== null)),
  );
}

function ends(values: readonly number[]): ToolResult["range"] {
  return values.length > 0 ? { lowMidi: Math.min(...values), highMidi: Math.max(...values) } : null;
}
