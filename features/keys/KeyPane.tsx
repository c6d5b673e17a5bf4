import { Link } from "expo-router";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { webStyle } from "@/features/ui/webStyle";
import type { Song } from "@/shared/contract/song";
import { DecidedLine } from "./DecidedLine";
import { KeyColumn } from "./KeyColumn";
import type { KeyRow } from "./keyRows";
import { KeysMissing } from "./KeysMissing";
import { partWords } from "./partWords";
import type { SongKeys } from "./useSongKeys";

export interface KeyPaneProps {
  song: Song;
  keys: SongKeys;
  singer: { name: string } | null;
  selected: KeyRow | null;
  onSelect: (shift: number) => void;
}

/** The middle column of a wide song page. */
export function KeyPane({
  song,
  keys: { rows, voice, decision, saving, undo },
  singer,
  selected,
  onSelect,
}: KeyPaneProps) {
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
            {`for ${singer.name}`}
          </Text>
        )}
      </View>
      {rows && voice ? (
        <>
          <KeyColumn rows={rows} voice={voice} selected={selected} onSelect={(row) => onSelect(row.shift)} />
          {selected && (
            <Text variant="small" style={{ paddingTop: 8 }}>
              <Text style={{ fontWeight: "600" }}>{`What makes ${selected.score}: `}</Text>
              {partWords(selected.parts)}
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
      {decision && (
        <View style={{ marginTop: 12 }}>
          <DecidedLine decision={decision} saving={saving} onUndo={undo} />
        </View>
      )}
    </View>
  );
}

const link = {
  color: "var(--plum)",
  fontWeight: 600,
  textDecorationLine: "underline",
  textUnderlineOffset: 3,
} as const;
