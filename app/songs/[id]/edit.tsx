import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { EditScreen } from "@/features/songs/editor/EditScreen";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";

export default function EditSongRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  const router = useRouter();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Edit the song">
      {(song) => (
        <EditScreen
          key={song.id}
          song={song}
          onSaved={() => router.replace({ pathname: "/songs/[id]", params: { id } })}
        />
      )}
    </SongState>
  );
}
