import { hzToMidi } from "@/shared/music/pitch";
import type { TakeMeasures } from "@/shared/keys/takeMeasures";
import type { MeasuredTry } from "../useTry";

/** A measured take, as it can be handed in to a teacher: all but its sound. */
export interface SungToHandIn {
  id: string;
  tonic: string;
  shift: number;
  effort: number | null;
  measures: TakeMeasures | null;
  /** sung pitch, thinned out to at most 4,000 points */
  trail: { t: number; midi: number }[];
  /** the tune where it was sung, in the singer's octave */
  tune: { t: number; durationS: number; midi: number }[];
}

const mostPoints = 4000;
const mostNotes = 2000;
/** frames of 10 ms; what is shorter is a click or a bump, and a picture would have to stretch to it */
const leastRun = 5;
/** semitones from one frame to the next */
const mostLeap = 7;
const round = (value: number) => Math.round(value * 100) / 100;

export function sungToHandIn(measured: MeasuredTry, effort: number | null): SungToHandIn {
  const { take, key, measures } = measured;
  return { id: take.id, ...key, effort, measures, trail: trailOf(take.report.f0), tune: tuneOf(measured) };
}

function trailOf(f0: readonly (number | null)[]): SungToHandIn["trail"] {
  const step = Math.max(1, Math.ceil(f0.length / mostPoints));
  const midis = f0.map((hz) => (hz === null ? null : hzToMidi(hz)));
  return runsOf(midis)
    .filter(({ from, to }) => to - from >= leastRun)
    .flatMap(({ from, to }) => range(from, to).filter((k) => k % step === 0))
    .map((k) => ({ t: k / 100, midi: round(midis[k]!) }));
}

/** Stretches of frames that one breath of voice can have sung: without silence and without leaps from frame to frame. */
function runsOf(midis: readonly (number | null)[]): { from: number; to: number }[] {
  const runs: { from: number; to: number }[] = [];
  midis.forEach((midi, k) => {
    const before = midis[k - 1] ?? null;
    if (midi === null) return;
    if (before !== null && Math.abs(midi - before) <= mostLeap) runs.at(-1)!.to = k + 1;
    else runs.push({ from: k, to: k + 1 });
  });
  return runs;
}

const range = (from: number, to: number) => Array.from({ length: to - from }, (_, k) => from + k);

/**
 * To the backing its notes keep their rhythm and are moved, all alike, to where the phrases were sung: how late sound comes
 * out of a device and back into it says nothing of the singer. Without a backing each phrase is laid where it was sung.
 */
function tuneOf({ plan, startS, measures }: MeasuredTry): SungToHandIn["tune"] {
  if (!plan || !measures) return [];
  const octaves = 12 * measures.octaves;
  const firsts = new Map<number, number>();
  const ends = new Map<number, number>();
  for (const { at, duration, phrase } of plan.notes) {
    if (!firsts.has(phrase)) firsts.set(phrase, at);
    ends.set(phrase, at + duration);
  }
  const sungAt = new Map(measures.phrases.map(({ phrase, start, end }) => [phrase, { start, end }]));
  const late = [...sungAt].flatMap(([phrase, { start }]) => {
    const first = firsts.get(phrase);
    return start === null || first === undefined || startS === null ? [] : [start - first - startS];
  });
  const delay = late.sort((a, b) => a - b)[late.length >> 1] ?? 0;
  const notes = plan.notes.flatMap(({ at, duration, midi, phrase }) => {
    const sung = { midi: midi + octaves };
    if (startS !== null) return [{ ...sung, t: at + startS + delay, durationS: duration }];
    const { start = null, end = null } = sungAt.get(phrase) ?? {};
    const first = firsts.get(phrase) ?? at;
    if (start === null || end === null) return [];
    const pace = (end - start) / Math.max(0.1, (ends.get(phrase) ?? at) - first);
    return [{ ...sung, t: start + (at - first) * pace, durationS: duration * pace }];
  });
  return notes
    .filter(({ t, midi }) => t >= 0 && midi >= 0 && midi <= 127)
    .slice(0, mostNotes)
    .map(({ t, durationS, midi }) => ({ t: round(t), durationS: round(durationS), midi }));
}
