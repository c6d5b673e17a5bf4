import { useQueries } from "@tanstack/react-query";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import { type Playing, wayQueries } from "./wayQueries";
import { usualWishes, type Wishes } from "./wishes/wishes";

/** A song on one player's instrument. */
interface PlayersSong {
  piece: Pick<Playing, "chords"> & { sequence: readonly string[]; written: KeyName };
  instrument: Instrument;
  /** null: as usual */
  wishes: Wishes | null;
}

/** The ways of many players, each into a key of their own: undefined while they are searched, null where there is none. */
export function useWaysOfMany(
  wanted: readonly { playing: PlayersSong | null; to: KeyName }[],
): (readonly Way[] | null | undefined)[] {
  const results = useQueries({
    queries: wanted.map(({ playing, to }) => wayQueries.into(playing && playingOf(playing), to)),
  });
  return results.map(({ data, error }, k) => data ?? (wanted[k]?.playing && !error ? undefined : null));
}

function playingOf({ piece: { chords, sequence, written }, instrument, wishes }: PlayersSong): Playing {
  return { chords, sequence, from: written, instrument, wishes: wishes ?? usualWishes };
}
