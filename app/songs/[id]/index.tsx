import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useState } from "react";
import { instrumentWords } from "@/features/instruments/myInstruments";
import { useInstrument, useInstrumentNames } from "@/features/instruments/useInstrument";
import { DecisionCard } from "@/features/keys/decision/DecisionCard";
import { TryLink } from "@/features/keys/tryout/TryLink";
import { KeyPane } from "@/features/keys/KeyPane";
import { MyKeyCard } from "@/features/keys/decision/MyKeyCard";
import { keyInView, useSongKeys } from "@/features/keys/useSongKeys";
import { TunePanel } from "@/features/songs/melody/TunePanel";
import { SongScreen } from "@/features/songs/SongScreen";
import { SongTools } from "@/features/songs/shelf/actions/SongTools";
import { SongState } from "@/features/songs/SongState";
import { songQueries, useRemoveSong } from "@/features/songs/songQueries";
import { useLayout } from "@/features/ui/useLayout";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { WayColumn } from "@/features/ways/WayColumn";
import { WayPane } from "@/features/ways/WayPane";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";

export default function SongRoute() {
  return (
    <SongState query={useQuery(songQueries.detail(useLocalSearchParams<{ id: string }>().id))} title="Song">
      {(song) => <SongPage key={song.id} song={song} />}
    </SongState>
  );
}

function SongPage({ song }: { song: Song }) {
  const [router, remove, singer] = [useRouter(), useRemoveSong(), useSingingVoice()];
  const [[wishes], [looked, setLooked]] = [useWishes(), useState<number | null>(null)];
  const keys = useSongKeys(song, singer, useInstrumentNames());
  const { instrument, settle } = useInstrument(song.id, keys.decision?.instrument ?? null);
  const { row, key, shift, decision } = keyInView(keys, looked);
  const shown = useLayout() === "wide" && keys.written;
  const search = useQuery(wayQueries.into(shown ? { ...shown, instrument, wishes } : null, key));
  return (
    <WayPane
      songId={song.id}
      into={key}
      named
      hasChords={keys.written !== null}
      search={search}
      instrument={instrument}
      kept={decision?.instrument === instrument.id ? decision.way : null}
      saving={keys.saving}
      onUse={(way) => key && keys.take({ tonic: key.tonic, shift, instrument: instrument.id, way }, settle)}
      most={3}
    >
      {({ list, use }) => (
        <SongScreen
          song={song}
          target={key && { key, shift, decided: decision !== null }}
          card={keys.inHand && <MyKeyCard songId={song.id} inHand={keys.inHand} voice={keys.voice} />}
          decided={<DecisionCard keys={keys} sheet={{ pathname: "/songs/[id]/sheet", params: { id: song.id } }} />}
          tune={<TunePanel song={song} voice={keys.voice} shift={shift} />}
          keys={<KeyPane song={song} keys={keys} singer={singer.voice} selected={row} onSelect={setLooked} />}
          ways={
            <WayColumn
              songId={song.id}
              into={key}
              shift={shift}
              instrument={instrumentWords(instrument)}
              error={keys.error}
            >
              {list}
            </WayColumn>
          }
          use={<TryLink songId={song.id} of={key} shift={shift} beside={use} />}
          shelfTools={<SongTools song={song} />}
          onRemove={() => remove.mutate(song.id, { onSuccess: () => router.replace("/songs") })}
          removal={remove}
        />
      )}
    </WayPane>
  );
}
