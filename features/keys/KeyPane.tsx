import { Link } from "expo-router";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import { DecisionCard } from "./decision/DecisionCard";
import { KeyColumn } from "./KeyColumn";
import { FixedLine } from "./FixedLine";
import type { KeyRow } from "./keyRows";
import { KeysMissing } from "./KeysMissing";
import { partWords } from "./partWords";
import { ReachLine } from "./ReachLine";
import { forWords } from "./songWords";
import { TriedLine } from "./tryout/kept/TriedLine";
import { decidedWords, type SongKeys } from "./useSongKeys";

export interface KeyPaneProps {
  song: Song;
  keys: SongKeys;
  singer: { id: string; name: string } | null;
  selected: KeyRow | null;
  onSelect: (shift: number) => void;
}

/** The middle column of a wide song page. */
export function KeyPane({ song, keys, singer, selected, onSelect }: KeyPaneProps) {
  const { rows, voice, noFit } = keys;
  return (
    <View testID="key-pane">
      <View
        style={{
          flexDirection: "row",
          justifyContent: "space-between",
          alignItems: "baseline",
          minHeight: 28,
          marginBottom: 10,
        }}
      >
        <Heading level={2}>Keys</Heading>
        {singer && (
          <Text variant="small" tone="soft" style={{ fontSize: 13 }}>
            {forWords(singer.name)}
          </Text>
        )}
      </View>
      {rows && voice ? (
        <>
          <ReachLine voice={voice} voiceId={singer?.id ?? null} />
          <TriedLine songId={song.id} tried={keys.tried} />
          <FixedLine songId={song.id} fixed={keys.fixed} />
          {noFit !== null && (
            <Text variant="small" testID="no-key-fits" style={{ marginBottom: 8 }}>
              {noFit}
            </Text>
          )}
          <KeyColumn
            rows={rows}
            voice={voice}
            selected={selected}
            onSelect={(row) => onSelect(row.shift)}
            markOf={(row) => decidedWords(keys, row.shift)}
          />
          {selected && (
            <Text variant="small" style={{ paddingTop: 8 }}>
              <Text style={{ fontWeight: "600" }}>{`What makes ${selected.score}: `}</Text>
              {partWords(selected.parts, selected)}
              {selected.coarse ? " Coarse, because only the span of the tune is known." : ""}{" "}
              <Link
                href={{ pathname: "/songs/[id]/keys", params: { id: song.id } }}
                style={webStyle(link)}
                testID="all-twelve"
              >
                All twelve side by side
              </Link>
            </Text>
          )}
        </>
      ) : (
        <KeysMissing song={song} />
      )}
      <DecisionCard keys={keys} style={{ marginTop: 12 }} />
    </View>
  );
}

const link = {
  color: "var(--plum)",
  fontWeight: 600,
  textDecorationLine: "underline",
  textUnderlineOffset: 3,
} as const;
