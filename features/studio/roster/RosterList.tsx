import { memo, useMemo, useState } from "react";
import { View } from "react-native";
import { SpanScale } from "@/features/span/SpanScale";
import { stripX } from "@/features/span/VoiceStrip";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { ShownCards } from "@/features/ui/table/ShownCards";
import { useShownRows } from "@/features/ui/table/useShownRows";
import { dayOf } from "../dayWords";
import { EffortBars } from "./EffortBars";
import { Assigned, Band, LookAfter, type RosterCellsProps } from "./RosterCells";
import type { RosterRowsProps } from "./RosterTable";
import { silence, tuningWords } from "./rosterWords";

/** The pupils as cards under one another, for the phone and middle screens; their bands on one scale. */
export function RosterList({ rows: pupils, scale, now }: RosterRowsProps) {
  const [width, setWidth] = useState(0);
  const keys = useMemo(() => pupils.map(({ memberId }) => memberId), [pupils]);
  const shown = useShownRows(keys, 132);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.min(560, Math.floor(nativeEvent.layout.width)))}>
      {width > 0 && (
        <div style={{ borderBottom: `1.5px solid ${colors.ink}` }}>
          <SpanScale scale={scale} width={width} x={(midi) => stripX(midi, scale, width)} />
        </div>
      )}
      <ShownCards {...shown} total={pupils.length} testID="roster" cardTestID="pupil" cardStyle={{ padding: "12px 0" }}>
        {(index) => {
          const row = pupils[index];
          return row ? <Pupil row={row} scale={scale} width={width} now={now} /> : null;
        }}
      </ShownCards>
    </View>
  );
}

/** Drawn once, however often the list is scrolled. */
const Pupil = memo(function Pupil({ row, scale, width, now }: RosterCellsProps) {
  const silent = silence(row);
  return (
    <View style={{ gap: 4 }}>
      <View style={{ flexDirection: "row", alignItems: "baseline", justifyContent: "space-between", gap: 12 }}>
        <Text variant="strong" style={{ flexShrink: 1 }}>
          {row.name}
        </Text>
        {row.lastTake && (
          <View style={{ flexDirection: "row", alignItems: "center", gap: 8 }}>
            <EffortBars effort={row.lastTake.effort} />
            <Text variant="small" tone="soft">
              {dayOf(row.lastTake.at, now)}
            </Text>
          </View>
        )}
      </View>
      {silent !== null ? (
        <Text variant="small" tone="soft">
          {silent}
        </Text>
      ) : (
        <>
          <Text variant="small" tone="soft">
            {row.instrument ? `${row.instrument.name}, ${tuningWords(row.instrument)}` : "no instrument yet"}
          </Text>
          {width > 0 && <Band row={row} scale={scale} width={width} />}
          {row.open.length > 0 && (
            <View style={{ minHeight: 48, justifyContent: "center" }}>
              <Assigned row={row} now={now} />
            </View>
          )}
          {(row.waiting > 0 || row.warnings.length > 0) && (
            <div style={{ font: `500 14px/20px ${fonts.text}`, display: "flex", flexWrap: "wrap", columnGap: 16 }}>
              <LookAfter row={row} />
            </div>
          )}
        </>
      )}
    </View>
  );
});
