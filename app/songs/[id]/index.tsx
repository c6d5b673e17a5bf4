import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useMemo, useState } from "react";
import { instrumentWords } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { DecidedLine } from "@/features/keys/DecidedLine";
import { KeyPane } from "@/features/keys/KeyPane";
import { MyKeyCard } from "@/features/keys/MyKeyCard";
import { songChords, writtenKeyOf } from "@/features/keys/songKeys";
import { useSongKeys } from "@/features/keys/useSongKeys";
import { SongScreen } from "@/features/songs/SongScreen";
import { SongState } from "@/features/songs/SongState";
import { songQueries, useRemoveSong } from "@/features/songs/songQueries";
import { useLayout } from "@/features/ui/useLayout";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { WayColumn } from "@/features/ways/WayColumn";
import { WayPane } from "@/features/ways/WayPane";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes";
import type { Song } from "@/shared/contract/song";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export default function SongRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Song">
      {(song) => <SongPage key={song.id} song={song} />}
    </SongState>
  );
}

function SongPage({ song }: { song: Song }) {
  const router = useRouter();
  const remove = useRemoveSong();
  const { voice, singing } = useSingingVoice();
  const { instrument } = useInstrument();
  const [wishes] = useWishes();
  const wide = useLayout() === "wide";
  const keys = useSongKeys(song, singing);
  const [looked, setLooked] = useState<number | null>(null);
  const row = keys.rows?.find((each) => each.shift === looked) ?? keys.inHand?.row ?? null;
  const key = row?.key ?? keys.inHand?.key ?? null;
  const shift = row?.shift ?? keys.inHand?.shift ?? 0;
  const mine = keys.decision?.shift === shift ? keys.decision : null;
  const chords = useMemo(() => songChords(song), [song]);
  const from = writtenKeyOf(song);
  const search = useQuery(wayQueries.into(wide && from ? { chords, from, instrument, wishes } : null, key));
  const take = key && { tonic: key.tonic, shift, voiceId: voice?.id ?? null, instrument: instrument.id };
  return (
    <WayPane
      songId={song.id}
      into={key?.tonic ?? ""}
      hasChords={chords.length > 0 && from !== null}
      search={search}
      instrument={instrument}
      kept={mine?.instrument === instrument.id ? mine.way : null}
      saving={keys.saving}
      onUse={(way) => take && keys.take({ ...take, way })}
      sign={key ? glyphs(keySign(key)) : undefined}
      most={3}
    >
      {({ list, use }) => (
        <SongScreen
          song={song}
          target={key && { key, shift, decided: mine !== null }}
          card={keys.inHand && <MyKeyCard songId={song.id} inHand={keys.inHand} voice={keys.voice} />}
          decided={keys.decision && <DecidedLine decision={keys.decision} saving={keys.saving} onUndo={keys.undo} />}
          keys={<KeyPane songId={song.id} hasTune={song.tune !== null} keys={keys} voiceName={voice?.name ?? null} selected={row} onSelect={(chosen) => setLooked(chosen.shift)} />}
          ways={<WayColumn songId={song.id} target={key && { sign: glyphs(keySign(key)), tonic: key.tonic, shift }} instrument={instrumentWords(instrument)} list={list} error={keys.error} />}
          use={use}
          onRemove={() => remove.mutate(song.id, { onSuccess: () => router.replace("/songs") })}
          removal={remove}
        />
      )}
    </WayPane>
  );
}
