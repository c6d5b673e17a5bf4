import type { ReactNode } from "react";
import { ApiError } from "@/features/api/apiError";
import { useSession } from "@/features/api/SessionProvider";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState, type QueryLike } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Song } from "@/shared/contract/song";
import { SignedOutState } from "./SignedOut";

export interface SongStateProps {
  query: QueryLike<Song>;
  /** of the page while the song is not there */
  title: string;
  children: (song: Song) => ReactNode;
}

/** A page about one song: while it comes, when it cannot be had, and when it is not, or no longer, on this shelf. */
export function SongState({ query, title, children }: SongStateProps) {
  const { ended } = useSession();
  if (query.data !== undefined) return <>{children(query.data)}</>;
  const missing = query.error instanceof ApiError && query.error.status === 404;
  if (missing && ended)
    return (
      <Screen title={title} crumb={{ label: "Songs", href: "/songs" }} wide>
        <SignedOutState />
      </Screen>
    );
  return (
    <Screen title={missing ? "No such song" : title} crumb={{ label: "Songs", href: "/songs" }} wide>
      {missing ? (
        <EmptyState
          testID="no-such-song"
          title="This song is not on your shelf"
          text="It may have been deleted, or it belongs to somebody else. Nothing of yours was changed."
          action={<LinkButton href="/songs" label="To your songs" small />}
        />
      ) : (
        <QueryState
          query={query}
          title="The song could not be opened"
          skeleton={
            <Skeleton
              bars={[{ height: 72 }, { height: 44, width: 220 }, { width: "70%" }, { width: "82%" }, { width: "76%" }]}
              words="Opening the song"
            />
          }
        >
          {() => null}
        </QueryState>
      )}
    </Screen>
  );
}
