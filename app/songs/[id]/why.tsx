import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useMemo } from "react";
import { askedWay, type AskedWay } from "@/features/coach/askedWay";
import { WhyMissing } from "@/features/coach/WhyMissing";
import { WhyScreen } from "@/features/coach/WhyScreen";
import { chosenInstrument } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { askedKey } from "@/features/keys/songKeys";
import { decidedHere, useSongKeys } from "@/features/keys/useSongKeys";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { wayQueries } from "@/features/ways/wayQueries";
import { shortWay } from "@/features/ways/wayWords";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";
import { parseChart } from "@/shared/songs/chart";

export default function WhyRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Why it sounds so">
      {(song) => <Why key={song.id} song={song} />}
    </SongState>
  );
}

type Asked = AskedWay & { key?: string; shift?: string; instrument?: string; step?: string };

function Why({ song }: { song: Song }) {
  const asked = useLocalSearchParams() as Asked;
  const [router, [wishes]] = [useRouter(), useWishes()];
  const keys = useSongKeys(song, useSingingVoice());
  const inHand = useInstrument(song.id, keys.decision?.instrument ?? null);
  const instrument = asked.instrument ? chosenInstrument(inHand.owned, asked.instrument) : inHand.instrument;
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const mine = decidedHere(keys, shift);
  const told = askedWay(asked, key, instrument) ?? (mine?.instrument === instrument.id ? mine.way : null);
  const { written } = keys;
  const search = useQuery(wayQueries.into(written && !told ? { ...written, instrument, wishes } : null, key));
  const chart = useMemo(() => parseChart(song.chart), [song.chart]);
  const way = told ?? search.data?.[0] ?? null;
  if (!written || !way) return <WhyMissing song={song} hasChords={written !== null} search={search} />;
  return (
    <WhyScreen
      song={song}
      asked={{ chart, from: written.from, to: key, instrument, way, seed: seedOf(song.id) + shift }}
      way={`${shortWay(way)}. ${instrument.name}`}
      step={asked.step}
      onStep={(step) => router.setParams({ step })}
      waysHref={{ pathname: "/songs/[id]/ways", params: { id: song.id, key: key.tonic, shift: String(shift) } }}
    />
  );
}

/** The same questions each time a song is opened. */
function seedOf(id: string): number {
  return parseInt(id.slice(0, 4), 16) || 1;
}
