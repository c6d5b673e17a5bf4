import type { Song } from "@/shared/contract/song";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { KeyName } from "@/shared/music/keyName";
import type { PupilsQuestion } from "./judgePupils";

/** A song as it is given: what is judged and what is played. */
export interface Piece {
  song: Pick<Song, "id" | "title" | "tune">;
  written: KeyName;
  /** as written, each once */
  chords: readonly string[];
  /** the same as they are played */
  sequence: readonly string[];
}

/** What is asked of the engine about a song and those of a class whose voice is known; null without a tune. */
export function questionOf(
  { song, written }: Pick<Piece, "song" | "written">,
  pupils: readonly Pick<RosterRow, "memberId" | "name" | "voice">[],
): PupilsQuestion | null {
  if (!song.tune) return null;
  return {
    tune: song.tune,
    written,
    voices: pupils.flatMap(({ memberId, name, voice }) =>
      voice ? [{ memberId, name, voice: { range: voice.range, comfort: voice.comfort } }] : [],
    ),
  };
}
