import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useState } from "react";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { instrumentWords } from "@/features/instruments/myInstruments";
import { useInstrument, useInstrumentNames } from "@/features/instruments/useInstrument";
import { DecisionCard } from "@/features/keys/decision/DecisionCard";
import { askedKey } from "@/features/keys/songKeys";
import { decidedHere, useSongKeys } from "@/features/keys/useSongKeys";
import { MovedChart } from "@/features/songs/MovedChart";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { whyPath } from "@/features/ui/whyPath";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { wayLinks } from "@/features/ways/arrangements/arrangementPaths";
import { WayPane } from "@/features/ways/WayPane";
import { wayQueries } from "@/features/ways/wayQueries";
import { ticksOn } from "@/features/ways/wishes/shapeTicks";
import { WaysScreen } from "@/features/ways/WaysScreen";
import { useWishes } from "@/features/ways/wishes/useWishes";
import { WishPanel } from "@/features/ways/wishes/WishPanel";
import type { Song } from "@/shared/contract/song";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import { wayAddress } from "@/shared/ways/askedWay";

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
  const [wishes, keepWishes, notKept] = useWishes();
  const [ticking, setTicking] = useState(false);
  const keys = useSongKeys(song, useSingingVoice(), useInstrumentNames());
  const { instrument, owned, choose, settle, error } = useInstrument(song.id, keys.decision?.instrument ?? null);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const search = useQuery(wayQueries.into(keys.written && { ...keys.written, instrument, wishes }, key));
  const mine = decidedHere(keys, shift);
  return (
    <WayPane
      songId={song.id}
      into={key}
      hasChords={keys.written !== null}
      search={search}
      instrument={instrument}
      kept={mine?.instrument === instrument.id ? mine.way : null}
      saving={keys.saving}
      full
      ticks={ticking ? ticksOn(instrument, wishes, keepWishes) : undefined}
      onUse={(way) => keys.take({ tonic: key.tonic, shift, instrument: instrument.id, way }, settle)}
      links={wayLinks({ songId: song.id, tonic: key.tonic, shift, instrumentId: instrument.id })}
      why={(way) => whyPath(song.id, key, shift, { instrument: instrument.id, way })}
      sheet={(way) => ({
        pathname: "/songs/[id]/sheet",
        params: { id: song.id, key: key.tonic, shift, instrument: instrument.id, ...wayAddress(way) },
      })}
    >
      {(parts) => (
        <WaysScreen
          song={song}
          sign={glyphs(keySign(key))}
          instrument={instrumentWords(instrument)}
          chooser={<InstrumentSelect owned={owned} value={instrument.id} onChange={choose} />}
          {...parts}
          chart={<MovedChart song={song} to={key} level={3} />}
          wishes={<WishPanel instrument={instrument} songId={song.id} open={ticking} onOpen={setTicking} />}
          error={keys.error ?? error ?? notKept}
          decided={<DecisionCard keys={keys} style={{ marginTop: 8 }} />}
        />
      )}
    </WayPane>
  );
}
