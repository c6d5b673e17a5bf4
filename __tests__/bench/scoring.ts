import type { TakeReport } from "../../shared/voice/takeReport";
import type { ClipTruth } from "../sound/corpusLine";

/** What a tool says about a clip. */
export interface ToolResult {
  /** pitch track; a frame may stand anywhere, hz null where unvoiced */
  f0: { t: number; hz: number | null }[];
  /** lowest and highest note; null where it names none */
  range: { lowMidi: number; highMidi: number } | null;
  /** null for tools that judge nothing */
  verdict: "ok" | "too_little" | "no_singing" | null;
}

const FARTHEST_S = 0.03;
const SEMITONE_CENTS = 50;

/** What our own engine says, in the words of the corpus. */
export function resultOf({ f0, range, verdict }: TakeReport): ToolResult {
  return {
    f0: f0.map((hz, k) => ({ t: k / 100, hz })),
    range,
    verdict: verdict === "heard" ? "ok" : verdict === "too-short" ? "too_little" : "no_singing",
  };
}

/** Counts over the frames of a clip, after the MIREX melody measures. */
export interface FrameCounts {
  frames: number;
  voiced: number;
  unvoiced: number;
  /** within 50 cents; within 50 cents of an octave of the truth */
  pitch: number;
  chroma: number;
  hitVoiced: number;
  falseAlarm: number;
  /** whole octaves off, among frames voiced in both */
  octaveUp: number;
  octaveDown: number;
}

/** Frame counts of one clip; frames inside `truth.ignore` are left out, an estimate farther than 30 ms away counts as unvoiced. */
export function countFrames(truth: ClipTruth, f0: ToolResult["f0"]): FrameCounts {
  const counts: FrameCounts = {
    frames: 0,
    voiced: 0,
    unvoiced: 0,
    pitch: 0,
    chroma: 0,
    hitVoiced: 0,
    falseAlarm: 0,
    octaveUp: 0,
    octaveDown: 0,
  };
  const estimates = nearest(f0, truth.f0.length, truth.hopS);
  const skipped = skippedFrames(truth);
  truth.f0.forEach((hz, k) => {
    if (skipped[k]) return;
    const estimate = estimates[k] ?? null;
    counts.frames++;
    if (hz === null) {
      counts.unvoiced++;
      if (estimate !== null) counts.falseAlarm++;
      return;
    }
    counts.voiced++;
    if (estimate === null) return;
    counts.hitVoiced++;
    const cents = 1200 * Math.log2(estimate / hz);
    const octaves = Math.round(cents / 1200);
    const folded = Math.abs(cents - 1200 * octaves) <= SEMITONE_CENTS;
    if (folded) counts.chroma++;
    if (folded && octaves === 0) counts.pitch++;
    if (folded && octaves > 0) counts.octaveUp++;
    if (folded && octaves < 0) counts.octaveDown++;
  });
  return counts;
}

function nearest(f0: ToolResult["f0"], frames: number, hopS: number): (number | null)[] {
  const sorted = [...f0].sort((a, b) => a.t - b.t);
  let at = 0;
  return Array.from({ length: frames }, (_, k) => {
    const t = k * hopS;
    while (at + 1 < sorted.length && Math.abs(sorted[at + 1]!.t - t) <= Math.abs(sorted[at]!.t - t)) at++;
    const point = sorted[at];
    return point && Math.abs(point.t - t) <= FARTHEST_S && point.hz !== null && point.hz > 0 ? point.hz : null;
  });
}

function skippedFrames(truth: ClipTruth): Uint8Array {
  const out = new Uint8Array(truth.f0.length);
  for (const [from, to] of truth.ignore) {
    const last = Math.min(out.length - 1, Math.floor(to / truth.hopS + 1e-6));
    for (let k = Math.max(0, Math.ceil(from / truth.hopS - 1e-6)); k <= last; k++) out[k] = 1;
  }
  return out;
}

/** Signed errors of both ends in semitones; zero between the held extreme and that of notes of 0.15 to 0.24 s, which may count or not. */
export function rangeErrors(truth: ClipTruth, range: ToolResult["range"]): { low: number; high: number } | null {
  const { lowMidi, highMidi, looseLowMidi, looseHighMidi } = truth.expected;
  if (range === null || lowMidi === null || highMidi === null) return null;
  return {
    low: beyond(range.lowMidi, lowMidi, looseLowMidi ?? lowMidi),
    high: beyond(range.highMidi, highMidi, looseHighMidi ?? highMidi),
  };
}

function beyond(value: number, one: number, other: number): number {
  const [from, to] = [Math.min(one, other), Math.max(one, other)];
  return value < from ? value - from : Math.max(0, value - to);
}

/** @returns whether both ends are within a semitone; null where the clip has no range to find */
export function rangeRight(truth: ClipTruth, range: ToolResult["range"]): boolean | null {
  if (truth.expected.verdict !== "ok" || truth.expected.lowMidi === null) return null;
  const errors = rangeErrors(truth, range);
  return errors !== null && Math.abs(errors.low) <= 1 && Math.abs(errors.high) <= 1;
}

/** One clip together with what a tool said. */
export interface Scored {
  truth: ClipTruth;
  result: ToolResult;
}

/** Shares between 0 and 1; null where there was nothing to count. */
export interface Summary {
  clips: number;
  rpa: number | null;
  rca: number | null;
  voicingRecall: number | null;
  voicingFalseAlarm: number | null;
  octaveErrors: number | null;
  bothEnds: number | null;
  /** share of singing refused, of other clips accepted as singing */
  refused: number | null;
  accepted: number | null;
}

export function summarize(scored: readonly Scored[]): Summary {
  const counts = scored.map(({ truth, result }) => countFrames(truth, result.f0));
  const sum = (key: keyof FrameCounts): number => counts.reduce((total, c) => total + c[key], 0);
  const ranges = scored.flatMap(({ truth, result }) => rangeRight(truth, result.range) ?? []);
  const judged = scored.filter(({ result }) => result.verdict !== null);
  const singing = judged.filter(({ truth }) => truth.expected.verdict === "ok");
  const other = judged.filter(({ truth }) => truth.expected.verdict !== "ok");
  return {
    clips: scored.length,
    rpa: share(sum("pitch"), sum("voiced")),
    rca: share(sum("chroma"), sum("voiced")),
    voicingRecall: share(sum("hitVoiced"), sum("voiced")),
    voicingFalseAlarm: share(sum("falseAlarm"), sum("unvoiced")),
    octaveErrors: share(sum("octaveUp") + sum("octaveDown"), sum("hitVoiced")),
    bothEnds: share(ranges.filter(Boolean).length, ranges.length),
    refused: share(singing.filter(({ result }) => result.verdict !== "ok").length, singing.length),
    accepted: share(
      other.filter(({ truth, result }) => result.verdict === "ok" && !truth.expected.accept.includes("ok")).length,
      other.length,
    ),
  };
}

function share(part: number, whole: number): number | null {
  return whole > 0 ? part / whole : null;
}
