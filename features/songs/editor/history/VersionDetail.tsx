import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import type { Song } from "@/shared/contract/song";
import { MovedChart } from "../../MovedChart";
import { changedLines, type ChangedLine } from "./songChanges";
import { versionQueries } from "./versionQueries";

export interface VersionDetailProps {
  /** as it stands now */
  song: Song;
  versionId: string;
  busy: boolean;
  onRestore: (earlier: Song) => void;
}

/** What stands in an earlier version, how it differs from now, and the way back to it. */
export function VersionDetail({ song, versionId, busy, onRestore }: VersionDetailProps) {
  return (
    <QueryState query={useQuery(versionQueries.detail(song.id, versionId))} title="This version could not be opened">
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
