import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { TogetherScreen } from "@/features/keys/together/TogetherScreen";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { readByHand } from "@/features/voice/byHand/byHand";
import { keyVoiceOf } from "@/shared/keys/singingVoiceOf";
import { voiceQueries } from "@/features/voice/voiceQueries";
import type { Song } from "@/shared/contract/song";

export default function TogetherRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Sing together">
      {(song) => <Together key={song.id} song={song} />}
    </SongState>
  );
}

function Together({ song }: { song: Song }) {
  const voices = useQuery(voiceQueries.list());
  const takes = useQuery(voiceQueries.takes());
  const own = useMemo(
    () =>
      (voices.data ?? []).map((voice) => ({
        id: voice.id,
        name: voice.name,
        singing: takes.data ? keyVoiceOf(voice, takes.data) : null,
      })),
    [voices.data, takes.data],
  );
  return (
    <TogetherScreen
      song={song}
      own={own}
      pending={voices.isPending || takes.isPending}
      error={voices.error ?? takes.error}
      onRetry={() => {
        void voices.refetch();
        void takes.refetch();
      }}
      readNotes={readByHand}
    />
  );
}
