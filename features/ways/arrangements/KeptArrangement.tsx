import type { ReactNode } from "react";
import { useQuery } from "@tanstack/react-query";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import type { Arrangement } from "@/shared/contract/arrangement";
import type { Song } from "@/shared/contract/song";
import type { Instrument } from "@/shared/instruments/instrument";
import { keptEntry, type ArrangementEntry } from "./arrangementEntry";
import { arrangementQueries } from "./arrangementQueries";

export interface KeptArrangementProps {
  id: string;
  song: Song;
  sequence: readonly string[];
  instruments: readonly Instrument[];
  children: (entry: ArrangementEntry, kept: Arrangement) => ReactNode;
}

/** A kept arrangement: while it comes, where it is not or no longer among one's own, and when it is there. */
export function KeptArrangement({ id, song, sequence, instruments, children }: KeptArrangementProps) {
  const query = useQuery(arrangementQueries.ofSong(song.id));
  const kept = query.data?.find((each) => each.id === id);
  const entry = kept ? keptEntry(kept, song, sequence, instruments) : null;
  if (kept && entry) return <>{children(entry, kept)}</>;
  const list = { pathname: "/songs/[id]/arrangements", params: { id: song.id } } as const;
  return (
    <Screen
      title={kept ? kept.name : query.data ? "No such arrangement" : "Arrangement"}
      crumb={{ label: `${song.title} / Arrangements`, href: list }}
      wide
    >
      <QueryState query={query} title="The arrangement could not be opened">
        {() => (
          <EmptyState
            testID="no-such-arrangement"
            title={kept ? "Not on your instruments as they are now" : "This arrangement is not among yours"}
            text={
              kept
                ? "Its instrument is gone or has other strings. The shapes are kept, and come back with the instrument."
                : "It may have been deleted, or it belongs to somebody else. Nothing of yours was changed."
            }
            action={<LinkButton href={list} label="To the arrangements" small />}
          />
        )}
      </QueryState>
    </Screen>
  );
}
