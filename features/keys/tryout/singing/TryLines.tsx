import { useEffect, useRef, useState, type ReactNode } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { ChartLine } from "@/shared/songs/chart";
import type { TimedLine } from "./songLines";

export interface TryLinesProps {
  lines: readonly TimedLine[];
  /** time of the plan now; null while it stands still */
  planNow: () => number | null;
  /** a line of the chart, chords over its syllables */
  draw: (line: ChartLine) => ReactNode;
  /** lines shown */
  most: number;
}

/** The line that is sung now, how far it has come, and the lines that follow. */
export function TryLines({ lines, planNow, draw, most }: TryLinesProps) {
  const [index, setIndex] = useState(0);
  const bar = useRef<View>(null);
  useEffect(() => {
    let frame = requestAnimationFrame(function look() {
      frame = requestAnimationFrame(look);
      const at = planNow() ?? 0;
      const now = Math.max(
        0,
        lines.findLastIndex((line) => line.at <= at + 0.25),
      );
      setIndex(now);
      const line = lines[now];
      const element = bar.current as unknown as HTMLElement | null;
      if (!line || !element) return;
      const share = Math.min(1, Math.max(0, (at - line.at) / (line.end - line.at)));
      element.style.transform = `scaleX(${share.toFixed(3)})`;
    });
    return () => cancelAnimationFrame(frame);
  }, [lines, planNow]);
  if (lines.length === 0) return null;
  return (
    <View style={{ gap: 8 }} testID="try-lines">
      {lines.slice(index, index + most).map(({ line }, k) => (
        <View key={index + k} style={{ opacity: k === 0 ? 1 : 0.72 }}>
          {draw(line)}
          {k === 0 && (
            <View style={{ height: 3, borderRadius: 2, backgroundColor: colors.line, overflow: "hidden" }}>
              <View
                ref={bar}
                style={{ height: 3, backgroundColor: colors.plum, transform: [{ scaleX: 0 }], transformOrigin: "left" }}
              />
            </View>
          )}
        </View>
      ))}
      {index + most < lines.length ? null : (
        <Text variant="tiny" tone="soft">
          {index === lines.length - 1 ? "The last line." : " "}
        </Text>
      )}
    </View>
  );
}
