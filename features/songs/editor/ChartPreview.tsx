import { memo, useEffect, useMemo, useRef } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Chart } from "@/shared/songs/chart";
import { ChartView } from "../ChartView";
import { firstLines, shownPlace } from "../shownLines";

/** So much is drawn while one types; the page of the song shows all. */
const most = 200;

export interface ChartPreviewProps {
  chart: Chart;
  /** the row that the caret stands in, from 0; null where it is not followed */
  row: number | null;
  /** px; the chart goes along inside of it. null: as long as it is */
  height: number | null;
}

/** How a chart reads while it is typed. Drawn anew only when the chart changed; goes along with the caret. */
export const ChartPreview = memo(function ChartPreview({ chart, row, height }: ChartPreviewProps) {
  const { shown, rest } = firstLines(chart, most);
  const place = useMemo(() => (row === null ? null : shownPlace(chart, row)), [chart, row]);
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const line = box.current?.querySelector<HTMLElement>("[data-marked]");
    if (!box.current || !line || height === null) return;
    const frame = box.current.getBoundingClientRect();
    const at = line.getBoundingClientRect();
    if (at.top >= frame.top + 24 && at.bottom <= frame.bottom - 24) return;
    box.current.scrollTop += at.top - frame.top - frame.height / 3;
  }, [place, height, chart]);
  return (
    <View style={{ gap: 10 }} testID="preview">
      <Heading level={2} size={16}>
        How it reads
      </Heading>
      <div
        ref={box}
        {...(height === null ? null : { tabIndex: 0, role: "region", "aria-label": "How the chart reads" })}
        style={{
          borderTop: `1px solid ${colors.line}`,
          padding: "12px 0 12px 12px",
          marginLeft: -12,
          ...(height === null ? null : { height, overflowY: "auto" }),
        }}
      >
        {chart.sections.some((section) => section.lines.some((line) => line.kind !== "blank")) ? (
          <ChartView chart={chart} level={3} most={most} marked={place} />
        ) : (
          <Text variant="small" tone="soft">
            Here the chords stand over their syllables as soon as there is a line of them.
          </Text>
        )}
        {rest > 0 && (
          <Text variant="small" tone="soft" testID="preview-rest">
            {`These are the first ${shown} lines. The rest is kept as typed; all of it is shown on the song's own page.`}
          </Text>
        )}
      </div>
    </View>
  );
});
