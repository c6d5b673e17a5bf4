import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { instrumentWords } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { askedKey } from "@/features/keys/songKeys";
import { decidedHere, useSongKeys } from "@/features/keys/useSongKeys";
import { useTuneInKey } from "@/features/keys/useTuneInKey";
import { ShareLinks } from "@/features/sheets/links/ShareLinks";
import { linkView } from "@/features/sheets/links/linkView";
import type { SheetParams } from "@/features/sheets/sheetInHand";
import { SheetScreen } from "@/features/sheets/SheetScreen";
import { useSheetInHand } from "@/features/sheets/useSheetInHand";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { whyPath } from "@/features/ui/whyPath";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { useSheetArrangements } from "@/features/ways/arrangements/useSheetArrangements";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

export default function SheetRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Sheet">
      {(song) => <SongSheet song={song} />}
    </SongState>
  );
}

function SongSheet({ song }: { song: Song }) {
  const asked = useLocalSearchParams() as SheetParams;
  const [router, [wishes], singer] = [useRouter(), useWishes(), useSingingVoice()];
  const keys = useSongKeys(song, singer);
  const { instrument, owned, choose } = useInstrument(song.id, asked.instrument ?? keys.decision?.instrument ?? null);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const found = useQuery(wayQueries.into(keys.written && { ...keys.written, instrument, wishes }, key));
  const mine = decidedHere(keys, shift);
  const inHand = useSheetInHand({
    ...{ song, key, shift, instrument, asked },
    singer: singer.voice?.name ?? null,
    tune: useTuneInKey(keys, shift),
    ways: found.data,
    kept: mine?.instrument === instrument.id ? mine.way : null,
    arrangements: useSheetArrangements(song, shift, instrument),
    ask: (change) => router.setParams(change as Record<string, string>),
  });
  return (
    <SheetScreen
      sheet={inHand.sheet}
      title={`Sheet in ${glyphs(keySign(key))}`}
      subtitle={`For ${instrumentWords(instrument)}`}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      searching={keys.written !== null && found.isPending}
      stage={{ pathname: "/songs/[id]/stage", params: { id: song.id, ...inHand.params } }}
      choices={{
        ...inHand.choices,
        chooser: <InstrumentSelect owned={owned} value={instrument.id} onChange={choose} />,
      }}
      why={keys.written ? whyPath(song.id, key, shift, { instrument: instrument.id, way: inHand.way }) : undefined}
      share={<ShareLinks songId={song.id} view={linkView(key, shift, instrument, inHand.way)} />}
    />
  );
}
