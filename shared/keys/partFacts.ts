import { voiceEdges, partMaxima } from "./keyParts";
import type { KeyParts, KeyScore, SingingVoice, Tune } from "./keyScore";
import { nearestSemitone } from "./nearestSemitone";
import { passingUpTo, tunePitches } from "./tunePicture";

/** Points of a part, and of how many. */
interface PartPoints {
  points: number;
  of: number;
}

/** What each part of a key's score has measured. Shares are of the sung time, 0 to 1; distances whole semitones. */
export interface PartFacts {
  /** time in the band, over and under it (beyond the range included), and how far the ends leave it, 0 = not at all */
  comfort: PartPoints & { inside: number; over: number; under: number; furthestOver: number; furthestUnder: number };
  /** room to the top of the range; negative = past it */
  roomAbove: PartPoints & { semitones: number };
  /** room to the bottom of the range; negative = past it */
  roomBelow: PartPoints & { semitones: number };
  /** time from this pitch up, and how much of it in notes longer than a quarter; null where only the span is known */
  longHigh: PartPoints & { fromMidi: number; share: number; longShare: number | null };
  /** time from this pitch down */
  lowCarry: PartPoints & { toMidi: number; share: number };
}

/**
 * What stands behind the points of a key: the figures that a page can say beside them.
 *
 * @param tune the tune that was judged
 * @param voice the voice it was judged for
 * @param key one of the keys that `scoreKeys` gave for them
 * @returns points and measurements, part by part
 * @throws RangeError if tune or voice is refused by scoreKeys
 */
export function partFacts(tune: Tune, voice: SingingVoice, key: Pick<KeyScore, "shift" | "parts">): PartFacts {
  const edges = voiceEdges(voice);
  const pitches = tunePitches(tune).map(({ midi, share }) => ({ midi: midi + key.shift, share }));
  const [low, high] = [pitches[0]!.midi, pitches[pitches.length - 1]!.midi];
  const time = (within: (midi: number) => boolean) =>
    pitches.reduce((sum, { midi, share }) => (within(midi) ? sum + share : sum), 0);
  const of = (part: keyof KeyParts) => ({ points: key.parts[part], of: partMaxima[part] });
  const fromMidi = edges.comfortHigh - 2;
  const toMidi = edges.comfortLow + 2;
  const over = time((midi) => midi > edges.comfortHigh);
  const under = time((midi) => midi < edges.comfortLow);
  return {
    comfort: {
      ...of("comfort"),
      inside: time((midi) => midi >= edges.comfortLow && midi <= edges.comfortHigh),
      over,
      under,
      furthestOver: Math.max(0, high - edges.comfortHigh),
      furthestUnder: Math.max(0, edges.comfortLow - low),
    },
    roomAbove: { ...of("roomAbove"), semitones: edges.rangeHigh - high },
    roomBelow: { ...of("roomBelow"), semitones: low - edges.rangeLow },
    longHigh: {
      ...of("longHigh"),
      fromMidi,
      share: time((midi) => midi >= fromMidi),
      longShare: longShare(tune, fromMidi - key.shift),
    },
    lowCarry: { ...of("lowCarry"), toMidi, share: time((midi) => midi <= toMidi) },
  };
}

function longShare(tune: Tune, fromMidi: number): number | null {
  if (tune.kind === "span") return null;
  const total = (durations: number[]) => durations.sort((a, b) => a - b).reduce((sum, each) => sum + each, 0);
  const long = tune.notes.filter(({ midi, duration }) => nearestSemitone(midi) >= fromMidi && duration > passingUpTo);
  return total(long.map(({ duration }) => duration)) / total(tune.notes.map(({ duration }) => duration));
}
