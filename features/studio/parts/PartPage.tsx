import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import type { ReactNode } from "react";
import { ApiError } from "@/features/api/apiError";
import { useSession } from "@/features/api/SessionProvider";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Part } from "@/shared/contract/studio/assignment";
import { partDue, stateWords } from "../partWords";
import { studioQueries } from "../studioQueries";
import type { Door } from "../StudioPage";

export interface PartPageProps {
  id: string;
  door: Door;
  now: Date;
  children: (part: Part) => ReactNode;
}

function crumbOf(part: Part | undefined): { label: string; href: Href } {
  if (!part) return { label: "Studio", href: "/studio" as Href };
  if (part.side === "pupil")
    return { label: `Studio / ${part.studio.name}`, href: `/studio/${part.studio.id}` as Href };
  return {
    label: `Studio / ${part.studio.name} / ${part.title}`,
    href: `/studio/${part.studio.id}/assignments/${part.assignmentId}` as Href,
  };
}

/** The page of one part: for its pupil, and for the teachers. */
export function PartPage({ id, door: Door, now, children }: PartPageProps) {
  const signedIn = useSession().status === "signed-in";
  const query = useQuery({ ...studioQueries.part(id), enabled: signedIn });
  const part = query.data;
  const gone = query.error instanceof ApiError && query.error.status === 404;
  const title = !part ? "A song you were given" : part.side === "pupil" ? part.title : `${part.pupil}: ${part.title}`;
  const facts = part && [stateWords[part.side][part.state], partDue(part.state, part.dueOn, now)];
  return (
    <Screen title={title} wide crumb={crumbOf(part)} subtitle={facts?.filter(Boolean).join(" · ")}>
      <Door here={`/studio/parts/${id}`} wide>
        {() =>
          gone ? (
            <EmptyState
              testID="no-such-part"
              title="This is not here"
              text="It was taken back, or it belongs to another account. Nothing of yours was changed."
              action={<LinkButton label="To the studio" href={"/studio" as Href} />}
            />
          ) : (
            <QueryState
              query={query}
              title="The song could not be opened"
              skeleton={<Skeleton words="Opening the song" />}
            >
              {children}
            </QueryState>
          )
        }
      </Door>
    </Screen>
  );
}
