import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { instrumentWords, offeredInstruments } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { BackingDesk } from "@/features/keys/backing/BackingDesk";
import { askedKey } from "@/features/keys/songKeys";
import { decidedHere, useSongKeys } from "@/features/keys/useSongKeys";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { ArrangementEditor } from "@/features/ways/arrangements/ArrangementEditor";
import type { ArrangementEntry } from "@/features/ways/arrangements/arrangementEntry";
import { type ArrangementAddress, isKeptId } from "@/features/ways/arrangements/arrangementPaths";
import { KeptArrangement } from "@/features/ways/arrangements/KeptArrangement";
import { ProposedArrangement } from "@/features/ways/arrangements/ProposedArrangement";
import { WayToArrange } from "@/features/ways/arrangements/WayToArrange";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Arrangement } from "@/shared/contract/arrangement";
import type { Song } from "@/shared/contract/song";

export default function ArrangementRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Arrangement">
      {(song) => <OneArrangement song={song} />}
    </SongState>
  );
}

function OneArrangement({ song }: { song: Song }) {
  const asked = useLocalSearchParams() as ArrangementAddress;
  const { arrangementId } = useLocalSearchParams<{ arrangementId: string }>();
  const [router, [wishes], singer] = [useRouter(), useWishes(), useSingingVoice()];
  const keys = useSongKeys(song, singer);
  const { instrument, owned } = useInstrument(song.id, asked.instrument ?? keys.decision?.instrument ?? null);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const toKeep = isKeptId(arrangementId);
  const written = toKeep ? null : keys.written;
  const search = useQuery(wayQueries.into(written && { ...written, instrument, wishes }, key));
  const mine = decidedHere(keys, shift);
  const sequence = keys.written?.sequence ?? [];
  const edit = (entry: ArrangementEntry, kept: Arrangement | null) => (
    <BackingDesk key={arrangementId}>
      {(desk) => (
        <ArrangementEditor
          {...{ entry, sequence, kept, desk }}
          instrumentWords={instrumentWords(entry.on.instrument)}
          firstOpen={asked.chord}
          onGo={(path, replace) => (replace ? router.replace(path) : router.push(path))}
        />
      )}
    </BackingDesk>
  );
  if (toKeep)
    return (
      <KeptArrangement
        {...{ id: arrangementId, song, sequence }}
        instruments={offeredInstruments(owned).map((each) => each.instrument)}
      >
        {edit}
      </KeptArrangement>
    );
  const way = { asked, kept: mine?.instrument === instrument.id ? mine.way : null };
  return (
    <WayToArrange {...{ song, search, ...way }} title="Arrangement" hasChords={keys.written !== null}>
      {(found) => (
        <ProposedArrangement
          {...{ id: arrangementId, sequence }}
          on={{ song, tonic: key.tonic, shift, instrument, way: found }}
        >
          {(entry) => edit(entry, null)}
        </ProposedArrangement>
      )}
    </WayToArrange>
  );
}
