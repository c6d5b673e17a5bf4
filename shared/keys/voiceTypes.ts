import { parseNoteName } from "../music/pitch";
import type { SingingVoice } from "./keyScore";

/** A voice nobody has sung for: what books say of a kind of voice, or the band that a group is given. */
export interface VoiceType {
  id: string;
  /** as it is said to people */
  name: string;
  kind: "voice" | "group";
  voice: SingingVoice;
  /** where the band comes from */
  source: string;
}

const dictionary =
  "range: D. M. Randel (ed.), The New Harvard Dictionary of Music, 1986; comfort 2 semitones inside its top, 1 inside its bottom (default)";
const congregation =
  "range: editors' band for unison singing (common practice); comfort: C to D, since hymnologists give D as the usual top and leaders C as the usual bottom";
const young =
  "range: an octave in the second year of school, a note more each year (a school guideline for K-6, Kenai Peninsula, Alaska); comfort: the sixth D to B that the youngest sing";

/**
 * Plain voices to sing together with, where somebody has no voice of their own here yet: six single voices, high to
 * low, and three groups that sing one line. Never a name for a person: they are bands, not verdicts.
 *
 * @see D. M. Randel (ed.), The New Harvard Dictionary of Music, Harvard University Press 1986 (ranges of single voices)
 */
export const voiceTypes: readonly VoiceType[] = [
  single("soprano", "Soprano", "C4", "A5"),
  single("mezzo", "Mezzo-soprano", "A3", "F5"),
  single("alto", "Alto", "F3", "D5"),
  single("tenor", "Tenor", "B2", "G4"),
  single("baritone", "Baritone", "G2", "E4"),
  single("bass", "Bass", "E2", "C4"),
  group("women", "Women in unison", ["Bb3", "C4", "D5", "Eb5"], congregation),
  group("men", "Men in unison", ["Bb2", "C3", "D4", "Eb4"], `${congregation}; an octave lower`),
  group("children", "Children in unison", ["C4", "D4", "B4", "D5"], young),
];

function single(id: string, name: string, low: string, high: string): VoiceType {
  const range = { lowMidi: parseNoteName(low)!, highMidi: parseNoteName(high)! };
  const comfort = { lowMidi: range.lowMidi + 1, highMidi: range.highMidi - 2 };
  return { id, name, kind: "voice", voice: { range, comfort }, source: dictionary };
}

function group(id: string, name: string, edges: readonly [string, string, string, string], source: string): VoiceType {
  const [rangeLow, comfortLow, comfortHigh, rangeHigh] = edges.map((edge) => parseNoteName(edge)!) as [
    number,
    number,
    number,
    number,
  ];
  const voice = {
    range: { lowMidi: rangeLow, highMidi: rangeHigh },
    comfort: { lowMidi: comfortLow, highMidi: comfortHigh },
  };
  return { id, name, kind: "group", voice, source };
}
