import { keyFifths, spellTonic, tonicPitchClass, type Mode } from "../music/keyName";
import { pitchClass } from "../music/pitch";
import { type EffortEvidence, narrowedComfort } from "./keyEvidence";
import { keyParts, voiceEdges, type VoiceEdges } from "./keyParts";
import { keyReason } from "./keyReason";
import { compareTies, nearestMove } from "./keyTies";
import type { KeyMark, KeyScore, SingingVoice, Tune } from "./keyScore";
import { tunePitches, type TunePitch } from "./tunePicture";

/** What else is known besides tune and voice. */
export interface KeyOptions {
  /** decides how the tonics are spelled; default major */
  mode?: Mode;
  /** tonic the song stands in now, ASCII, for breaking ties; default the tune's home */
  presentKey?: string;
  /** takes rated afterwards; those felt as hard (4 or 5) narrow the comfort band */
  evidence?: readonly EffortEvidence[];
}

/** A voice may be written this many octaves away from where it sings. */
const octavesAway = 5;
/**
 * C1 to C7: what people sing, with an octave to spare. A tune of more than two octaves and a half lies in no voice, so
 * its octave is chosen within these; a narrower one stays there by itself.
 */
const singable = { low: 24, high: 96, widest: 30 };
/** A wider tune than this, in semitones, cannot be moved to every tonic between MIDI 0 and 127. */
const widestOfAll = 116;

/**
 * Judges all twelve keys for one voice, each in the octave where it sits best.
 *
 * A score is the sum of five parts in whole points. A key with a note outside the range keeps at most 36 points, any
 * other has at least 43, so it ranks under every key without.
 *
 * @param tune notes with durations in quarter notes, or the span alone (coarser, and says so)
 * @param voice range and comfort band, fractional MIDI numbers
 * @param options mode, present key, and takes rated by effort
 * @returns twelve keys, best first; ties by fewest accidentals, then by closeness to the present key
 * @throws RangeError if the tune is empty or spans more than 116 semitones, a band is upside down or a tonic is no note name
 * @see C. Herbst et al., Int. J. Research in Choral Singing 4(1), 2012: upper and lower reserve, tessitura shift (LR - UR)/2
 */
export function scoreKeys(tune: Tune, voice: SingingVoice, options: KeyOptions = {}): KeyScore[] {
  const mode = options.mode ?? "major";
  const home = tonicPitchClass(tune.home);
  const edges = narrowed(voiceEdges(voice), options.evidence ?? []);
  const pitches = tunePitches(tune);
  if (pitches[pitches.length - 1]!.midi - pitches[0]!.midi > widestOfAll)
    throw new RangeError("a tune spans at most 116 semitones");
  const coarse = tune.kind === "span";
  const keys = Array.from({ length: 12 }, (_, pc) => bestOctave(pitches, edges, home, pc, mode, coarse));
  const ties = compareTies(mode, options.presentKey ?? tune.home);
  return keys.sort((a, b) => Number(a.beyond) - Number(b.beyond) || b.score - a.score || ties(a, b));
}

function bestOctave(
  pitches: readonly TunePitch[],
  edges: VoiceEdges,
  home: number,
  tonicPc: number,
  mode: Mode,
  coarse: boolean,
): KeyScore {
  const near = nearestMove(home, tonicPc);
  const [lowest, highest] = [pitches[0]!.midi, pitches[pitches.length - 1]!.midi];
  const tooWide = highest - lowest > singable.widest;
  const past = (shift: number, low: number, high: number) =>
    Math.max(0, low - lowest - shift) + Math.max(0, highest + shift - high);
  // Below MIDI 0 and above 127 notes have no names, so that weighs most.
  const outside = (shift: number) =>
    1000 * past(shift, 0, 127) + (tooWide ? past(shift, singable.low, singable.high) : 0);
  const octaves = Array.from({ length: 2 * octavesAway + 1 }, (_, k) => k - octavesAway);
  const least = Math.min(...octaves.map((octave) => outside(near + 12 * octave)));
  const best = octaves
    .map((octave) => ({ octave, shift: near + 12 * octave }))
    .filter(({ shift }) => outside(shift) === least)
    .map(({ octave, shift }) => {
      const parts = keyParts(pitches, edges, shift);
      const score = parts.comfort + parts.roomAbove + parts.roomBelow + parts.longHigh + parts.lowCarry;
      return { octave, shift, parts, score, reserves: reserves(lowest + shift, highest + shift, edges) };
    })
    .reduce((a, b) => (compareOctaves(a, b) <= 0 ? a : b));
  const { octave, shift, parts, score } = best;
  const tonic = spellTonic(tonicPc, mode);
  const marks = pitches.map(({ midi: written, share }): KeyMark => {
    const midi = written + shift;
    return { midi, share, zone: zoneOf(midi, edges), home: pitchClass(midi) === tonicPc };
  });
  const beyond = marks.some(({ zone }) => zone === "beyond");
  const spelling = keyFifths({ tonic, mode }) < 0 ? "flats" : "sharps";
  return {
    tonic,
    octave,
    shift,
    lowMidi: lowest + shift,
    highMidi: highest + shift,
    score,
    parts,
    beyond,
    reserves: best.reserves,
    marks,
    reason: keyReason({ marks, parts, beyond, coarse, spelling }, edges),
    coarse,
  };
}

interface OctaveChoice {
  score: number;
  shift: number;
  reserves: KeyScore["reserves"];
}

/** Better score first, then the better centred, then the smaller move. */
function compareOctaves(a: OctaveChoice, b: OctaveChoice): number {
  return (
    b.score - a.score ||
    Math.abs(a.reserves.tessituraShift) - Math.abs(b.reserves.tessituraShift) ||
    Math.abs(a.shift) - Math.abs(b.shift) ||
    a.shift - b.shift
  );
}

function reserves(low: number, high: number, edges: VoiceEdges): KeyScore["reserves"] {
  const upper = edges.rangeHigh - high;
  const lower = low - edges.rangeLow;
  return { upper, lower, tessituraShift: (lower - upper) / 2 };
}

function zoneOf(midi: number, edges: VoiceEdges): KeyMark["zone"] {
  if (midi < edges.rangeLow || midi > edges.rangeHigh) return "beyond";
  return midi < edges.comfortLow || midi > edges.comfortHigh ? "reach" : "comfort";
}

/** Pulls the comfort band in, away from pitches that felt hard; narrowing a band never raises a score. */
function narrowed(edges: VoiceEdges, evidence: readonly EffortEvidence[]): VoiceEdges {
  const band = narrowedComfort({ lowMidi: edges.comfortLow, highMidi: edges.comfortHigh }, evidence);
  return { ...edges, comfortLow: band.lowMidi, comfortHigh: band.highMidi };
}
