/**
 * A tune or chord pattern whose key is common knowledge, written down from memory for these tests. All are traditional
 * or long in the public domain; `source` names an old publication that has it, or says that it is common practice.
 */
export interface KnownSong {
  name: string;
  source: string;
  /** such as "D", "Bm" or "E dorian" */
  key: string;
  /** the melody: metre, unit length, notes */
  abc?: { meter: string; unit: string; notes: string };
  /** the chords, a line a phrase */
  chords?: string;
}
