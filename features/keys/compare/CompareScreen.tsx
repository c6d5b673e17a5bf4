import { useQuery } from "@tanstack/react-query";
import { useRouter } from "expo-router";
import { useState, type ReactNode } from "react";
import { useWindowDimensions } from "react-native";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { sizes } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import type { SingingVoice, Tune } from "@/shared/keys/keyScore";
import { partFacts } from "@/shared/keys/partFacts";
import { glyphs } from "@/shared/music/pitch";
import type { KeyRow } from "../keyRows";
import { KeysMissing } from "../KeysMissing";
import { chordsIn } from "../songKeys";
import { songWords } from "../songWords";
import { DecisionCard } from "../decision/DecisionCard";
import { PrintSheet } from "../table/PrintSheet";
import { tryQueries } from "../tryout/tryQueries";
import { decidedHere, decidedWords, type SongKeys } from "../useSongKeys";
import { CompareTable } from "./CompareTable";
import { compareTitle } from "./compareWords";
import { keyToBegin } from "./keyToBegin";
import { usePins } from "./pins";
import { TakesTried } from "./TakesTried";
import { takesIn } from "./takesWords";

export interface CompareScreenProps {
  song: Song;
  keys: SongKeys;
  /** the voice is still being fetched */
  pending: boolean;
  voice: { id: string; name: string } | null;
  /** the keys side by side */
  rows: readonly KeyRow[];
  instrument: { id: string; strings: string; chooser: ReactNode };
  wayOf: (row: KeyRow) => ReactNode;
}

/** Up to four keys of one song side by side. */
export function CompareScreen({ song, keys, pending, voice, rows, instrument, wayOf }: CompareScreenProps) {
  const router = useRouter();
  const layout = useLayout();
  const window = useWindowDimensions().width;
  const { setPins } = usePins(song.id);
  const tries = useQuery(tryQueries.all());
  const [chosen, setChosen] = useState<number | null>(null);
  const selected = keyToBegin(rows, chosen, keys.inHand?.because === "decided" ? keys.inHand.shift : null);
  const isMine = selected !== null && decidedHere(keys, selected.shift) !== null;
  const room = {
    phone: window - 2 * sizes.gutterPhone,
    middle: window - sizes.railMiddle - 2 * sizes.gutterWide,
    wide: window - sizes.rail - 2 * sizes.gutterWide,
  }[layout];
  const allTwelve = { pathname: "/songs/[id]/keys" as const, params: { id: song.id } };
  const takeAway = (row: KeyRow) => {
    const left = rows.filter((each) => each !== row).map(({ shift }) => shift);
    setPins(left);
    router.setParams({ keys: left.join(",") });
  };
  const take = (row: KeyRow) =>
    keys.take({
      tonic: row.key.tonic,
      shift: row.shift,
      instrument: instrument.id,
      way: isMine && keys.decision?.instrument === instrument.id ? keys.decision.way : null,
    });
  return (
    <Screen
      title={rows.length === 0 ? "Keys side by side" : compareTitle(rows.length)}
      subtitle={layout === "phone" ? song.title : songWords(song, voice?.name ?? null, keys.voice, instrument.strings)}
      crumb={{ label: `${song.title} / Keys`, href: allTwelve }}
      wide
      actions={
        selected && (
          <>
            {layout !== "phone" && (
              <LinkButton kind="secondary" small href={allTwelve} label="Back to all twelve" testID="all-twelve" />
            )}
            <Button
              small
              disabled={isMine}
              busy={keys.saving}
              label={
                isMine
                  ? `${selected.sign} is my key`
                  : selected.beyond
                    ? `Take ${selected.sign} all the same`
                    : `Make ${selected.sign} my key`
              }
              onPress={() => take(selected)}
              testID="take-key"
            />
          </>
        )
      }
    >
      {keys.error && (
        <Notice
          kind="error"
          title="Your key is not saved"
        >{`${keys.error.message} The keys are still here; try again.`}</Notice>
      )}
      {pending ? (
        <Skeleton bars={[{ height: 72 }, { height: 390 }, { height: 120 }]} words="Scoring the keys" />
      ) : !keys.rows || !keys.voice || !song.tune ? (
        <KeysMissing song={song} />
      ) : selected === null ? (
        <EmptyState
          testID="nothing-pinned"
          title="No key is pinned"
          text="Here stand up to four keys in full, side by side. Pin them among all twelve with the bookmark."
          action={<LinkButton small href={allTwelve} label="Choose among all twelve" />}
        />
      ) : (
        <>
          <PrintSheet zoom={0.75} />
          <CompareTable
            rows={rows}
            all={keys.rows}
            voice={keys.voice}
            room={room}
            selected={selected}
            onSelect={(row) => setChosen(row.shift)}
            onUnpin={takeAway}
            markOf={(row) => decidedWords(keys, row.shift)}
            chooser={keys.written ? instrument.chooser : null}
            wayOf={wayOf}
            factsOf={factsOf(song.tune, keys.voice)}
            chordsOf={({ key }) =>
              keys.written ? chordsIn(keys.written.chords, keys.written.from, key).map(glyphs) : []
            }
            takesOf={(row) => (
              <TakesTried
                songId={song.id}
                row={row}
                takes={tries.data && takesIn(tries.data, song.id, voice?.id ?? null, row.shift)}
                fault={tries.error}
              />
            )}
          />
          <DecisionCard keys={keys} style={{ marginTop: 16, maxWidth: 620 }} />
        </>
      )}
    </Screen>
  );
}

function factsOf(tune: Tune, voice: SingingVoice) {
  return ({ judged }: KeyRow) => partFacts(tune, voice, judged);
}
