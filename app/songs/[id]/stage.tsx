import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { useInstrument } from "@/features/instruments/useInstrument";
import { askedKey } from "@/features/keys/songKeys";
import { decidedHere, useSongKeys } from "@/features/keys/useSongKeys";
import type { SheetParams } from "@/features/sheets/sheetInHand";
import { StageScreen } from "@/features/sheets/stage/StageScreen";
import { useSheetInHand } from "@/features/sheets/useSheetInHand";
import { SongState } from "@/features/songs/SongState";
import { songQueries } from "@/features/songs/songQueries";
import { useSingingVoice } from "@/features/voice/useSingingVoice";
import { useSheetArrangements } from "@/features/ways/arrangements/useSheetArrangements";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { Song } from "@/shared/contract/song";
import { songLength } from "@/shared/sheets/stageSong";

export default function StageRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Stage">
      {(song) => <Stage song={song} />}
    </SongState>
  );
}

function Stage({ song }: { song: Song }) {
  const asked = useLocalSearchParams() as SheetParams;
  const [[wishes], singer] = [useWishes(), useSingingVoice()];
  const keys = useSongKeys(song, singer);
  const { instrument } = useInstrument(song.id, asked.instrument ?? keys.decision?.instrument ?? null);
  const { key, shift } = askedKey(song, keys.inHand, asked.key, asked.shift);
  const found = useQuery(wayQueries.into(keys.written && { ...keys.written, instrument, wishes }, key));
  const mine = decidedHere(keys, shift);
  const { sheet, params } = useSheetInHand({
    ...{ song, key, shift, instrument, asked },
    singer: null,
    ways: found.data,
    kept: mine?.instrument === instrument.id ? mine.way : null,
    arrangements: useSheetArrangements(song, shift, instrument),
    ask: () => undefined,
  });
  const notes = song.tune?.kind === "melody" ? song.tune.notes : null;
  const length = useMemo(() => songLength({ ...song, notes: notes ?? [] }), [song, notes]);
  const back = { pathname: "/songs/[id]/sheet", params: { id: song.id, ...params } } as const;
  return <StageScreen sheet={sheet} length={length} back={back} />;
}
