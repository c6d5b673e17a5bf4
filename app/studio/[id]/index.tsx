import { useLocalSearchParams, useRouter } from "expo-router";
import { useMemo } from "react";
import { SignedIn } from "@/features/account/SignedIn";
import { writtenKeyOf } from "@/features/keys/songKeys";
import { PupilStudio } from "@/features/studio/home/PupilStudio";
import { LatestSongKeys } from "@/features/studio/key/LatestSongKeys";
import { RosterActions } from "@/features/studio/roster/RosterActions";
import { RosterScreen } from "@/features/studio/roster/RosterScreen";
import { readRosterView, rosterParams, type RosterView } from "@/features/studio/roster/rosterView";
import { studioFacts, voicesTitle } from "@/features/studio/roster/rosterWords";
import { StudioPage, teaches } from "@/features/studio/StudioPage";
import { useLayout } from "@/features/ui/useLayout";

export default function RosterRoute() {
  const { id, ...params } = useLocalSearchParams<{ id: string } & Partial<Record<keyof RosterView, string>>>();
  const router = useRouter();
  const now = useMemo(() => new Date(), []);
  const wide = useLayout() === "wide";
  const view = readRosterView(params);
  return (
    <StudioPage
      id={id}
      door={SignedIn}
      title={(studio) => (!studio ? "Studio" : teaches(studio) ? voicesTitle(studio.counts?.pupils ?? 0) : studio.name)}
      crumb={(studio) => ({ label: studio && teaches(studio) ? `Studio / ${studio.name}` : "Studio", href: "/studio" })}
      subtitle={(studio) => (teaches(studio) ? studioFacts(studio, now) : undefined)}
      actions={(studio) => <RosterActions studio={studio} />}
      forPupils={(studio) => <PupilStudio studio={studio} now={now} />}
    >
      {(studio) => (
        <RosterScreen
          studio={studio}
          view={view}
          onView={(change) => router.setParams(rosterParams({ ...view, ...change }))}
          now={now}
        >
          {wide && <LatestSongKeys studioId={studio.id} writtenOf={writtenKeyOf} />}
        </RosterScreen>
      )}
    </StudioPage>
  );
}
