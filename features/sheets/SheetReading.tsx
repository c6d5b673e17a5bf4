import { useMemo, useState } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { letterSizes, type Sheet, type SheetOptions } from "@/shared/sheets/sheet";
import { sheetRows } from "@/shared/sheets/sheetChart";
import { sheetFacts } from "@/shared/sheets/sheetHead";
import { SheetGrids } from "./SheetGrids";
import { columnsIn, SheetLines } from "./SheetLines";

/** The sheet as a page to read on a small screen: the same rows in the columns that there is room for. */
export function SheetReading({ sheet, options }: { sheet: Sheet; options: SheetOptions }) {
  const [width, setWidth] = useState(328);
  const size = letterSizes[options.letters];
  const rows = useMemo(() => sheetRows(sheet, options, columnsIn(width, size)), [sheet, options, width, size]);
  return (
    <View testID="sheet-reading" style={{ gap: 16 }} onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}>
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 24, rowGap: 10 }}>
        {sheetFacts(sheet, options.shows).map(({ heading, words }) => (
          <View key={heading} style={{ flexShrink: 1 }}>
            <Text variant="title">{heading}</Text>
            <Text variant="small" tone="soft">
              {words}
            </Text>
          </View>
        ))}
      </View>
      <SheetGrids sheet={sheet} options={options} />
      <View style={{ borderTopWidth: 1, borderColor: colors.line, paddingTop: 12 }}>
        {sheet.chart.trim() === "" ? (
          <Text tone="soft">This song has no chart yet.</Text>
        ) : (
          <SheetLines rows={rows} size={size} level={2} />
        )}
      </View>
    </View>
  );
}
