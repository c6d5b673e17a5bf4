import { useRef, useState } from "react";
import { View, type Text as NativeText } from "react-native";
import type { SongLineUp } from "@/features/api/lineUps";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { EmptyState } from "@/features/ui/EmptyState";
import { ErrorState } from "@/features/ui/ErrorState";
import { Heading } from "@/features/ui/Heading";
import { IconButton } from "@/features/ui/IconButton";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { Screen } from "@/features/ui/Screen";
import { Select } from "@/features/ui/Select";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import { mostPlayers, type Player } from "@/shared/contract/lineUp";
import type { Instrument } from "@/shared/instruments/instrument";
import { findFixed, fixedInstruments, fixedName } from "@/shared/keys/fixed/fixedInstrument";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { Playing } from "../wayQueries";
import { AddPlayer } from "./AddPlayer";
import { FixedPlan } from "./FixedPlan";
import { PlayerPlan } from "./PlayerPlan";
import { withWay } from "./playersOf";
import { capitalized } from "@/shared/music/countWords";

/** A key to choose: where it lies from the song as written, and what is said of it. */
interface KeyChoice {
  shift: number;
  label: string;
}

export interface EveryoneScreenProps {
  song: { id: string; title: string };
  into: KeyName;
  shift: number;
  /** best first */
  keys: readonly KeyChoice[];
  onKey: (shift: number) => void;
  /** null where the song has none */
  chords: Omit<Playing, "instrument" | "wishes"> | null;
  lineUp: SongLineUp;
  /** stringed instruments to choose: own ones and presets */
  offered: readonly { value: string; label: string }[];
  /** the one in hand */
  first: string;
  /** null where it is not there any more */
  instrumentOf: (id: string) => { instrument: Instrument; words: string } | null;
}

/** The same sounding key for everybody in the room: who plays on what, and each one's ways into it, on one page to print. */
export function EveryoneScreen(props: EveryoneScreenProps) {
  const { song, into, shift, keys, onKey, chords, lineUp, first } = props;
  const phone = useLayout() === "phone";
  const [adding, setAdding] = useState(false);
  const [said, setSaid] = useState("");
  const heading = useRef<NativeText>(null);
  const sign = glyphs(keySign(into));
  const { players } = lineUp;
  const offered = [
    ...props.offered,
    ...fixedInstruments.map((each) => ({ value: each.id, label: capitalized(fixedName(each)) })),
  ];
  const change = (next: readonly Player[], words: string) => {
    lineUp.change(next);
    setSaid(words);
  };
  const remove = (player: Player) => {
    change(
      (players ?? []).filter(({ id }) => id !== player.id),
      `${player.name} is taken out.`,
    );
    // What was pressed is gone with the player.
    heading.current?.focus();
  };
  const open = adding || players?.length === 0;
  const print = players !== undefined && players.length > 0 && chords !== null && (
    <Button
      kind={phone ? "primary" : "secondary"}
      small={!phone}
      label="Print this page"
      onPress={() => window.print()}
      testID="print-everyone"
    />
  );
  return (
    <Screen
      title={`Everyone’s plan in ${sign}`}
      subtitle={phone ? song.title : "Who plays what, so that all of it sounds together"}
      crumb={{ label: song.title, href: { pathname: "/songs/[id]", params: { id: song.id } } }}
      wide
      footer={print || undefined}
    >
      <style>{paper}</style>
      <LiveText hidden>{said}</LiveText>
      {!chords ? (
        <EmptyState
          testID="everyone-needs-chords"
          title="No chords yet"
          text="Everyone’s plan shows who plays the song’s chords with which shapes. Give its chart first."
          action={
            <LinkButton
              href={{ pathname: "/songs/[id]/edit", params: { id: song.id } }}
              label="Give the chart"
              icon="edit"
              small
            />
          }
        />
      ) : lineUp.unread ? (
        <ErrorState
          title="The line-up could not be opened"
          text={`${lineUp.unread.message} Nothing of it is lost.`}
          onRetry={() => void lineUp.refetch()}
        />
      ) : !players ? (
        <Skeleton bars={[{ height: 52 }, { height: 220 }, { height: 220 }]} words="Opening the line-up" />
      ) : (
        <View style={{ gap: 20 }}>
          {lineUp.error && (
            <Notice kind="error" title="The line-up is not saved">
              {`${lineUp.error.message} Try the change again.`}
            </Notice>
          )}
          <View {...screenOnly} style={{ maxWidth: 520 }}>
            <Select
              label="Sounding key"
              value={String(shift)}
              options={keys.map((key) => ({ value: String(key.shift), label: key.label }))}
              onChange={(value) => onKey(Number(value))}
              testID="everyone-key"
            />
          </View>
          <Heading ref={heading} level={2} focusable>
            {players.length === 0 ? "Who plays along?" : `All of these sound in ${sign}`}
          </Heading>
          {players.length === 0 && (
            <Text testID="everyone-empty" style={{ maxWidth: 620 }}>
              Add yourself and the others, each with an instrument. Everybody then has their own ways into the same key
              here. A whistle or a mouth harp plays few keys: those that it plays come first in the ranking of keys.
            </Text>
          )}
          <View style={webStyle(grid)} role="list">
            {players.map((player) => (
              <View key={player.id} role="listitem" style={webStyle({ breakInside: "avoid", minWidth: 0 })}>
                <PlayerCard {...props} chords={chords} player={player} change={change} remove={() => remove(player)} />
              </View>
            ))}
          </View>
          <View {...screenOnly} style={{ gap: 14 }}>
            {players.length > 0 && players.length < mostPlayers && (
              <Button
                kind="secondary"
                small
                icon={open ? "up" : "plus"}
                label={open ? "That is everybody" : "Add a player"}
                expanded={open}
                onPress={() => setAdding(!open)}
                testID="adding-player"
                style={{ alignSelf: "flex-start" }}
              />
            )}
            {open && players.length < mostPlayers && (
              <AddPlayer
                offered={offered}
                first={first}
                onAdd={(player) => {
                  // A band is typed in one go: the fields stay until somebody says that it is everybody.
                  setAdding(true);
                  change([...players, player], `${player.name} is in the line-up.`);
                }}
              />
            )}
          </View>
        </View>
      )}
    </Screen>
  );
}

