import { View } from "react-native";
import { IconButton } from "@/features/ui/IconButton";
import { colors, sizes } from "@/features/ui/theme";
import type { SongListing } from "@/shared/contract/songListing";

/** What a row can ask for. */
export interface RowActions {
  /** opens what can be done with a song */
  onMenu: (song: SongListing) => void;
  /** the songs that are chosen; null while none are being chosen */
  chosen: ReadonlySet<string> | null;
  onChoose: (song: SongListing, on: boolean) => void;
}

export function RowMenuButton({ song, actions }: { song: SongListing; actions: RowActions }) {
  return (
    <IconButton
      icon="more"
      label={`More for ${song.title}`}
      onPress={() => actions.onMenu(song)}
      color={colors.inkSoft}
      testID={`menu-${song.id}`}
    />
  );
}

/** The box that chooses a song, while songs are being chosen. */
export function RowChoice({ song, actions: { chosen, onChoose } }: { song: SongListing; actions: RowActions }) {
  if (chosen === null) return null;
  return (
    <View style={{ width: sizes.target, height: sizes.target, flexShrink: 0 }}>
      <label style={{ display: "flex", width: "100%", height: "100%", alignItems: "center", justifyContent: "center" }}>
        <input
          type="checkbox"
          aria-label={`Choose ${song.title}`}
          checked={chosen.has(song.id)}
          onChange={(event) => onChoose(song, event.target.checked)}
          data-testid={`choose-${song.id}`}
          style={{ width: 22, height: 22, accentColor: colors.plum }}
        />
      </label>
    </View>
  );
}
