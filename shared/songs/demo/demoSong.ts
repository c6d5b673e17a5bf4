import type { KeyName } from "../../music/keyName";
import type { MelodyNote } from "../melody";

/** A song made up for the demonstration: words, chords and tune are the project's own. */
export interface DemoSong {
  id: string;
  title: string;
  /** chords over words */
  chart: string;
  /** how the chart stood before, the oldest first, and for how many days each */
  earlier?: readonly { chart: string; days: number }[];
  writtenKey: KeyName;
  /** the tune of a verse and the chorus with their words, ABC notation */
  abc: string;
  /** the same notes, for those who have no need of an ABC reader; times in quarter notes */
  notes: readonly MelodyNote[];
  /** upper figure of the metre */
  beatsPerBar: number;
  /** quarter notes in a bar */
  barLength: number;
  /** quarter notes a minute */
  tempo: number;
}
