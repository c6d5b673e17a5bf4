import type { SingingVoice } from "@/shared/keys/keyScore";
import { parseNoteName } from "@/shared/music/pitch";

/** A band that people sing in unison, women as written and men an octave lower. */
export interface UnisonBand {
  /** "C4–Eb5 within A3–F5" */
  name: string;
  source: string;
  voice: SingingVoice;
}

/** A low and a high note, and who says so. */
interface Said {
  edges: readonly [low: string, high: string];
  source: string;
}

/** Where tunes for unison singing are said to lie. Each is read as comfort: it is a wish, not the end of a voice. */
export const unisonReadings: readonly Said[] = [
  {
    edges: ["C4", "Eb5"],
    source: "where current Unitarian Universalist hymnals' tunes fall (danielharper.org, p=2655)",
  },
  { edges: ["C4", "C5"], source: "a pastor's rule for most people (spinditty.com)" },
  { edges: ["C4", "D5"], source: "D5 the general top (hymnologists, praytellblog.com, 2015), C as above" },
  { edges: ["C4", "E5"], source: "E5, the rare top (the same)" },
  { edges: ["C4", "F5"], source: "F5, the top of older practice (the same)" },
  { edges: ["Bb3", "D5"], source: "a typical editors' band (common practice)" },
  { edges: ["Bb3", "Eb5"], source: "a typical editors' band (common practice)" },
  { edges: ["B3", "D5"], source: "a typical editors' band (common practice)" },
  { edges: ["B3", "Eb5"], source: "a typical editors' band (common practice)" },
];

/** The middle voices of the published tables, women's as written and men's an octave up: the ends of the voices. */
export const middleRanges: readonly Said[] = [
  {
    edges: ["A3", "F5"],
    source: "mezzo-soprano, The New Harvard Dictionary of Music, 1986; also Grove's baritone, 8va",
  },
  { edges: ["A3", "F#5"], source: "mezzo-soprano, Grove Music Online" },
  { edges: ["G3", "E5"], source: "baritone an octave up, The New Harvard Dictionary of Music, 1986" },
];

/** The band of a reading in a range that holds it; null where it does not. */
export function unisonBand(reading: Said, range: Said): UnisonBand | null {
  const [comfortLow, comfortHigh, low, high] = [...reading.edges, ...range.edges].map((edge) => parseNoteName(edge)!);
  if (comfortLow! < low! || comfortHigh! > high!) return null;
  return {
    name: `${reading.edges.join("–")} within ${range.edges.join("–")}`,
    source: `comfort: ${reading.source}; range: ${range.source}`,
    voice: {
      range: { lowMidi: low!, highMidi: high! },
      comfort: { lowMidi: comfortLow!, highMidi: comfortHigh! },
    },
  };
}

/** The one that the bar is held against: present-day hymnals within the first of the middle voices. */
export const usualBand = unisonBand(unisonReadings[0]!, middleRanges[0]!)!;
