import { View } from "react-native";
import { Notice } from "@/features/ui/Notice";
import { Select } from "@/features/ui/Select";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { StudioGroup } from "@/shared/contract/studio/group";
import type { Piece } from "../judge/piece";
import { EmptyShelf, SongSelect, type SongSelectProps } from "../SongSelect";

export interface SongAndGroupProps extends Omit<SongSelectProps, "testID"> {
  piece: Piece | null;
  groups: readonly StudioGroup[];
  groupId: string | null;
  onGroup: (id: string | null) => void;
}

/** Which song, and who sings it together. */
export function SongAndGroup({ songs, songId, onSong, piece, groups, groupId, onGroup }: SongAndGroupProps) {
  const phone = useLayout() === "phone";
  if (songs.length === 0) return <EmptyShelf text="Keys are found for songs of your own shelf. Add one first." />;
  const half = phone ? null : { flexGrow: 1, flexBasis: 0, maxWidth: 420 };
  return (
    <View style={{ gap: 12 }}>
      <View style={{ flexDirection: phone ? "column" : "row", gap: 12 }}>
        <View style={half}>
          <SongSelect songs={songs} songId={songId} onSong={onSong} testID="key-song" />
        </View>
        <View style={half}>
          <Select
            label="Who sings it"
            options={[{ value: "", label: "Everybody" }, ...groups.map(({ id, name }) => ({ value: id, label: name }))]}
            value={groupId ?? ""}
            onChange={(id) => onGroup(id === "" ? null : id)}
            testID="key-group"
          />
        </View>
      </View>
      {songId === null && (
        <Text tone="soft" style={{ maxWidth: 560 }}>
          Every key is held against every voice that sings. The fairest is the one in which the worst-off singer sings
          best.
        </Text>
      )}
      {songId !== null && piece === null && (
        <Notice kind="caution">This song has no key yet. Open it and say in which key it is written.</Notice>
      )}
    </View>
  );
}
