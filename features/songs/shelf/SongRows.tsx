import { Link } from "expo-router";
import { memo, useMemo } from "react";
import type { TextStyle } from "react-native";
import { View } from "react-native";
import { KeySign } from "@/features/ui/KeySign";
import { Text } from "@/features/ui/Text";
import { fonts } from "@/features/ui/theme";
import { useLayout } from "@/features/ui/useLayout";
import { webStyle } from "@/features/ui/webStyle";
import type { SongListing } from "@/shared/contract/songListing";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { RowChoice, RowMenuButton, type RowActions } from "./RowTools";
import { listingWords, playedWords, shownKey, spanWords, sungSpan, type ShelfKey } from "./shelfRow";
import { SpanBar } from "@/features/span/SpanBar";
import { shelfScale } from "./shelfScale";
import { ShownCards } from "@/features/ui/table/ShownCards";
import { useShownRows } from "@/features/ui/table/useShownRows";

export interface SongRowsProps {
  songs: readonly SongListing[];
  total: number;
  more: () => void;
  voice: SingingVoice | null;
  mineOf: (song: SongListing) => ShelfKey | null;
  fitOf: ((song: SongListing) => number | null) | null;
  actions: RowActions;
}

/** The songs as rows, for phones: as many as are in sight, with their place in the whole list. */
export function SongRows({ songs, total, more, ...row }: SongRowsProps) {
  const keys = useMemo(() => songs.map(({ id }) => id), [songs]);
  const shown = useShownRows(keys, 112, more);
  return (
    <ShownCards {...shown} total={total} testID="songs">
      {(index) => {
        const song = songs[index];
        return song ? <SongRow song={song} {...row} /> : null;
      }}
    </ShownCards>
  );
}

/** Drawn once, however often the list is scrolled. */
const SongRow = memo(function SongRow({
  song,
  voice,
  mineOf,
  fitOf,
  actions,
}: Omit<SongRowsProps, "songs" | "total" | "more"> & { song: SongListing }) {
  const phone = useLayout() === "phone";
  const mine = mineOf(song);
  const key = shownKey(song, mine);
  const span = voice && sungSpan(song, mine, voice);
  const fit = fitOf?.(song) ?? null;
  const played = playedWords(song.playedAt, new Date());
  const facts = [mine && `${mine.words}.`, listingWords(song, mine), played !== "" && `Played ${played}.`];
  return (
    <View style={{ flexDirection: "row", alignItems: "center" }}>
      <RowChoice song={song} actions={actions} />
      <Link
        href={{ pathname: "/songs/[id]", params: { id: song.id } }}
        testID={`song-${song.id}`}
        style={[
          {
            flexDirection: "row",
            alignItems: "center",
            gap: 12,
            minHeight: 72,
            paddingVertical: 12,
            flexGrow: 1,
            flexShrink: 1,
            flexBasis: 0,
            minWidth: 0,
          } as TextStyle,
          webStyle({ display: "flex" }),
        ]}
      >
        <View style={{ width: 44, flexShrink: 0 }} aria-hidden>
          {key ? (
            <KeySign of={key} size={26} tone={mine ? "ink" : "soft"} stacked />
          ) : (
            <Text tone="soft" style={{ fontFamily: fonts.display, fontWeight: "700", fontSize: 26, lineHeight: 30 }}>
              –
            </Text>
          )}
        </View>
        <View
          style={{
            flexGrow: 1,
            flexShrink: 1,
            flexBasis: 0,
            minWidth: 0,
            flexDirection: phone ? "column" : "row",
            alignItems: phone ? "flex-start" : "center",
            columnGap: 24,
            rowGap: 6,
          }}
        >
          <View style={phone ? { alignSelf: "stretch" } : { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>
            <Text variant="strong">{song.title}</Text>
            <Text variant="small" tone="soft">
              {facts.filter(Boolean).join(" ")}
            </Text>
            {song.tags.length > 0 && (
              <Text variant="tiny" tone="plum">
                {song.tags.join(" · ")}
              </Text>
            )}
          </View>
          {voice && span && (
            <View style={{ flexDirection: "row", alignItems: "center", gap: 10 }}>
              <SpanBar voice={voice} span={span} scale={shelfScale(voice)} width={150} words={spanWords(span, key)} />
              {fit !== null && (
                <Text variant="small" tone="soft" testID="fit">
                  {`fit ${fit}`}
                </Text>
              )}
            </View>
          )}
        </View>
      </Link>
      <RowMenuButton song={song} actions={actions} />
    </View>
  );
});
