import { View } from "react-native";
import { IconButton } from "@/features/ui/IconButton";
import type { SongEdits } from "./useSongEdits";

/** Back and forth through everything that was typed and done. */
export function EditTools({ edits, children }: { edits: SongEdits; children?: React.ReactNode }) {
  return (
    <View style={{ flexDirection: "row", alignItems: "center", gap: 4, flexShrink: 1 }}>
      <IconButton icon="undo" label="Undo" disabled={!edits.canUndo} onPress={edits.undo} testID="undo" />
      <IconButton icon="redo" label="Redo" disabled={!edits.canRedo} onPress={edits.redo} testID="redo" />
      {children}
    </View>
  );
}
