import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { stringWords } from "@/features/instruments/myInstruments";
import { useInstrument, useInstrumentNames } from "@/features/instruments/useInstrument";
import { KeysScreen } from "@/features/keys/KeysScreen";
import { useSongKeys } from "@/features/keys/useSongKeys";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useLayout } from "@/features/ui/useLayout";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { useFoundWays } from "@/features/ways/wayQueries";
import { wayInRow } from "@/features/ways/wayWords";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";

export default function KeysRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Keys for your voice">
      {(song) => <Keys song={song} />}
    </SongState>
  );
}

function Keys({ song }: { song: Song }) {
  const singer = useSingingVoice();
  const [wishes] = useWishes();
  const keys = useSongKeys(song, singer, useInstrumentNames());
  const { instrument, owned, choose } = useInstrument(song.id, keys.decision?.instrument ?? null);
  const wide = useLayout() === "wide";
  const rows = keys.rows ?? [];
  // Only the table shows a way in every row; the phone asks for the ways of one key, on their own page.
  const found = useFoundWays(
    wide && keys.written ? { ...keys.written, instrument, wishes } : null,
    rows.map((row) => row.key),
  );
  return (
    <KeysScreen
      song={song}
      keys={keys}
      pending={singer.isPending}
      voice={singer.voice}
      waysOf={(row) => {
        const ways = found[rows.indexOf(row)];
        return ways ? ways.map(wayInRow) : ways;
      }}
      instrument={{
        id: instrument.id,
        strings: stringWords(instrument),
        chooser: <InstrumentSelect inline owned={owned} value={instrument.id} onChange={choose} />,
      }}
    />
  );
}
