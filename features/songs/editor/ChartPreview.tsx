import { memo } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Chart } from "@/shared/songs/chart";
import { ChartView } from "../ChartView";
import { firstLines } from "../shownLines";

/** So much is drawn while one types; the page of the song shows all. */
const most = 200;

/** How a chart reads while it is typed. Drawn anew only when the chart changed. */
export const ChartPreview = memo(function ChartPreview({ chart }: { chart: Chart }) {
  const { rest } = firstLines(chart, most);
  return (
    <View style={{ gap: 10, borderTopWidth: 1, borderColor: colors.line, paddingTop: 12 }} testID="preview">
      <Heading level={2} size={16}>
        How it reads
      </Heading>
      {chart.sections.some((section) => section.lines.some((line) => line.kind !== "blank")) ? (
        <ChartView chart={chart} level={3} most={most} />
      ) : (
        <Text variant="small" tone="soft">
          Here the chords stand over their syllables as soon as there is a line of them.
        </Text>
      )}
      {rest > 0 && (
        <Text variant="small" tone="soft" testID="preview-rest">
          {`These are the first ${most} lines. The rest is kept as typed; all of it is shown when the song is saved.`}
        </Text>
      )}
    </View>
  );
});
