import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import type { ComponentType, ReactNode } from "react";
import { useSession } from "@/features/api/SessionProvider";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Screen, type ScreenProps } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Studio } from "@/shared/contract/studio/studio";
import { studioQueries } from "./studioQueries";

/**
 * What stands before a page: it shows the inside to whoever is signed in, and asks others to, who come back to `here`.
 * The route brings it.
 */
export type Door = ComponentType<{ here: string; wide: boolean; children: () => ReactNode }>;

export interface StudioPageProps {
  id: string;
  /** which page of the studio, as its address says; "" for the first */
  page?: string;
  door: Door;
  /** before the studio is here, and with it */
  title: string | ((studio: Studio | null) => string);
  subtitle?: (studio: Studio) => ReactNode;
  /** where the page stands; the studio itself unless told otherwise */
  crumb?: (studio: Studio | null) => ScreenProps["crumb"];
  actions?: (studio: Studio) => ReactNode;
  /** in the place of the page for those who do not teach there */
  forPupils?: (studio: Studio) => ReactNode;
  children: (studio: Studio) => ReactNode;
}

/** Whoever teaches in a studio. */
export const teaches = ({ me }: Pick<Studio, "me">): boolean => me.role !== "pupil";

const inStudio = (studio: Studio | null, id: string): ScreenProps["crumb"] => ({
  label: studio ? `Studio / ${studio.name}` : "Studio",
  href: `/studio/${id}` as Href,
});

/** A page of one studio: asks for it, and says what there is to say while it is not here. */
export function StudioPage({
  id,
  page = "",
  door: Door,
  title,
  subtitle,
  crumb,
  actions,
  forPupils,
  children,
}: StudioPageProps) {
  const signedIn = useSession().status === "signed-in";
  const query = useQuery({ ...studioQueries.detail(id), enabled: signedIn });
  const studio = query.data ?? null;
  const mine = studio !== null && teaches(studio) ? studio : null;
  const named = typeof title === "string" ? title : title(studio);
  return (
    <Screen
      title={named}
      crumb={crumb ? crumb(studio) : inStudio(studio, id)}
      subtitle={studio === null ? undefined : subtitle?.(studio)}
      actions={mine && actions?.(mine)}
      wide
    >
      <Door here={`/studio/${id}${page === "" ? "" : `/${page}`}`} wide>
        {() => (
          <QueryState
            query={query}
            title="The studio could not be opened"
            skeleton={<Skeleton words="Fetching the studio" />}
          >
            {(found) => (teaches(found) ? children(found) : (forPupils?.(found) ?? <TeachersOnly id={found.id} />))}
          </QueryState>
        )}
      </Door>
    </Screen>
  );
}

function TeachersOnly({ id }: { id: string }) {
  return (
    <EmptyState
      testID="teachers-only"
      title="This page is for the teachers"
      text="You are in this studio as a pupil. What your teachers gave you stands on the studio’s own page."
      action={<LinkButton label="To the studio" href={`/studio/${id}` as Href} />}
    />
  );
}
