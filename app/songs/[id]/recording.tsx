import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useInstrument } from "@/features/instruments/useInstrument";
import { RecordingScreen } from "@/features/songs/recording/RecordingScreen";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { HummedNote } from "@/features/voice/line/HummedNote";
import { SungLine } from "@/features/voice/line/SungLine";
import type { Song } from "@/shared/contract/song";

export default function RecordingRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Chart and recording">
      {(song) => <Recording key={song.id} song={song} />}
    </SongState>
  );
}

function Recording({ song }: { song: Song }) {
  const { instrument } = useInstrument(song.id, null);
  return (
    <RecordingScreen
      song={song}
      capoTo={instrument.capoTo}
      hum={(way) => <HummedNote {...way} />}
      sing={(way) => <SungLine {...way} />}
    />
  );
}
