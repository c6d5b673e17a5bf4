import type { UseQueryResult } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { ApiError } from "@/features/api/apiError";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import type { SharedSheet } from "@/shared/contract/sheetLink";

export interface SharedStateProps {
  query: Pick<UseQueryResult<SharedSheet>, "data" | "isPending" | "error" | "refetch">;
  children: (shared: SharedSheet) => ReactNode;
}

const ended: Record<string, { title: string; text: string }> = {
  "link-revoked": {
    title: "This link has ended",
    text: "Whoever shared the sheet has ended the link. Ask them for a new one.",
  },
  "link-expired": {
    title: "This link has run out",
    text: "It was made for a while, and that is over. Ask whoever sent it for a new one.",
  },
  "not-found": {
    title: "This link leads nowhere",
    text: "Part of the address may be missing, or the song was deleted. Ask whoever sent it to send it again.",
  },
};

/** A shared sheet: while it comes, when it cannot be had, and when its link has ended. */
export function SharedState({ query, children }: SharedStateProps) {
  if (query.data !== undefined) return <>{children(query.data)}</>;
  const words = query.error instanceof ApiError && query.error.refused ? ended[query.error.code] : undefined;
  return (
    <Screen title={words?.title ?? "A shared sheet"} wide>
      {words ? (
        <EmptyState
          testID="link-ended"
          title={words.title}
          text={words.text}
          action={<LinkButton href="/" label="To the first page" kind="secondary" small />}
        />
      ) : (
        <QueryState
          query={query}
          title="The sheet could not be opened"
          skeleton={<Skeleton bars={[{ height: 44, width: 220 }, { height: 420 }]} words="Opening the sheet" />}
        >
          {() => null}
        </QueryState>
      )}
    </Screen>
  );
}
