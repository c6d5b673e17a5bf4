import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { useInstrument } from "@/features/instruments/useInstrument";
import { MelodyScreen } from "@/features/songs/melody/MelodyScreen";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { SungLine } from "@/features/voice/line/SungLine";
import { longestTuneS } from "@/features/voice/recorder/takeProtocol";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import type { Song } from "@/shared/contract/song";

export default function MelodyRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Melody">
      {(song) => <Melody key={song.id} song={song} />}
    </SongState>
  );
}

function Melody({ song }: { song: Song }) {
  const router = useRouter();
  const { instrument, owned, choose } = useInstrument(song.id, null);
  return (
    <MelodyScreen
      song={song}
      voice={useSingingVoice().forKeys}
      instrument={instrument}
      chooser={<InstrumentSelect owned={owned} value={instrument.id} onChange={choose} />}
      sing={(line) => <SungLine {...line} mostS={longestTuneS} />}
      onKept={() => router.replace({ pathname: "/songs/[id]", params: { id: song.id } })}
    />
  );
}
