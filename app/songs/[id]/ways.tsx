import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { instrumentWords } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { DecidedLine } from "@/features/keys/DecidedLine";
import { askedKey, songChords, writtenKeyOf } from "@/features/keys/songKeys";
import { useSongKeys } from "@/features/keys/useSongKeys";
import { MovedChart } from "@/features/songs/MovedChart";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { WayPane } from "@/features/ways/WayPane";
import { wayQueries } from "@/features/ways/wayQueries";
import { WaysScreen } from "@/features/ways/WaysScreen";
import { useWishes } from "@/features/ways/wishes";
import type { Song } from "@/shared/contract/song";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export default function WaysRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Ways to play it">
      {(song) => <Ways song={song} />}
    </SongState>
  );
}

function Ways({ song }: { song: Song }) {
  const asked = useLocalSearchParams<{ key?: string; shift?: string }>();
  const { voice, singing } = useSingingVoice();
  const { instrument, owned, choose, error } = useInstrument();
  const [wishes] = useWishes();
  const keys = useSongKeys(song, singing);
  const chords = useMemo(() => songChords(song), [song]);
  const from = writtenKeyOf(song);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const search = useQuery(wayQueries.into(from && { chords, from, instrument, wishes }, key));
  const mine = keys.decision?.shift === shift ? keys.decision : null;
  const take = { tonic: key.tonic, shift, voiceId: voice?.id ?? null, instrument: instrument.id };
  return (
    <WayPane
      songId={song.id}
      into={key.tonic}
      hasChords={chords.length > 0 && from !== null}
      search={search}
      instrument={instrument}
      kept={mine?.instrument === instrument.id ? mine.way : null}
      saving={keys.saving}
      onUse={(way) => keys.take({ ...take, way })}
    >
      {(parts) => (
        <WaysScreen
          song={song}
          sign={glyphs(keySign(key))}
          instrument={instrumentWords(instrument)}
          chooser={<InstrumentSelect owned={owned} value={instrument.id} onChange={choose} />}
          {...parts}
          chart={<MovedChart song={song} to={key} level={3} />}
          error={keys.error ?? error}
          kept={mine && <DecidedLine decision={mine} saving={keys.saving} onUndo={keys.undo} />}
        />
      )}
    </WayPane>
  );
}
