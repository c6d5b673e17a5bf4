import { useQuery } from "@tanstack/react-query";
import type { Href } from "expo-router";
import { View } from "react-native";
import { EmptyState } from "@/features/ui/EmptyState";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { QueryState } from "@/features/ui/QueryState";
import { Skeleton } from "@/features/ui/Skeleton";
import { useLayout } from "@/features/ui/useLayout";
import type { Studio } from "@/shared/contract/studio/studio";
import { studioQueries } from "../studioQueries";
import { teaches } from "../StudioPage";
import { PartRows } from "./PartRows";
import { StudioCard } from "./StudioCard";

const places = [{ height: 26, width: 180 }, { height: 84 }, { height: 84 }] as const;

/** The studios that one teaches or is in, and what one was given there. */
export function StudioHome({ now }: { now: Date }) {
  return (
    <QueryState
      query={useQuery(studioQueries.list())}
      title="Your studios could not be opened"
      skeleton={<Skeleton bars={places} words="Fetching your studios" />}
    >
      {(studios) => (studios.length === 0 ? <NoStudio /> : <Studios studios={studios} now={now} />)}
    </QueryState>
  );
}

function NoStudio() {
  return (
    <EmptyState
      testID="no-studio"
      title="You are in no studio yet"
      text="A studio is a teacher’s group of pupils: songs in everybody’s own key, takes heard and answered. If you teach, begin one. If you learn, open the link in your teacher’s mail."
      action={<LinkButton label="Begin a studio" href={"/studio/new" as Href} testID="new-studio" />}
    />
  );
}

function Studios({ studios, now }: { studios: readonly Studio[]; now: Date }) {
  const wide = useLayout() === "wide";
  const taught = studios.filter(teaches);
  const joined = studios.filter((studio) => !teaches(studio));
  const column = wide ? ({ flexGrow: 1, flexBasis: 0, minWidth: 0, gap: 24 } as const) : ({ gap: 24 } as const);
  const list = (title: string, each: readonly Studio[]) =>
    each.length > 0 && (
      <View style={{ gap: 12 }}>
        <Heading level={2}>{title}</Heading>
        <View role="list" style={{ gap: 12 }}>
          {each.map((studio) => (
            <View role="listitem" key={studio.id}>
              <StudioCard studio={studio} now={now} />
            </View>
          ))}
        </View>
      </View>
    );
  return (
    <View style={{ flexDirection: wide && joined.length > 0 ? "row" : "column", gap: wide ? 32 : 24 }}>
      {joined.length > 0 && (
        <View style={column}>
          <GivenToMe now={now} />
        </View>
      )}
      <View style={wide && joined.length === 0 ? { ...column, maxWidth: 760 } : column}>
        {list("You teach", taught)}
        {list("You learn", joined)}
      </View>
    </View>
  );
}

/** What one was given, over all studios or in one of them. */
export function GivenToMe({ studioId, now }: { studioId?: string; now: Date }) {
  const query = useQuery(studioQueries.parts());
  return (
    <View style={{ gap: 12 }}>
      <Heading level={2}>Given to you</Heading>
      <QueryState query={query} title="Your songs could not be listed">
        {(parts) => (
          <PartRows
            parts={studioId === undefined ? parts : parts.filter(({ studio }) => studio.id === studioId)}
            now={now}
          />
        )}
      </QueryState>
    </View>
  );
}
