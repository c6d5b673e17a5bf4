/** How a song goes through its chords. */
export interface SongFlow {
  /** how often each chord is played, by its place in the list of chords */
  times: readonly number[];
  /** chord changes of the whole song, both ways counted together: `changes[a][b]` for chords a and b, `[b][a]` the same */
  changes: readonly (readonly number[])[];
  /** how many chords are played in all, >= 1 */
  played: number;
}

/**
 * Counts the chord changes of a song.
 *
 * @param chords the song's chords, each once
 * @param sequence its chords as played, with repeats; names that are not among the chords are passed over. Each chord
 *   once, in order, where it is not told
 * @returns counts; a chord that the sequence leaves out counts as played once
 */
export function songFlow(chords: readonly string[], sequence: readonly string[] = chords): SongFlow {
  const places = new Map(chords.map((text, k) => [text, k]));
  const times = chords.map(() => 0);
  const changes = chords.map(() => chords.map(() => 0));
  let last: number | undefined;
  for (const text of sequence) {
    const at = places.get(text);
    if (at === undefined) continue;
    times[at]!++;
    if (last !== undefined && last !== at) {
      changes[last]![at]!++;
      changes[at]![last]!++;
    }
    last = at;
  }
  const known = times.map((count) => Math.max(1, count));
  return {
    times: known,
    changes,
    played: Math.max(
      1,
      known.reduce((sum, count) => sum + count, 0),
    ),
  };
}