interface PlayerCardProps extends Pick<EveryoneScreenProps, "song" | "into" | "shift" | "lineUp" | "instrumentOf"> {
  chords: Omit<Playing, "instrument" | "wishes">;
  player: Player;
  change: (players: readonly Player[], said: string) => void;
  remove: () => void;
}

function PlayerCard({ song, into, shift, lineUp, instrumentOf, chords, player, change, remove }: PlayerCardProps) {
  const fixed = findFixed(player.instrument);
  const strung = fixed ? null : instrumentOf(player.instrument);
  const words = fixed ? capitalized(fixedName(fixed)) : (strung?.words ?? "An instrument that is not there any more");
  return (
    <Card testID="player" style={{ gap: 12, height: "100%" }}>
      <View style={{ flexDirection: "row", justifyContent: "space-between", gap: 8 }}>
        <View style={{ flexShrink: 1 }}>
          <Heading level={3} size={20}>
            {player.name}
          </Heading>
          <Text variant="small" tone="soft">
            {words}
          </Text>
        </View>
        <IconButton
          icon="close"
          label={`Take ${player.name} out`}
          onPress={remove}
          testID="player-remove"
          style={{ marginTop: -8, marginRight: -10 }}
        />
      </View>
      {fixed ? (
        <FixedPlan instrument={fixed} into={into} />
      ) : strung ? (
        <PlayerPlan
          player={player}
          instrument={strung.instrument}
          songId={song.id}
          chords={chords}
          into={into}
          shift={shift}
          onWay={(way) =>
            change(withWay(lineUp.players ?? [], player.id, into.tonic, way), `${player.name}: ${way.title}.`)
          }
        />
      ) : (
        <Text variant="small">Take this player out and add them again with another instrument.</Text>
      )}
    </Card>
  );
}

const screenOnly = { dataSet: { screen: "" } } as object;

const grid = {
  display: "grid",
  gridTemplateColumns: "repeat(auto-fill, minmax(min(360px, 100%), 1fr))",
  gap: 16,
  alignItems: "stretch",
} as const;

/** On paper: what everybody plays, and nothing to press. */
const paper = `@media print{@page{margin:12mm}
html,body,#root{background:#fff!important}
button:not([role=radio]),[role=button],[data-screen],[role=radiogroup] [aria-checked=false]{display:none!important}
[role=main]{max-width:none!important}
*{print-color-adjust:exact;-webkit-print-color-adjust:exact}}`;
