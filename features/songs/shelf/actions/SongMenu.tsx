import { useState } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import type { IconName } from "@/features/ui/Icon";
import { RemoveSong } from "../../RemoveSong";
import { ExportChoices } from "../../exchange/ExportChoices";
import { Dialog } from "@/features/ui/Dialog";
import { TagEditor } from "./TagEditor";
import type { ActedOn, SongActions } from "./useSongActions";

export interface SongMenuProps {
  song: ActedOn & { tags: readonly string[] };
  actions: SongActions;
  onClose: () => void;
}

/** Everything that can be done with a song without opening it. */
export function SongMenu({ song, actions, onClose }: SongMenuProps) {
  const [part, setPart] = useState<"menu" | "tags" | "export">("menu");
  const and = (work: (song: ActedOn) => void) => () => {
    onClose();
    work(song);
  };
  const item = (label: string, icon: IconName, onPress: () => void, testID: string) => (
    <Button
      kind="text"
      small
      icon={icon}
      label={label}
      onPress={onPress}
      testID={testID}
      style={{ justifyContent: "flex-start" }}
    />
  );
  if (part === "tags")
    return (
      <Dialog key="tags" title={`Tags of “${song.title}”`} onClose={onClose} testID="tag-dialog">
        <TagEditor id={song.id} tags={song.tags} />
      </Dialog>
    );
  if (part === "export")
    return (
      <Dialog key="export" title={`Export “${song.title}”`} onClose={onClose} testID="export-dialog">
        <ExportChoices count={1} ids={() => [song.id]} />
      </Dialog>
    );
  return (
    <Dialog key="menu" title={song.title} onClose={onClose} testID="song-menu">
      <View style={{ alignItems: "flex-start" }}>
        {item("Tags", "bookmark", () => setPart("tags"), "menu-tags")}
        {item("Played today", "check", and(actions.played), "menu-played")}
        {item("Duplicate", "plus", and(actions.duplicate), "menu-duplicate")}
        {item("Export", "file", () => setPart("export"), "menu-export")}
        {song.archivedAt === null
          ? item("Put aside", "down", and(actions.archive), "menu-archive")
          : item("Back to the shelf", "up", and(actions.restore), "menu-restore")}
        <RemoveSong
          title={song.title}
          onRemove={() => actions.remove(song, onClose)}
          busy={actions.removal.isPending}
          error={actions.removal.error}
        />
      </View>
    </Dialog>
  );
}
