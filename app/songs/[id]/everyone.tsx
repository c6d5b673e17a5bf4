import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useLineUp } from "@/features/api/lineUps";
import { instrumentWords, offeredInstruments, ownWords } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { keyChoicesFor } from "@/features/keys/keyChoices";
import { askedKey } from "@/features/keys/songKeys";
import { useSongKeys } from "@/features/keys/useSongKeys";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { EveryoneScreen } from "@/features/ways/everyone/EveryoneScreen";
import type { Song } from "@/shared/contract/song";

export default function EveryoneRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Everyone’s plan">
      {(song) => <Everyone key={song.id} song={song} />}
    </SongState>
  );
}

function Everyone({ song }: { song: Song }) {
  const asked = useLocalSearchParams<{ key?: string; shift?: string }>();
  const router = useRouter();
  const keys = useSongKeys(song, useSingingVoice());
  const lineUp = useLineUp(song.id);
  const { instrument, owned } = useInstrument(song.id, keys.decision?.instrument ?? null);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const offered = offeredInstruments(owned);
  return (
    <EveryoneScreen
      song={song}
      into={key}
      shift={shift}
      keys={keyChoicesFor(keys, song, { key, shift })}
      onKey={(next) => router.setParams({ key: "", shift: String(next) })}
      chords={keys.written}
      lineUp={lineUp}
      offered={offered.map((each) => ({ value: each.instrument.id, label: ownWords(each.instrument, each.own) }))}
      first={instrument.id}
      instrumentOf={(id) => {
        const found = offered.find((each) => each.instrument.id === id);
        return found ? { instrument: found.instrument, words: instrumentWords(found.instrument) } : null;
      }}
    />
  );
}
