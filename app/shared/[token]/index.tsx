import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { useMemo } from "react";
import { InstrumentSelect } from "@/features/instruments/InstrumentSelect";
import { instrumentWords } from "@/features/instruments/myInstruments";
import { useInstrument } from "@/features/instruments/useInstrument";
import { askedKey } from "@/features/keys/songKeys";
import { linkQueries } from "@/features/sheets/links/linkQueries";
import { untilWords } from "@/features/sheets/links/linkWords";
import { SharedState } from "@/features/sheets/links/SharedState";
import { chordsOf, sharedSong, type SheetParams } from "@/features/sheets/sheetInHand";
import { SheetScreen } from "@/features/sheets/SheetScreen";
import { useSheetInHand } from "@/features/sheets/useSheetInHand";
import { Text } from "@/features/ui/Text";
import { wayQueries } from "@/features/ways/wayQueries";
import { useWishes } from "@/features/ways/wishes/useWishes";
import type { SharedSheet } from "@/shared/contract/sheetLink";

export default function SharedRoute() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return (
    <SharedState query={useQuery(linkQueries.shared(token))}>
      {(shared) => <Shared shared={shared} token={token} />}
    </SharedState>
  );
}

function Shared({ shared, token }: { shared: SharedSheet; token: string }) {
  const asked = useLocalSearchParams() as SheetParams;
  const [router, [wishes]] = [useRouter(), useWishes()];
  const { view } = shared;
  const song = useMemo(() => sharedSong(shared), [shared]);
  const { instrument, owned, choose } = useInstrument(`shared ${token}`, asked.instrument ?? view.instrument);
  const { key, shift } = askedKey(song, null, asked.key ?? view.tonic, asked.shift ?? String(view.shift));
  const chords = useMemo(() => chordsOf(song), [song]);
  // Who sent the link may wish for other things than who opens it: the way it was made with is found all the same.
  const kept = view.instrument === instrument.id && view.shift === shift ? view.way : null;
  const found = useQuery(wayQueries.into(chords && { ...chords, instrument, wishes, settled: kept }, key));
  const inHand = useSheetInHand({
    ...{ song, key, shift, instrument, asked },
    singer: null,
    ways: found.data,
    kept,
    ask: (change) => router.setParams(change as Record<string, string>),
  });
  return (
    <SheetScreen
      sheet={inHand.sheet}
      title={shared.title}
      subtitle={`Shared with you, for ${instrumentWords(instrument)}`}
      searching={chords !== null && found.isPending}
      stage={{ pathname: "/shared/[token]/stage", params: { token, ...inHand.params } }}
      choices={{
        ...inHand.choices,
        chooser: <InstrumentSelect owned={owned} value={instrument.id} onChange={choose} />,
      }}
      share={
        <Text variant="small" tone="soft">
          {`${untilWords(shared.expiresAt)} You see the song as it is now; what you choose here changes nothing for anybody else.`}
        </Text>
      }
    />
  );
}
