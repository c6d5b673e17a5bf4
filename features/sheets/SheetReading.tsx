import { type ReactNode, useMemo, useState } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { letterSizes, type Sheet, type SheetOptions } from "@/shared/sheets/sheet";
import { sheetRows } from "@/shared/sheets/sheetChart";
import { sheetFacts } from "@/shared/sheets/sheetHead";
import { tuneHeight, tuneInVoice } from "@/shared/sheets/tuneInVoice";
import { pieceTones } from "@/features/ui/pieceTones";
import { Heading } from "@/features/ui/Heading";
import { Piece } from "./paper/Piece";
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
      {sheet.tune && (
        <Said heading="The tune in your voice" words={sheet.tune.words}>
          <svg width={tuneWidth} height={tuneHeight} viewBox={`0 0 ${tuneWidth} ${tuneHeight}`}>
            <Piece piece={tuneInVoice(sheet.tune, { x: 0, y: 0, width: tuneWidth })} colors={pieceTones} />
          </svg>
        </Said>
      )}
      {sheet.order !== "" && <Said heading="Order" words={sheet.order} />}
    </View>
  );
}

const tuneWidth = 240;

function Said({ heading, words, children }: { heading: string; words: string; children?: ReactNode }) {
  return (
    <View style={{ gap: 6 }}>
      <Heading level={2} size={16}>
        {heading}
      </Heading>
      {children}
      <Text variant="small" tone="soft">
        {words}
      </Text>
    </View>
  );
}
