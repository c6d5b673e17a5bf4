import { Link } from "expo-router";
import { useState, type ReactNode } from "react";
import { View, type TextStyle } from "react-native";
import { EmptyState } from "@/features/ui/EmptyState";
import { Field } from "@/features/ui/Field";
import { Icon } from "@/features/ui/Icon";
import { KeySign } from "@/features/ui/KeySign";
import { LinkButton } from "@/features/ui/LinkButton";
import { LiveText } from "@/features/ui/LiveText";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { songFacts, songsNamed } from "../songFacts";

/** What the shelf shows of the key that was decided for a song. */
export interface ShelfKey {
  key: KeyName;
  /** such as "My key, a whole tone under the chart" */
  words: string;
  strip: ReactNode;
}

export interface SongShelfProps {
  songs: readonly Song[];
  myKey: (song: Song) => ShelfKey | null;
}

/** All songs, with a field that searches titles and words. */
export function SongShelf({ songs, myKey }: SongShelfProps) {
  const [search, setSearch] = useState("");
  if (songs.length === 0)
    return (
      <EmptyState
        testID="no-songs"
        title="No songs yet"
        text="Here stand the songs you sing, each with its chords, your key and how you play it. Paste a chart or type one in."
        action={<LinkButton href="/songs/new" label="Add a song" icon="plus" small />}
      />
    );
  const found = songsNamed(songs, search);
  return (
    <View style={{ gap: 16 }}>
      <Field
        label="Search your songs"
        value={search}
        onChangeText={setSearch}
        inputMode="search"
        testID="song-search"
      />
      <LiveText hidden>
        {search.trim() === "" ? "" : `${found.length} ${found.length === 1 ? "song" : "songs"} found`}
      </LiveText>
      {found.length === 0 ? (
        <Text tone="soft">{`No title and no line holds “${search.trim()}”. Try a word from the chorus.`}</Text>
      ) : (
        <View role="list" testID="songs">
          {found.map((song) => (
            <View role="listitem" key={song.id} style={{ borderBottomWidth: 1, borderColor: colors.line }}>
              <SongRow song={song} mine={myKey(song)} />
            </View>
          ))}
        </View>
      )}
    </View>
  );
}

function SongRow({ song, mine }: { song: Song; mine: ShelfKey | null }) {
  const facts = songFacts(song);
  const key = mine?.key ?? song.writtenKey;
  return (
    <Link
      href={{ pathname: "/songs/[id]", params: { id: song.id } }}
      testID={`song-${song.id}`}
      style={[
        { flexDirection: "row", alignItems: "center", gap: 12, minHeight: 72, paddingVertical: 12 } as TextStyle,
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
          flexDirection: "row",
          flexWrap: "wrap",
          alignItems: "center",
          columnGap: 24,
          rowGap: 6,
        }}
      >
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 200, minWidth: 0 }}>
          <Text variant="strong">{song.title}</Text>
          <Text variant="small" tone="soft">
            {[mine && `${mine.words}.`, facts.line].filter((part) => part !== null).join(" ")}
          </Text>
        </View>
        {mine?.strip}
      </View>
      <Icon name="forward" color={colors.plum} />
    </Link>
  );
}
