import { glyphs, noteName } from "../music/pitch";
import type { PitchBand } from "../voice/takeReport";
import type { SingingVoice } from "./keyScore";
import { nearestSemitone } from "./nearestSemitone";
import type { PitchMeasure, TakeMeasures } from "./takeMeasures";

/** How one sung pitch felt to the singer afterwards. */
export interface EffortEvidence {
  midi: number;
  /** 1 (no effort) to 5 (very hard) */
  effort: number;
}

/** A key that was sung for real, as it is kept. */
export interface SungTry {
  /** 1 (no effort) to 5 (very hard); null where the singer did not say */
  effort: number | null;
  /** null where it could not be measured */
  measures: Pick<TakeMeasures, "pitches" | "ranOutOfLow"> | null;
  /** the tune's ends in that key, for takes without measures */
  span?: PitchBand;
}

/** A comfort band as tries have left it. */
export interface TriedVoice {
  voice: SingingVoice;
  /** plain sentences with glyphs, why an end has moved; empty where none has */
  why: readonly string[];
}

/** From this effort on a take was hard, up to that one it was easy. */
const hardFrom = 4;
const easyTo = 2;
/** A pitch counts as sung on from this time on, in seconds, as missed from that. */
const dweltFromS = 0.5;
const missedFromS = 0.3;
/** Further off than this, in cents, a pitch was not sung with ease. */
const easyCents = 60;
/** Tries widen an end by this many semitones at most, so that no lone take moves it far. */
const widestStep = 3;

interface Reason {
  midi: number;
  side: "above" | "below";
  kind: "missed" | "weak" | "hard" | "easy";
  effort: number;
}

/**
 * What tries say against pitches: those that were fallen short of or hardly heard, and the outermost pitch that a take
 * rated as hard dwelt on, at the end where it left the comfort band further.
 *
 * @param voice the voice before any of the tries
 * @param tries takes of that voice, in any order
 * @returns evidence for `scoreKeys`, lowest pitch first; more tries only ever add to it
 */
export function keyEvidence(voice: SingingVoice, tries: readonly SungTry[]): EffortEvidence[] {
  return tries
    .flatMap((each) => hardReasons(voice, each))
    .map(({ midi, effort }) => ({ midi, effort }))
    .sort((a, b) => a.midi - b.midi || a.effort - b.effort);
}

/**
 * The comfort band that tries lead to: wider where notes beyond it were sung with ease, narrower where notes were hard;
 * hard wins. It depends on the tries alone, so that taking one out restores exactly what was before it.
 *
 * @param voice the voice before any of the tries
 * @param tries takes of that voice, in any order
 * @returns the voice with its comfort band, inside its range, and why
 */
export function triedVoice(voice: SingingVoice, tries: readonly SungTry[]): TriedVoice {
  const { comfort, range } = voice;
  const easy = tries.flatMap((each) => easyReasons(voice, each));
  const high = Math.max(comfort.highMidi, ...easy.filter(({ side }) => side === "above").map(({ midi }) => midi));
  const low = Math.min(comfort.lowMidi, ...easy.filter(({ side }) => side === "below").map(({ midi }) => midi));
  const wide = {
    lowMidi: Math.max(range.lowMidi, comfort.lowMidi - widestStep, low),
    highMidi: Math.min(range.highMidi, comfort.highMidi + widestStep, high),
  };
  const hard = tries.flatMap((each) => hardReasons(voice, each));
  const now = narrowedComfort(wide, hard, comfort);
  if (now.lowMidi === comfort.lowMidi && now.highMidi === comfort.highMidi) return { voice, why: [] };
  return { voice: { ...voice, comfort: now }, why: reasonsWhy(comfort, now, hard, easy) };
}

/**
 * A comfort band pulled in from pitches that felt hard: it ends a semitone before them.
 *
 * @param band fractional MIDI numbers
 * @param evidence pitches with how they felt; those below 4 change nothing
 * @param judged the band whose middle tells high pitches from low ones; default the band itself
 * @returns the band, never wider; with both halves hard one note in the middle is left
 * @example narrowedComfort({ lowMidi: 50, highMidi: 62 }, [{ midi: 61, effort: 4 }]) // => { lowMidi: 50, highMidi: 60 }
 */
export function narrowedComfort(
  band: PitchBand,
  evidence: readonly EffortEvidence[],
  judged: PitchBand = band,
): PitchBand {
  const middle = (judged.lowMidi + judged.highMidi) / 2;
  const hard = evidence.filter(({ effort }) => effort >= hardFrom).map(({ midi }) => nearestSemitone(midi));
  // Where both halves meet: neither end passes it, so that more evidence only ever narrows the band.
  const meeting = Math.max(band.lowMidi, Math.floor(middle));
  const tops = hard.filter((midi) => midi > middle).map((midi) => Math.max(midi - 1, meeting));
  const bottoms = hard.filter((midi) => midi <= middle).map((midi) => Math.min(midi + 1, meeting));
  return { lowMidi: Math.max(band.lowMidi, ...bottoms), highMidi: Math.min(band.highMidi, ...tops) };
}

