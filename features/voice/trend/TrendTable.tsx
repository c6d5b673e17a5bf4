import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { bandWords, effortWords, warmedWords } from "../noteWords";
import type { TrendPoint } from "./trendPoints";

export interface TrendTableProps {
  /** newest first */
  points: readonly TrendPoint[];
}

const heads = ["When", "Range", "Comfort", "How"] as const;
const widths = [1.1, 1, 1, 1.4];

/** The picture over time, in words. */
export function TrendTable({ points }: TrendTableProps) {
  return (
    <View role="table" aria-label="Takes over time" testID="trend-table">
      <View role="row" style={{ flexDirection: "row", gap: 8, paddingVertical: 6 }}>
        {heads.map((head, k) => (
          <View key={head} role="columnheader" style={{ flex: widths[k] }}>
            <Text variant="small" style={{ fontWeight: "600" }}>
              {head}
            </Text>
          </View>
        ))}
      </View>
      {points.map((point) => (
        <View
          key={point.id}
          role="row"
          style={{ flexDirection: "row", gap: 8, paddingVertical: 6, borderTopWidth: 1, borderColor: colors.line }}
        >
          {cellsOf(point).map((words, k) => (
            <View key={heads[k]} role="cell" style={{ flex: widths[k] }}>
              <Text variant="small">{words}</Text>
            </View>
          ))}
        </View>
      ))}
    </View>
  );
}

function cellsOf({ at, dayTime, range, comfort, warmedUp, effort, held }: TrendPoint): string[] {
  const date = new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short", year: "numeric" }).format(at);
  const how = [
    held ? "guided hold" : "phrase",
    warmedWords(warmedUp),
    effort && `${effort} of 5, ${effortWords[effort - 1]}`,
  ];
  return [`${date}, ${dayTime}`, bandWords(range), bandWords(comfort), how.filter(Boolean).join(", ")];
}
