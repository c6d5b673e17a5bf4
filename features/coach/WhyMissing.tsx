import { EmptyState } from "@/features/ui/EmptyState";
import { ErrorState } from "@/features/ui/ErrorState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";

export interface WhyMissingProps {
  song: { id: string; title: string };
  hasChords: boolean;
  /** the ways are being searched, could not be, or there is none */
  search: { isPending: boolean; error: Error | null; refetch: () => unknown };
}

/** The walk's page while there is nothing to explain: no chords, a search that runs or failed, no way at all. */
export function WhyMissing({ song, hasChords, search }: WhyMissingProps) {
  const params = { id: song.id };
  return (
    <Screen
      title="Why it sounds so"
      subtitle={song.title}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params } }}
      wide
    >
      {!hasChords ? (
        <EmptyState
          testID="why-needs-chords"
          title="No chords yet"
          text="The walk explains how this song's own chords move. Give its chart, and it begins here."
          action={
            <LinkButton href={{ pathname: "/songs/[id]/edit", params }} label="Give the chart" icon="edit" small />
          }
        />
      ) : search.error ? (
        <ErrorState
          title="The way could not be found"
          text="The search did not run. The song is safe; try again."
          onRetry={() => void search.refetch()}
        />
      ) : search.isPending ? (
        <Skeleton bars={[{ height: 28, width: "60%" }, { height: 180 }, { height: 72 }]} words="Looking for the way" />
      ) : (
        <EmptyState
          title="No way on this instrument"
          text="None of the song's chords can be played on it in this key. Try another instrument or another key."
          action={<LinkButton href={{ pathname: "/songs/[id]/ways", params }} label="To the ways" small />}
        />
      )}
    </Screen>
  );
}
