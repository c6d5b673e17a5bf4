import { useMemo, useState, type ReactNode } from "react";
import { useWindowDimensions, View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";
import { Segmented } from "@/features/ui/Segmented";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { shortMove } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import { MovedChart } from "./MovedChart";
import { RemoveSong } from "./RemoveSong";
import { beatWords, hasChords, headWords } from "./songFacts";

/** The key that the page shows the chart in, besides the written one. */
interface TargetKey {
  key: KeyName;
  shift: number;
  /** decided by the singer; else the best for the voice */
  decided: boolean;
}

export interface SongScreenProps {
  song: Song;
  target: TargetKey | null;
  /** the key in hand, or what is missing for one */
  card: ReactNode;
  /** when and why the key was decided, on the phone */
  decided: ReactNode;
  /** where the tune lies, under the keys of the wide page and under the chart of the phone */
  tune?: ReactNode;
  /** middle and right column of the wide page */
  keys: ReactNode;
  ways: ReactNode;
  /** keeps the chosen way; in the head of the wide page */
  use: ReactNode;
  /** tags, and what can be done with the song besides editing and deleting */
  shelfTools?: ReactNode;
  onRemove: () => void;
  removal: { isPending: boolean; error: Error | null };
}

/** From this width on chart, keys and ways stand in three columns. */
const threeColumnsFrom = 1400;

export function SongScreen({
  song,
  target,
  card,
  decided,
  tune,
  keys,
  ways,
  use,
  shelfTools,
  onRemove,
  removal,
}: SongScreenProps) {
  const layout = useLayout();
  const { width } = useWindowDimensions();
  const [turned, setAsWritten] = useState<boolean | null>(null);
  const wide = layout === "wide";
  // The wide page shows key and ways beside the chart, so it is shown in that key; the phone waits for a decision.
  const asWritten = turned ?? (!wide && target?.decided !== true);
  const chords = useMemo(() => hasChords(song), [song]);
  // Words alone look the same in every key.
  const moved = chords && target !== null && song.writtenKey !== null && target.key.tonic !== song.writtenKey.tonic;
  const to = moved && !asWritten ? target.key : null;
  const params = { id: song.id };
  const targetSign = target && glyphs(keySign(target.key));
  const waysHref = {
    pathname: "/songs/[id]/ways" as const,
    params: target ? { ...params, key: target.key.tonic, shift: String(target.shift) } : params,
  };
  const tools = (
    <View style={{ marginTop: 24 }}>
      {shelfTools}
      <View
        style={{
          flexDirection: "row",
          flexWrap: "wrap",
          columnGap: 8,
          marginLeft: -8,
          alignItems: "flex-start",
        }}
      >
        {!wide && target?.decided !== true && (
          <LinkButton
            kind="text"
            small
            icon="file"
            label="Make the sheet"
            href={{ pathname: "/songs/[id]/sheet", params }}
            testID="to-sheet"
          />
        )}
        {!wide && (
          <LinkButton
            kind="text"
            small
            icon="edit"
            label="Edit the song"
            href={{ pathname: "/songs/[id]/edit", params }}
          />
        )}
        <RemoveSong title={song.title} onRemove={onRemove} busy={removal.isPending} error={removal.error} />
      </View>
    </View>
  );
  const screen = { title: song.title, crumb: { label: "Songs", href: "/songs" as const }, wide: true };
  if (wide) {
    const three = width >= threeColumnsFrom;
    return (
      <Screen
        {...screen}
        subtitle={headWords(song, target?.decided ? targetSign : null)}
        actions={<WideActions id={song.id} use={use} />}
      >
        <View
          style={webStyle({
            display: "grid",
            gridTemplateColumns: three ? "minmax(0, 508fr) 316px minmax(0, 392fr)" : "minmax(0, 1fr) 348px",
            columnGap: 32,
            alignItems: "start",
            borderTop: `1.5px solid ${colors.ink}`,
          })}
        >
          <View style={[{ paddingTop: 14 }, webStyle(three ? {} : { gridRow: "1 / span 2" })]}>
            <View
              style={{
                flexDirection: "row",
                flexWrap: "wrap",
                justifyContent: "space-between",
                alignItems: "baseline",
                columnGap: 12,
                minHeight: 28,
                marginBottom: 6,
              }}
            >
              <Heading level={2}>{chartHeading(song, chords, to)}</Heading>
              {moved && (
                <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
                  <Text variant="small" tone="soft" style={{ fontSize: 13 }}>
                    {asWritten
                      ? `your key is ${targetSign}`
                      : `moved ${shortMove(target.shift)} from ${glyphs(keySign(song.writtenKey ?? target.key))}`}
                  </Text>
                  <Button
                    kind="text"
                    small
                    label={asWritten ? `Show in ${targetSign}` : "Show as written"}
                    onPress={() => setAsWritten(!asWritten)}
                    testID="toggle-key"
                    style={{ marginVertical: -12 }}
                  />
                </View>
              )}
            </View>
            <MovedChart song={song} to={to} size={17} level={3} />
            {tools}
          </View>
          <View
            style={[
              { paddingTop: 14, paddingLeft: 24, marginLeft: -24, borderLeftWidth: 1, borderColor: colors.line },
              webStyle({ alignSelf: "stretch" }),
            ]}
          >
            {keys}
            {tune}
          </View>
          <View style={three ? { paddingTop: 14 } : { paddingTop: 24 }}>{ways}</View>
        </View>
      </Screen>
    );
  }
  return (
    <Screen
      {...screen}
      large
      footer={
        <View style={{ flexDirection: "row", gap: 10 }}>
          <LinkButton
            kind={chords ? "secondary" : "primary"}
            label={chords ? "Keys" : "Keys for your voice"}
            href={{ pathname: "/songs/[id]/keys", params }}
            style={{ flexGrow: 1 }}
            testID="to-keys"
          />
          {chords && (
            <LinkButton
              label={targetSign === null ? "Ways to play it" : `Ways to play it in ${targetSign}`}
              href={waysHref}
              style={{ flexGrow: 3, flexShrink: 1 }}
              testID="to-ways"
            />
          )}
        </View>
      }
    >
      <View style={{ gap: 14 }}>
        {card}
        <View
          style={{
            flexDirection: "row",
            flexWrap: "wrap",
            alignItems: "center",
            justifyContent: "space-between",
            gap: 8,
          }}
        >
          {moved && song.writtenKey && (
            <Segmented
              label="Which key the chart is shown in"
              testID="toggle-key"
              value={asWritten ? "written" : "mine"}
              options={[
                { value: "written", label: `Written in ${glyphs(keySign(song.writtenKey))}` },
                { value: "mine", label: `${target.decided ? "My key" : "Best key"}, ${targetSign}` },
              ]}
              onChange={(shown) => setAsWritten(shown === "written")}
            />
          )}
          {beatWords(song) !== null && (
            <Text variant="small" tone="soft">
              {beatWords(song)}
            </Text>
          )}
        </View>
        <MovedChart song={song} to={to} level={2} />
        {decided}
        {tune}
        {tools}
      </View>
    </Screen>
  );
}

function WideActions({ id, use }: { id: string; use: ReactNode }) {
  return (
    <>
      <LinkButton
        kind="secondary"
        small
        label="Edit"
        href={{ pathname: "/songs/[id]/edit", params: { id } }}
        testID="edit-song"
      />
      <LinkButton
        kind="secondary"
        small
        label="Sheet"
        href={{ pathname: "/songs/[id]/sheet", params: { id } }}
        testID="to-sheet"
      />
      {use}
    </>
  );
}

function chartHeading(song: Song, chords: boolean, to: KeyName | null): string {
  if (!chords) return song.chart.trim() === "" ? "Chart" : "Words";
  const key = to ?? song.writtenKey;
  return key ? `Chart in ${glyphs(keySign(key))}` : "Chart";
}
