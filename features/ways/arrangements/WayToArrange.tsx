import type { ReactNode } from "react";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState, type QueryLike } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Song } from "@/shared/contract/song";
import { askedWay, type WayAddress, type WayMoves } from "@/shared/ways/askedWay";
import type { Way } from "@/shared/ways/way";

export interface WayToArrangeProps {
  song: Song;
  /** of the page while the way is not there */
  title: string;
  hasChords: boolean;
  search: QueryLike<Way[]>;
  /** what the address says of the way */
  asked: WayAddress;
  /** the way of the decision, if it was made for this key and instrument */
  kept: WayMoves | null;
  children: (way: Way) => ReactNode;
}

/** The way that is arranged: while it is searched, where there is none, and when it is there. */
export function WayToArrange({ song, title, hasChords, search, asked, kept, children }: WayToArrangeProps) {
  const way = search.data ? askedWay(search.data, asked, kept) : null;
  if (way) return <>{children(way)}</>;
  return (
    <Screen
      title={title}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide
    >
      {!hasChords ? (
        <EmptyState
          title="No chords yet"
          text="Arrangements are made of the chords of the song. Paste its chart, and shapes for every chord stand here."
          action={
            <LinkButton
              href={{ pathname: "/songs/[id]/edit", params: { id: song.id } }}
              label="Give the chart"
              icon="edit"
              small
            />
          }
        />
      ) : (
        <QueryState
          query={search}
          title="The ways could not be found"
          skeleton={<Skeleton bars={[{ height: 220 }, { height: 220 }]} words="Looking for ways to play it" />}
        >
          {() => (
            <EmptyState
              title="No way on this instrument"
              text="None of the song's chords can be played on it in this key. Try another instrument or another key."
            />
          )}
        </QueryState>
      )}
    </Screen>
  );
}
