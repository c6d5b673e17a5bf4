import { View } from "react-native";
import { Button } from "@/features/ui/Button";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { sameKey } from "../../sameKey";
import { moveSentence, type RankMove, whatMoved } from "./rankMoves";

export interface RankNowProps {
  moves: readonly RankMove[];
  /** the key that was tried */
  shift: number;
  sign: string;
  /** why it moved, in sentences */
  why: readonly string[];
  /** it waits on this device for the connection */
  waiting: boolean;
  undoing: boolean;
  onUndo: () => void;
}

const shown = 5;

/** The keys as they stand with this try, what moved, why, and the way back. */
export function RankNow({ moves, shift, sign, why, waiting, undoing, onUndo }: RankNowProps) {
  const best = moves.slice(0, shown);
  const tried = moves.find(({ row }) => sameKey(row.shift, shift));
  const rows = tried && !best.includes(tried) ? [...best, tried] : best;
  return (
    <View role="region" aria-label="The keys as they stand now" style={{ gap: 10 }} testID="rank-now">
      <Heading level={2}>The keys as they stand now</Heading>
      {waiting && (
        <Notice kind="offline" testID="try-waiting">
          Kept on this device. It is sent to your account when the connection is back.
        </Notice>
      )}
      <View style={{ gap: 4 }} testID="rank-moved">
        {whatMoved(moves, shift).map((sentence) => (
          <Text key={sentence}>{sentence}</Text>
        ))}
        {why.map((sentence) => (
          <Text key={sentence} variant="small" tone="soft">
            {sentence}
          </Text>
        ))}
      </View>
      <View role="list" style={{ borderTopWidth: 1, borderColor: colors.line }}>
        {rows.map((move) => (
          <View
            key={move.row.shift}
            role="listitem"
            aria-label={moveSentence(move)}
            testID={`rank-${move.row.key.tonic}`}
            style={{
              flexDirection: "row",
              alignItems: "center",
              gap: 12,
              minHeight: 44,
              paddingHorizontal: 8,
              borderBottomWidth: 1,
              borderColor: colors.line,
              borderLeftWidth: 4,
              borderLeftColor: sameKey(move.row.shift, shift) ? colors.plum : "transparent",
              backgroundColor: sameKey(move.row.shift, shift) ? mixtures.selected : "transparent",
            }}
          >
            <Text tone="soft" style={{ width: 24, flexShrink: 0 }}>
              {move.place}
            </Text>
            <Text variant="title" style={{ width: 56, flexShrink: 0 }}>
              {move.row.sign}
            </Text>
            <Text variant="small" tone="soft" style={{ flexGrow: 1, flexShrink: 1 }}>
              {sameKey(move.row.shift, shift) ? "tried just now" : changeWords(move)}
            </Text>
            {move.scoreBefore !== move.row.score && (
              <Text variant="small" tone="soft" style={{ flexShrink: 0 }}>{`${move.scoreBefore} →`}</Text>
            )}
            <Text variant="strong" tone={move.row.beyond ? "brick" : "ink"} style={{ width: 32, textAlign: "right" }}>
              {move.row.score}
            </Text>
          </View>
        ))}
      </View>
      <Button
        kind="text"
        small
        icon="undo"
        label={`Take this try of ${sign} out again`}
        busy={undoing}
        onPress={onUndo}
        testID="try-undo"
        style={{ alignSelf: "flex-start" }}
      />
      <Text variant="tiny" tone="soft">
        Then keys and comfort band are as they were without it.
      </Text>
    </View>
  );
}

function changeWords({ place, placeBefore }: RankMove): string {
  if (place === placeBefore) return "same place";
  const by = Math.abs(place - placeBefore);
  return `${by} ${by === 1 ? "place" : "places"} ${place < placeBefore ? "up" : "down"}`;
}
