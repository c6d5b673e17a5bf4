import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useMemo } from "react";
import { SignedIn } from "@/features/account/SignedIn";
import { instrumentOf } from "@/features/instruments/myInstruments";
import { songPiece } from "@/features/keys/songKeys";
import { songQueries } from "@/features/songs/songQueries";
import { GroupKeyScreen } from "@/features/studio/key/GroupKeyScreen";
import { StudioPage } from "@/features/studio/StudioPage";
import { QueryState } from "@/features/ui/QueryState";
import { useWaysOfMany } from "@/features/ways/useWaysOfMany";
import type { Studio } from "@/shared/contract/studio/studio";

export default function KeyRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <StudioPage id={id} title="One key for all" page="key" door={SignedIn}>
      {(studio) => <GroupsKey studio={studio} />}
    </StudioPage>
  );
}

function GroupsKey({ studio }: { studio: Studio }) {
  const router = useRouter();
  const asked = useLocalSearchParams<{ song?: string; group?: string }>();
  const songs = useQuery(songQueries.all());
  const song = songs.data?.find(({ id }) => id === asked.song) ?? null;
  const piece = useMemo(() => song && songPiece(song), [song]);
  return (
    <QueryState query={songs} title="Your songs could not be listed">
      {(all) => (
        <GroupKeyScreen
          studio={studio}
          songs={all.filter(({ archivedAt }) => archivedAt === null)}
          songId={song?.id ?? null}
          onSong={(chosen) => router.setParams({ song: chosen })}
          piece={piece}
          groupId={asked.group === "" ? null : (asked.group ?? null)}
          onGroup={(group) => router.setParams({ group: group ?? "" })}
          useWays={useWaysOfMany}
          instrumentOf={instrumentOf}
        />
      )}
    </QueryState>
  );
}
