import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { stringWords } from "@/features/instruments/myInstruments";
import { useInstrument, useInstrumentNames } from "@/features/instruments/useInstrument";
import { CompareScreen } from "@/features/keys/compare/CompareScreen";
import { askedPins, pinnedRows, usePins } from "@/features/keys/compare/pins";
import { useSongKeys } from "@/features/keys/useSongKeys";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { BestWay } from "@/features/ways/BestWay";
import { useFoundWays } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";

export default function CompareRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Keys side by side">
      {(song) => <Compare song={song} />}
    </SongState>
  );
}

function Compare({ song }: { song: Song }) {
  const { keys: asked } = useLocalSearchParams<{ keys?: string }>();
  const singer = useSingingVoice();
  const [wishes] = useWishes();
  const keys = useSongKeys(song, singer, useInstrumentNames());
  const { pins } = usePins(song.id);
  const { instrument, owned, choose } = useInstrument(song.id, keys.decision?.instrument ?? null);
  const rows = pinnedRows(keys.rows ?? [], asked === undefined ? pins : askedPins(asked));
  const found = useFoundWays(
    keys.written && { ...keys.written, instrument, wishes },
    rows.map((row) => row.key),
  );
  return (
    <CompareScreen
      song={song}
      keys={keys}
      pending={singer.isPending}
      voice={singer.voice}
      rows={rows}
      wayOf={(row) => <BestWay found={found[rows.indexOf(row)]} instrument={instrument} />}
      instrument={{
        id: instrument.id,
        strings: stringWords(instrument),
        chooser: <InstrumentSelect inline owned={owned} value={instrument.id} onChange={choose} />,
      }}
    />
  );
}
