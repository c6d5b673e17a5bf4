import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import type { Song } from "@/shared/contract/song";
import type { SongVersionEntry } from "@/shared/contract/songVersion";
import { MovedChart } from "../../MovedChart";
import { changedLines, changeWords, type ChangedLine } from "./songChanges";
import { versionQueries } from "./versionQueries";

export interface VersionRowProps {
  /** as it stands now */
  song: Song;
  entry: SongVersionEntry;
  /** says what differs from now without being opened */
  told: boolean;
  open: boolean;
  onOpen: () => void;
  busy: boolean;
  onRestore: (earlier: Song) => void;
}

const when = new Intl.DateTimeFormat("en-GB", { dateStyle: "medium", timeStyle: "short" });

export function VersionRow({ song, entry, told, open, onOpen, busy, onRestore }: VersionRowProps) {
  const version = useQuery({ ...versionQueries.detail(song.id, entry.id), enabled: told });
  const by = entry.by === "" ? "on this device" : `by ${entry.by}`;
  const at = when.format(new Date(entry.savedAt));
  const changes = version.data ? changeWords(version.data.song, song) : null;
  return (
    <View
      role="listitem"
      testID="version"
      style={{ borderBottomWidth: 1, borderColor: colors.line, paddingVertical: 10, gap: 4 }}
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
          label={open ? "Close" : "Look at it"}
          accessibleName={`${open ? "Close" : "Look at it"}: ${entry.title}, ${at}`}
          expanded={open}
          onPress={onOpen}
          testID="look-at-version"
        />
      </View>
      {open && (
        <QueryState query={version} title="This version could not be opened">
          {({ song: earlier }) => (
            <View style={{ gap: 16, paddingVertical: 8 }}>
              <Button
                small
                label="Restore this version"
                busy={busy}
                onPress={() => onRestore(earlier)}
                testID="restore"
                style={{ alignSelf: "flex-start" }}
              />
              <Lines lines={changedLines(earlier.chart, song.chart)} />
              <Heading level={2} size={16}>
                As it stood then
              </Heading>
              <MovedChart song={earlier} to={null} level={3} />
            </View>
          )}
        </QueryState>
      )}
    </View>
  );
}

const marks = { same: " ", gone: "−", new: "+" } as const;
const words = { same: "", gone: "only then: ", new: "only now: " } as const;

/** What stood then and what stands now, line by line. */
function Lines({ lines }: { lines: readonly (ChangedLine | null)[] }) {
  if (lines.length === 0) return null;
  return (
    <View style={{ gap: 4 }}>
      <Text variant="small" tone="soft">
        Then (−) and now (+)
      </Text>
      <div
        tabIndex={0}
        role="group"
        aria-label="Lines that differ"
        style={{ overflowX: "auto", border: `1px solid ${colors.line}`, borderRadius: 10, padding: "8px 0" }}
      >
        {lines.map((line, index) => (
          <div
            key={index}
            style={{
              font: `400 14px/20px ${fonts.mono}`,
              whiteSpace: "pre",
              padding: "0 12px",
              width: "max-content",
              minWidth: "100%",
              boxSizing: "border-box",
              color: line === null || line.kind === "same" ? colors.inkSoft : colors.ink,
              background: line?.kind === "new" ? "var(--tint)" : line?.kind === "gone" ? "var(--warm)" : "transparent",
            }}
          >
            {line === null ? (
              "…"
            ) : (
              <>
                <span aria-label={words[line.kind]}>{`${marks[line.kind]} `}</span>
                {line.text}
              </>
            )}
          </div>
        ))}
      </div>
    </View>
  );
}
