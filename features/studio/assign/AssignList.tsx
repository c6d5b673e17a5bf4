import { memo, useMemo, useState } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { useShownRows } from "@/features/ui/table/useShownRows";
import { GiveTick, OneKey, PartBand, PartFit, PartKey, PartNote, PartWay } from "./AssignCells";
import type { AssignRowsProps, CellsProps } from "./assignRows";

const nothing = () => undefined;

/** The same as cards under one another, for the phone and middle screens. */
export function AssignList({ parts, ways, onDraft, oneKey = false, scale }: AssignRowsProps) {
  const [width, setWidth] = useState(0);
  const keys = useMemo(() => parts.map(({ row }) => row.memberId), [parts]);
  const { frame, rows, before, after, measure } = useShownRows(keys, 220, nothing);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.min(560, Math.floor(nativeEvent.layout.width)))}>
      <div
        ref={frame}
        role="list"
        data-testid="assign-table"
        style={{ paddingTop: before, paddingBottom: after, borderTop: `1.5px solid ${colors.ink}` }}
      >
        {rows.map(({ index, key }) => {
          const part = parts[index];
          return (
            part && (
              <div
                key={key}
                ref={measure}
                data-index={index}
                data-testid="assign-row"
                role="listitem"
                style={{ borderBottom: `1px solid ${colors.line}`, padding: "8px 0" }}
              >
                <Card
                  part={part}
                  ways={ways.get(part.row.memberId)}
                  onDraft={onDraft}
                  oneKey={oneKey}
                  scale={scale}
                  width={width}
                />
              </div>
            )
          );
        })}
      </div>
    </View>
  );
}

const Card = memo(function Card({ part, ways, onDraft, oneKey, scale, width }: CellsProps) {
  const { row, draft } = part;
  return (
    <View style={{ gap: 6 }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 4 }}>
        {!oneKey && <GiveTick part={part} onDraft={onDraft} />}
        <Text variant="strong" style={{ flexGrow: 1, flexShrink: 1 }}>
          {row.name}
        </Text>
        {draft.chosen && !oneKey && <PartNote part={part} onDraft={onDraft} />}
      </View>
      {draft.chosen && (
        <>
          {width > 0 && <PartBand part={part} scale={scale} width={width} />}
          <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 16, minHeight: 48 }}>
            {oneKey ? <OneKey part={part} /> : <PartKey part={part} onDraft={onDraft} />}
            <PartFit part={part} />
          </View>
          <View style={{ minHeight: 48, alignItems: "flex-start" }}>
            <PartWay part={part} ways={ways} onDraft={onDraft} />
          </View>
        </>
      )}
    </View>
  );
});
