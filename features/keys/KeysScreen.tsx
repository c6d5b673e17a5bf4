import { useRouter } from "expo-router";
import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Select } from "@/features/ui/Select";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { DecidedLine } from "./decision/DecidedLine";
import { KeyDeck } from "./deck/KeyDeck";
import { KeyLegend } from "./KeyLegend";
import { KeyList } from "./deck/KeyList";
import { keyOrders, sortedRows, type KeyOrder, type KeyRow } from "./keyRows";
import { KeysMissing } from "./KeysMissing";
import { KeyTable } from "./table/KeyTable";
import type { TableWay } from "./table/KeyTableRow";
import { roomWords } from "./partWords";
import { ReachLine } from "./ReachLine";
import { songWords } from "./songWords";
import { decidedHere, decidedWords, type SongKeys } from "./useSongKeys";

export interface KeysScreenProps {
  song: Song;
  keys: SongKeys;
  /** the voice is still being fetched */
  pending: boolean;
  voice: { id: string; name: string } | null;
  wayOf: (row: KeyRow) => TableWay;
  /** what the ways are played on: its id, its strings in words, and the list to choose from */
  instrument: { id: string; strings: string; chooser: ReactNode };
}

/** All twelve keys: cards and a short list on the phone, one table on the wide screen. */
export function KeysScreen({ song, keys, pending, voice, wayOf, instrument }: KeysScreenProps) {
  const router = useRouter();
  const layout = useLayout();
  const [chosen, setChosen] = useState<number | null>(null);
  const [order, setOrder] = useState<KeyOrder>("score");
  const { rows, decision } = keys;
  const selected = rows?.find((row) => row.shift === chosen) ?? keys.inHand?.row ?? rows?.[0] ?? null;
  const isMine = selected !== null && decidedHere(keys, selected.shift) !== null;
  const markOf = (row: KeyRow) => decidedWords(keys, row.shift);
  const take = (row: KeyRow, done?: () => void) =>
    keys.take(
      {
        tonic: row.key.tonic,
        shift: row.shift,
        instrument: instrument.id,
        way: isMine && decision?.instrument === instrument.id ? decision.way : null,
      },
      done,
    );
  const waysOf = (row: KeyRow) => ({
    pathname: "/songs/[id]/ways" as const,
    params: { id: song.id, key: row.key.tonic, shift: String(row.shift) },
  });
  const phone = layout === "phone";
  const wide = layout === "wide";
  const back = { label: song.title, href: { pathname: "/songs/[id]" as const, params: { id: song.id } } };
  const actions = selected && (
    <>
      <LinkButton kind="secondary" small href={waysOf(selected)} label={`Ways to play ${selected.sign}`} />
      <Button
        small
        disabled={isMine}
        busy={keys.saving}
        label={takeWords(selected, isMine)}
        onPress={() => take(selected)}
        testID="take-key"
      />
    </>
  );
  return (
    <Screen
      title={wide ? "All twelve keys, side by side" : "Keys for your voice"}
      subtitle={!phone ? songWords(song, voice?.name ?? null, keys.voice, instrument.strings) : song.title}
      crumb={back}
      wide
      actions={phone ? undefined : actions}
    >
      {keys.error && (
        <Notice
          kind="error"
          title="Your key is not saved"
        >{`${keys.error.message} The keys are still here; try again.`}</Notice>
      )}
      {pending ? (
        <Skeleton bars={[{ height: 372 }, { height: 56 }, { height: 48 }, { height: 48 }]} words="Scoring the keys" />
      ) : !rows || !keys.voice || !selected ? (
        <KeysMissing song={song} />
      ) : (
        <>
          <ReachLine voice={keys.voice} voiceId={voice?.id ?? null} />
          {keys.noFit !== null && (
            <View style={{ marginBottom: 10 }}>
              <Notice kind="caution" testID="no-key-fits">
                {keys.noFit}
              </Notice>
            </View>
          )}
          {selected.coarse && (
            <Text variant="small" tone="soft" style={{ marginBottom: 8 }}>
              Coarse: only the lowest and highest note of the tune are known, so every note between counts alike.
            </Text>
          )}
          {wide ? (
            <>
              <Text tone="soft" style={{ lineHeight: 32, marginBottom: 10 }}>
                {"Show the "}
                <Select
                  inline
                  label="Order of the keys"
                  value={order}
                  options={keyOrders}
                  onChange={setOrder}
                  testID="key-order"
                />
                {keys.written ? (
                  <>
                    {", played on "}
                    {instrument.chooser}.
                  </>
                ) : (
                  ". The song has no chords yet, so no ways to play it are shown."
                )}
              </Text>
              <KeyTable
                rows={sortedRows(rows, order)}
                voice={keys.voice}
                selected={selected}
                onSelect={(row) => setChosen(row.shift)}
                order={order}
                onOrder={setOrder}
                wayOf={wayOf}
                instrument={keys.written ? instrument.strings : null}
                markOf={markOf}
              />
              <KeyLegend>{roomWords(selected)}</KeyLegend>
            </>
          ) : (
            <>
              <KeyDeck rows={rows} voice={keys.voice} selected={selected} onSelect={(row) => setChosen(row.shift)} />
              {phone && (
                <Button
                  label={`Use ${selected.sign}, see ways to play it`}
                  busy={keys.saving}
                  onPress={() =>
                    isMine ? router.push(waysOf(selected)) : take(selected, () => router.push(waysOf(selected)))
                  }
                  testID="take-key"
                  style={{ marginTop: 12 }}
                />
              )}
              <KeyList
                rows={rows}
                voice={keys.voice}
                selected={selected}
                onSelect={(row) => setChosen(row.shift)}
                markOf={markOf}
              />
              <Text variant="small" tone="soft" testID="room-words" style={{ marginTop: 8 }}>
                {roomWords(selected)}
              </Text>
            </>
          )}
          {decision && (
            <View style={{ marginTop: 12 }}>
              <DecidedLine keys={keys} />
            </View>
          )}
        </>
      )}
    </Screen>
  );
}

/** What the button does. A key that leaves notes out is not offered as if it fitted. */
function takeWords({ sign, beyond }: KeyRow, isMine: boolean): string {
  if (isMine) return `${sign} is my key`;
  return beyond ? `Take ${sign} all the same` : `Make ${sign} my key`;
}
