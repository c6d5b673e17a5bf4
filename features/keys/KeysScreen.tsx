import { useRouter } from "expo-router";
import { useState, type ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import { CompareLink, PinBar } from "./compare/PinBar";
import { usePinning } from "./compare/pins";
import { DecisionCard } from "./decision/DecisionCard";
import { KeyDeck } from "./deck/KeyDeck";
import { KeyList } from "./deck/KeyList";
import { MoveByHand } from "./deck/MoveByHand";
import type { KeyRow } from "./keyRows";
import { KeysMissing } from "./KeysMissing";
import { FixedLine } from "./FixedLine";
import { roomWords } from "./partWords";
import { ReachLine } from "./ReachLine";
import { songWords } from "./songWords";
import type { FoundWays } from "./table/tableWays";
import { WideKeys } from "./table/WideKeys";
import { TogetherLink } from "./together/TogetherLink";
import { TriedLine } from "./tryout/kept/TriedLine";
import { TryLink } from "./tryout/TryLink";
import { decidedHere, decidedWords, type SongKeys } from "./useSongKeys";

export interface KeysScreenProps {
  song: Song;
  keys: SongKeys;
  /** the voice is still being fetched */
  pending: boolean;
  voice: { id: string; name: string } | null;
  /** the ways to play each key, on the wide screen */
  waysOf: (row: KeyRow) => FoundWays;
  /** what the ways are played on: its id, its strings in words, and the list to choose from */
  instrument: { id: string; strings: string; chooser: ReactNode };
}

/** All twelve keys: cards and a short list on the phone, one table on the wide screen. */
export function KeysScreen({ song, keys, pending, voice, waysOf, instrument }: KeysScreenProps) {
  const router = useRouter();
  const layout = useLayout();
  const [chosen, setChosen] = useState<number | null>(null);
  const { rows, decision } = keys;
  const pinning = usePinning(song.id, rows);
  const look = (row: KeyRow) => setChosen(row.shift);
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
  const pageOf = (row: KeyRow) => ({
    pathname: "/songs/[id]/ways" as const,
    params: { id: song.id, key: row.key.tonic, shift: String(row.shift) },
  });
  const phone = layout === "phone";
  const wide = layout === "wide";
  const back = { label: song.title, href: { pathname: "/songs/[id]" as const, params: { id: song.id } } };
  const actions = selected && (
    <>
      {wide && <CompareLink songId={song.id} pinning={pinning} kind="secondary" />}
      <TryLink songId={song.id} of={selected.key} shift={selected.shift} />
      <LinkButton kind="secondary" small href={pageOf(selected)} label={`Ways to play ${selected.sign}`} />
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
          <TriedLine songId={song.id} tried={keys.tried} />
          <FixedLine songId={song.id} fixed={keys.fixed} />
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
            <WideKeys
              rows={rows}
              voice={keys.voice}
              selected={selected}
              onSelect={look}
              pinning={pinning}
              waysOf={waysOf}
              instrument={keys.written ? instrument : null}
              markOf={markOf}
            />
          ) : (
            <>
              <KeyDeck rows={rows} voice={keys.voice} selected={selected} onSelect={look} pinning={pinning} />
              {phone && (
                <Button
                  label={`Use ${selected.sign}, see ways to play it`}
                  busy={keys.saving}
                  onPress={() =>
                    isMine ? router.push(pageOf(selected)) : take(selected, () => router.push(pageOf(selected)))
                  }
                  testID="take-key"
                  style={{ marginTop: 4, marginBottom: 8 }}
                />
              )}
              {phone && <TryLink songId={song.id} of={selected.key} shift={selected.shift} />}
              <KeyList
                rows={rows}
                voice={keys.voice}
                selected={selected}
                onSelect={look}
                markOf={markOf}
                pinned={pinning.has}
              />
              <Text variant="small" tone="soft" testID="room-words" style={{ marginTop: 8 }}>
                {roomWords(selected)}
              </Text>
            </>
          )}
          <DecisionCard keys={keys} style={{ marginTop: 12, maxWidth: 620 }} />
          <MoveByHand rows={rows} voice={keys.voice} selected={selected} onSelect={look} />
          {!wide && <PinBar songId={song.id} pinning={pinning} />}
        </>
      )}
      {song.tune && (
        <TogetherLink songId={song.id} chords={keys.written !== null} selected={selected} instrument={instrument.id} />
      )}
    </Screen>
  );
}

/** What the button does. A key that leaves notes out is not offered as if it fitted. */
function takeWords({ sign, beyond }: KeyRow, isMine: boolean): string {
  if (isMine) return `${sign} is my key`;
  return beyond ? `Take ${sign} all the same` : `Make ${sign} my key`;
}
