import { useQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Song } from "@/shared/contract/song";
import type { SongVersionEntry } from "@/shared/contract/songVersion";
import { changeWords } from "./songChanges";
import { versionQueries } from "./versionQueries";

export interface VersionRowProps {
  /** as it stands now */
  song: Song;
  entry: SongVersionEntry;
  /** says what differs from now without being opened */
  told: boolean;
  open: boolean;
  /** it stands open beside the list, and is marked there */
  beside: boolean;
  onOpen: () => void;
  /** what stands in it, where it opens under its row */
  children?: ReactNode;
}

const when = new Intl.DateTimeFormat("en-GB", { dateStyle: "medium", timeStyle: "short" });

/** One earlier version in the list: when, by whom, and what became of it since. */
export function VersionRow({ song, entry, told, open, beside, onOpen, children }: VersionRowProps) {
  const version = useQuery({ ...versionQueries.detail(song.id, entry.id), enabled: told });
  const by = entry.by === "" ? "on this device" : `by ${entry.by}`;
  const at = when.format(new Date(entry.savedAt));
  const changes = version.data ? changeWords(version.data.song, song) : null;
  return (
    <View
      role="listitem"
      testID="version"
      style={[
        { borderBottomWidth: 1, borderColor: colors.line, paddingVertical: 10, gap: 4 },
        open &&
          beside && { backgroundColor: colors.card, borderLeftWidth: 4, borderLeftColor: colors.plum, paddingLeft: 10 },
      ]}
    >
      <View style={{ flexDirection: "row", alignItems: "center", gap: 8 }}>
        <View style={{ flexGrow: 1, flexShrink: 1, gap: 2 }}>
          <Text variant="strong">{entry.title}</Text>
          <Text variant="small" tone="soft">{`${at}, ${by}`}</Text>
          {changes && (
            <Text variant="small">
              {changes.length === 0 ? "The same as now" : `From then to now: ${changes.join("; ")}`}
            </Text>
          )}
        </View>
        <Button
          kind="text"
          small
          label={open && !beside ? "Close" : "Look at it"}
          accessibleName={`${open && !beside ? "Close" : "Look at it"}: ${entry.title}, ${at}`}
          expanded={open}
          onPress={onOpen}
          testID="look-at-version"
        />
      </View>
      {children}
    </View>
  );
}
