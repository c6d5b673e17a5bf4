import type { KeyParts, SingingVoice } from "./keyScore";
import { nearestSemitone } from "./nearestSemitone";
import type { TunePitch } from "./tunePicture";

/** Most points of each part; together 100. */
export const partMaxima: Readonly<KeyParts> = { comfort: 50, roomAbove: 15, roomBelow: 10, longHigh: 10, lowCarry: 15 };

/**
 * Points of each part that a key keeps merely by lying inside the range; the rest is earned. A key beyond the range
 * has only these to lose from, so it can never reach the score of a key without a note beyond.
 */
const sure: Readonly<KeyParts> = { comfort: 20, roomAbove: 6, roomBelow: 4, longHigh: 4, lowCarry: 6 };

/**
 * Room between the tune's ends and the ends of the range that is as good as any more, in semitones; reserves of 2 to 3
 * above and 1 to 2 below are the usual defaults.
 */
export const roomEnough = { above: 3, below: 2 } as const;

/** A voice with its edges on whole semitones, as they are named to people. */
export interface VoiceEdges {
  rangeLow: number;
  rangeHigh: number;
  comfortLow: number;
  comfortHigh: number;
  /** the ends of what was sung so far; those of the range where they were measured or given */
  heardLow: number;
  heardHigh: number;
}

/**
 * The edges of a voice on the semitones that a person reads, so that picture and score agree: a band from 54.6 to 70.3
 * is called G3 to Bb4 and judged as G3 to Bb4.
 *
 * @param voice range and comfort band, fractional MIDI numbers, comfort inside range
 * @returns whole MIDI numbers
 * @throws RangeError if an edge is missing, a band is upside down, or comfort leaves the range
 */
export function voiceEdges(voice: SingingVoice): VoiceEdges {
  const { range, comfort } = voice;
  const edges = [range.lowMidi, comfort.lowMidi, comfort.highMidi, range.highMidi];
  const inOrder = edges.every((edge, k) => Number.isFinite(edge) && (k === 0 || edges[k - 1]! <= edge));
  if (!inOrder) throw new RangeError("a voice needs a comfort band inside its range, both from low to high");
  const rangeLow = nearestSemitone(range.lowMidi);
  const rangeHigh = nearestSemitone(range.highMidi);
  const heard = voice.heard ?? range;
  return {
    rangeLow,
    comfortLow: nearestSemitone(comfort.lowMidi),
    comfortHigh: nearestSemitone(comfort.highMidi),
    rangeHigh,
    heardLow: Math.max(rangeLow, nearestSemitone(heard.lowMidi)),
    heardHigh: Math.min(rangeHigh, nearestSemitone(heard.highMidi)),
  };
}

/**
 * The five parts of a key's score, whole points. Strain above costs, part by part, at least what weakness the same
 * distance below costs; widening range or comfort band lowers no part.
 *
 * @param pitches the tune, low to high
 * @param edges the voice
 * @param shift semitones that the tune is moved by
 * @returns points; their sum is the score
 * @see common practice: penalise high notes by the time spent there, keep 2-3 semitones above and 1-2 below (defaults)
 */
export function keyParts(pitches: readonly TunePitch[], edges: VoiceEdges, shift = 0): KeyParts {
  let [outside, comfort, longHigh, lowCarry] = [0, 0, 0, 0];
  for (const pitch of pitches) {
    const midi = pitch.midi + shift;
    if (midi < edges.rangeLow || midi > edges.rangeHigh) outside += pitch.share;
    comfort += pitch.share * discomfort(midi, edges);
    longHigh += pitch.heldShare * ramp(midi - edges.comfortHigh + 3);
    lowCarry += pitch.share * ramp(edges.comfortLow + 3 - midi);
  }
  const above = edges.rangeHigh - (pitches[pitches.length - 1]!.midi + shift);
  const below = pitches[0]!.midi + shift - edges.rangeLow;
  const losses: KeyParts = {
    comfort: capped(comfort),
    roomAbove: capped((roomEnough.above - above) / roomEnough.above),
    roomBelow: capped((roomEnough.below - below) / roomEnough.below),
    longHigh: capped(12 * longHigh),
    // At most two thirds, so that in points it stays below what the same distance above costs.
    lowCarry: (2 / 3) * capped(4.5 * lowCarry),
  };
  const points = (part: keyof KeyParts) => {
    const base = sure[part];
    const earned = partMaxima[part] - base;
    if (outside > 0) return base - whole(base * lossBeyond(part, losses[part], Math.min(1, outside)));
    return base + earned - whole(earned * losses[part]);
  };
  return {
    comfort: points("comfort"),
    roomAbove: points("roomAbove"),
    roomBelow: points("roomBelow"),
    longHigh: points("longHigh"),
    lowCarry: points("lowCarry"),
  };
}

/**
 * Beyond the range every part shrinks by the time spent out there, so that the octave and the key that leave out least
 * come first; the room on that side is lost in full, and what remains inside tells keys apart that leave out alike.
 */
function lossBeyond(part: keyof KeyParts, loss: number, outside: number): number {
  if (part === "roomAbove" || part === "roomBelow") return Math.max(loss, outside);
  return part === "comfort" ? outside + (1 - outside) * 0.25 * loss : outside;
}

/** How far from sitting well a pitch is: 0 in the band, 2 and growing above it, less below. */
function discomfort(midi: number, edges: VoiceEdges): number {
  if (midi > edges.comfortHigh) return 1.6 + 0.4 * (midi - edges.comfortHigh);
  if (midi < edges.comfortLow) return 1.2 + 0.3 * (edges.comfortLow - midi);
  return 0;
}

/** 0 three semitones inside the edge, one half on it, 1 three semitones outside. */
function ramp(semitones: number): number {
  return capped(semitones / 6);
}

function capped(value: number): number {
  return Math.min(1, Math.max(0, value));
}

/** Rounds to whole points after dropping the last digits, in which two equal tunes may differ. */
function whole(points: number): number {
  return Math.round(Math.round(points * 1e9) / 1e9);
}
