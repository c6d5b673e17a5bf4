import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { instrumentWords, offeredInstruments } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { BackingDesk } from "@/features/keys/backing/BackingDesk";
import { askedKey } from "@/features/keys/songKeys";
import { decidedHere, useSongKeys } from "@/features/keys/useSongKeys";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { ArrangementsScreen } from "@/features/ways/arrangements/ArrangementsScreen";
import type { ArrangementAddress } from "@/features/ways/arrangements/arrangementPaths";
import { WayToArrange } from "@/features/ways/arrangements/WayToArrange";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export default function ArrangementsRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Arrangements">
      {(song) => <Arrangements song={song} />}
    </SongState>
  );
}

function Arrangements({ song }: { song: Song }) {
  const asked = useLocalSearchParams() as ArrangementAddress;
  const [[wishes], singer] = [useWishes(), useSingingVoice()];
  const keys = useSongKeys(song, singer);
  const { instrument, owned } = useInstrument(song.id, asked.instrument ?? keys.decision?.instrument ?? null);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const search = useQuery(wayQueries.into(keys.written && { ...keys.written, instrument, wishes }, key));
  const mine = decidedHere(keys, shift);
  const instruments = useMemo(() => offeredInstruments(owned).map((each) => each.instrument), [owned]);
  return (
    <WayToArrange
      song={song}
      title="Arrangements"
      hasChords={keys.written !== null}
      search={search}
      asked={asked}
      kept={mine?.instrument === instrument.id ? mine.way : null}
    >
      {(way) => (
        <BackingDesk>
          {(desk) => (
            <ArrangementsScreen
              on={{ song, tonic: key.tonic, shift, instrument, way }}
              sequence={keys.written?.sequence ?? []}
              sign={glyphs(keySign(key))}
              instrumentWords={instrumentWords(instrument)}
              instruments={instruments}
              desk={desk}
            />
          )}
        </BackingDesk>
      )}
    </WayToArrange>
  );
}
