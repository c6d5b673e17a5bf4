import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { HistoryScreen } from "@/features/songs/editor/history/HistoryScreen";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";

export default function HistoryRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Earlier versions">
      {(song) => <HistoryScreen key={song.id} song={song} />}
    </SongState>
  );
}
