import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import type { Song } from "@/shared/contract/song";
import { ExportChoices } from "../../exchange/ExportChoices";
import { DoneBar } from "./DoneBar";
import { Dialog } from "@/features/ui/Dialog";
import { TagEditor } from "./TagEditor";
import { useSongActions } from "./useSongActions";

/** On the page of a song: its tags, and what can be done with it besides editing and deleting. */
export function SongTools({ song }: { song: Song }) {
  const actions = useSongActions();
  const [open, setOpen] = useState<"tags" | "export" | null>(null);
  return (
    <View style={{ gap: 4 }}>
      {song.tags.length > 0 && (
        <Text variant="small" tone="plum" testID="song-tags">
          {song.tags.join(" · ")}
        </Text>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, marginLeft: -8 }}>
        <Button
          kind="text"
          small
          icon="check"
          label="Played today"
          onPress={() => actions.played(song)}
          testID="played"
        />
        <Button kind="text" small icon="bookmark" label="Tags" onPress={() => setOpen("tags")} testID="edit-tags" />
        <Button
          kind="text"
          small
          icon="plus"
          label="Duplicate"
          onPress={() => actions.duplicate(song)}
          testID="duplicate"
        />
        <Button kind="text" small icon="file" label="Export" onPress={() => setOpen("export")} testID="export" />
        {song.archivedAt === null ? (
          <Button
            kind="text"
            small
            icon="down"
            label="Put aside"
            onPress={() => actions.archive(song)}
            testID="archive"
          />
        ) : (
          <Button
            kind="text"
            small
            icon="up"
            label="Back to the shelf"
            onPress={() => actions.restore(song)}
            testID="restore"
          />
        )}
      </View>
      {open === "tags" && (
        <Dialog title={`Tags of “${song.title}”`} onClose={() => setOpen(null)} testID="tag-dialog">
          <TagEditor id={song.id} tags={song.tags} />
        </Dialog>
      )}
      {open === "export" && (
        <Dialog title={`Export “${song.title}”`} onClose={() => setOpen(null)} testID="export-dialog">
          <ExportChoices count={1} ids={() => [song.id]} />
        </Dialog>
      )}
      <DoneBar actions={actions} />
    </View>
  );
}
