import { useQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { weighArrangement } from "@/shared/ways/arrangements/weighArrangement";
import type { Way } from "@/shared/ways/way";
import { patternFor, type ArrangedFor } from "./arrangementDraft";
import { proposedEntry, type ArrangementEntry } from "./arrangementEntry";
import { arrangementsPath, proposalPath } from "./arrangementPaths";
import { arrangementQueries } from "./arrangementQueries";

export interface ProposedArrangementProps {
  /** of a proposal, or "way" for the way's own shapes */
  id: string;
  on: Omit<ArrangedFor, "way"> & { way: Way };
  sequence: readonly string[];
  children: (entry: ArrangementEntry) => ReactNode;
}

/** An arrangement that is not kept yet. */
export function ProposedArrangement({ id, on, sequence, children }: ProposedArrangementProps) {
  const { song, instrument, way } = on;
  const own = id === "way";
  const question = { chords: way.chords, sequence, instrument, capo: way.capo };
  const query = useQuery(arrangementQueries.proposed(own ? null : question));
  const of = { ...on, songId: song.id, instrumentId: instrument.id };
  if (own) {
    const draft = { name: "My shapes", chords: way.chords, pattern: patternFor(song, null) };
    return children({ id, draft, on, weight: weighArrangement(question), kept: false, href: proposalPath(of, id) });
  }
  const proposal = query.data?.find((each) => each.id === id);
  if (proposal) return children(proposedEntry(proposal, on));
  const list = arrangementsPath(of);
  return (
    <Screen title="Arrangement" crumb={{ label: `${song.title} / Arrangements`, href: list }} wide>
      <QueryState
        query={query}
        title="The arrangement could not be worked out"
        skeleton={<Skeleton bars={[{ height: 140 }, { height: 220 }]} words="Working out arrangements" />}
      >
        {() => (
          <EmptyState
            title="It is not proposed any more"
            text="For these chords on this instrument other arrangements are proposed now. Nothing of yours was changed."
            action={<LinkButton href={list} label="To the arrangements" small />}
          />
        )}
      </QueryState>
    </Screen>
  );
}