function hardReasons(voice: SingingVoice, { effort, measures, span }: SungTry): Reason[] {
  const middle = (voice.comfort.lowMidi + voice.comfort.highMidi) / 2;
  const pitches = measures?.pitches ?? [];
  const missed = pitches.flatMap((pitch): Reason[] => {
    const { midi, wantedS, fellShort } = pitch;
    if (fellShort === null || wantedS < missedFromS || midi > middle !== (fellShort === "above")) return [];
    // A note beyond it that was reached makes it a wrong note, not one out of reach.
    const reachedBeyond = pitches.some(
      (other) => isSungOn(other) && (fellShort === "above" ? other.midi > midi : other.midi < midi),
    );
    return reachedBeyond ? [] : [{ midi, side: fellShort, kind: "missed", effort: 5 }];
  });
  const low = measures?.ranOutOfLow ?? null;
  const weak: Reason[] = low && low.midi <= middle ? [{ midi: low.midi, side: "below", kind: "weak", effort: 5 }] : [];
  if (effort === null || effort < hardFrom) return [...missed, ...weak];
  const dwelt = pitches.filter((pitch) => pitch.sungS >= dweltFromS).map(({ midi }) => midi);
  const ends =
    dwelt.length > 0 ? dwelt : pitches.length > 0 ? pitches.map(({ midi }) => midi) : [span?.lowMidi, span?.highMidi];
  const known = ends.filter((midi) => midi !== undefined);
  if (known.length === 0) return [...missed, ...weak];
  const top = Math.max(...known);
  const bottom = Math.min(...known);
  const above = top - voice.comfort.highMidi >= voice.comfort.lowMidi - bottom;
  return [...missed, ...weak, { midi: above ? top : bottom, side: above ? "above" : "below", kind: "hard", effort }];
}

function easyReasons({ comfort }: SingingVoice, { effort, measures }: SungTry): Reason[] {
  if (effort === null || effort > easyTo || !measures) return [];
  const easy = measures.pitches.filter(isSungOn).map(({ midi }) => midi);
  const top = Math.max(...easy);
  const bottom = Math.min(...easy);
  return [
    ...(top > comfort.highMidi ? [{ midi: top, side: "above" as const, kind: "easy" as const, effort }] : []),
    ...(bottom < comfort.lowMidi && !measures.ranOutOfLow
      ? [{ midi: bottom, side: "below" as const, kind: "easy" as const, effort }]
      : []),
  ].filter(({ midi }) => Number.isFinite(midi));
}

function isSungOn({ sungS, offCents, fellShort }: PitchMeasure): boolean {
  return fellShort === null && sungS >= dweltFromS && offCents !== null && offCents <= easyCents;
}

function reasonsWhy(before: PitchBand, now: PitchBand, hard: readonly Reason[], easy: readonly Reason[]): string[] {
  const middle = (before.lowMidi + before.highMidi) / 2;
  const highs = hard.filter(({ midi }) => midi > middle).sort((a, b) => a.midi - b.midi);
  const lows = hard.filter(({ midi }) => midi <= middle).sort((a, b) => b.midi - a.midi);
  const easyAbove = easy.filter(({ side }) => side === "above").sort((a, b) => b.midi - a.midi);
  const easyBelow = easy.filter(({ side }) => side === "below").sort((a, b) => a.midi - b.midi);
  const sentence = (edge: number, was: number, where: "end" | "begin", reason: Reason | undefined) =>
    nearestSemitone(edge) === nearestSemitone(was) || !reason
      ? []
      : [`${because(reason)}, so your comfortable notes now ${where} at ${named(edge)}.`];
  return [
    ...sentence(now.highMidi, before.highMidi, "end", (now.highMidi > before.highMidi ? easyAbove : highs)[0]),
    ...sentence(now.lowMidi, before.lowMidi, "begin", (now.lowMidi < before.lowMidi ? easyBelow : lows)[0]),
  ];
}

function because({ midi, kind, side, effort }: Reason): string {
  const note = named(midi);
  if (kind === "easy") return `You sang ${side === "above" ? "up" : "down"} to ${note} with ease`;
  if (kind === "weak") return `At ${note} your voice ran out of low notes`;
  if (kind === "missed")
    return side === "above" ? `You fell short of ${note}` : `${note} came out too high, or not at all`;
  return `A take that dwelt on ${note} felt hard (${effort} of 5)`;
}

function named(midi: number): string {
  return glyphs(noteName(nearestSemitone(midi)));
}
