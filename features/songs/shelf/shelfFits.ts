import type { SongListing } from "@/shared/contract/songListing";
import type { Song } from "@/shared/contract/song";
import { scoreKeys } from "@/shared/keys/scoreKeys";
import type { SingingVoice, Tune } from "@/shared/keys/keyScore";

/** Scores that were worked out, by voice, song and revision. */
const known = new Map<string, number>();
const mostKnown = 20_000;

function voiceName({ range, comfort }: SingingVoice): string {
  return [range.lowMidi, range.highMidi, comfort.lowMidi, comfort.highMidi].join(" ");
}

const noteName = (song: Pick<Song, "id" | "revision">, voice: SingingVoice) =>
  `${voiceName(voice)} ${song.id} ${song.revision}`;

function best(tune: Tune, voice: SingingVoice, key: string): number {
  const before = known.get(key);
  if (before !== undefined) return before;
  if (known.size >= mostKnown) known.clear();
  const score = Math.round(scoreKeys(tune, voice)[0]?.score ?? 0);
  known.set(key, score);
  return score;
}

/** How well a song can sit: the score of its best key, 0 to 100; by its notes where they were read, else by its span. */
export function fitOf(song: SongListing, voice: SingingVoice): number | null {
  if (!song.span) return null;
  const byNotes = known.get(noteName(song, voice));
  if (byNotes !== undefined) return byNotes;
  const { lowMidi, highMidi } = song.span;
  // Any key may be chosen, so a span is judged by its width alone.
  const width = Math.round(highMidi) - Math.round(lowMidi);
  return best({ kind: "span", ...song.span }, voice, `${voiceName(voice)} width ${width}`);
}

/** Milliseconds of work before the page gets its turn again. */
const slice = 12;

/**
 * Judges songs by their notes, a few at a time, so that typing and scrolling never wait.
 *
 * @returns whether it came to the end; false when it was ended
 */
export async function judgeByNotes(songs: readonly Song[], voice: SingingVoice, signal: AbortSignal): Promise<boolean> {
  let began = performance.now();
  for (const song of songs) {
    if (signal.aborted) return false;
    if (song.tune) best(song.tune, voice, noteName(song, voice));
    if (performance.now() - began < slice) continue;
    await new Promise((resolve) => setTimeout(resolve, 0));
    began = performance.now();
  }
  return !signal.aborted;
}
