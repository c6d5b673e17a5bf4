import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { useMemo } from "react";
import { useInstrument } from "@/features/instruments/useInstrument";
import { askedKey } from "@/features/keys/songKeys";
import { linkQueries } from "@/features/sheets/links/linkQueries";
import { SharedState } from "@/features/sheets/links/SharedState";
import { chordsOf, sharedSong, type SheetParams } from "@/features/sheets/sheetInHand";
import { StageScreen } from "@/features/sheets/stage/StageScreen";
import { useSheetInHand } from "@/features/sheets/useSheetInHand";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { SharedSheet } from "@/shared/contract/sheetLink";
import { songLength } from "@/shared/sheets/stageSong";

export default function SharedStageRoute() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return (
    <SharedState query={useQuery(linkQueries.shared(token))}>
      {(shared) => <SharedStage shared={shared} token={token} />}
    </SharedState>
  );
}

function SharedStage({ shared, token }: { shared: SharedSheet; token: string }) {
  const asked = useLocalSearchParams() as SheetParams;
  const [wishes] = useWishes();
  const { view } = shared;
  const song = useMemo(() => sharedSong(shared), [shared]);
  const { instrument } = useInstrument(`shared ${token}`, asked.instrument ?? view.instrument);
  const { key, shift } = askedKey(song, null, asked.key ?? view.tonic, asked.shift ?? String(view.shift));
  const chords = useMemo(() => chordsOf(song), [song]);
  // Who sent the link may wish for other things than who opens it: the way it was made with is found all the same.
  const kept = view.instrument === instrument.id && view.shift === shift ? view.way : null;
  const found = useQuery(wayQueries.into(chords && { ...chords, instrument, wishes, settled: kept }, key));
  const { sheet, params } = useSheetInHand({
    ...{ song, key, shift, instrument, asked },
    singer: null,
    ways: found.data,
    kept,
    ask: () => undefined,
  });
  const length = useMemo(() => songLength({ ...song, notes: [] }), [song]);
  return (
    <StageScreen sheet={sheet} length={length} back={{ pathname: "/shared/[token]", params: { token, ...params } }} />
  );
}
