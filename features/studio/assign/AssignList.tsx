import { memo, useMemo, useState } from "react";
import { View } from "react-native";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import { ShownCards } from "@/features/ui/table/ShownCards";
import { useShownRows } from "@/features/ui/table/useShownRows";
import { GiveTick, KeyLine, OneKey, PartBand, PartFit, PartKey, PartNote, PartWay } from "./AssignCells";
import type { AssignRowsProps, CellsProps } from "./assignRows";

/** The same as cards under one another, for the phone and middle screens. */
export function AssignList({ parts, ways, onDraft, oneKey = false, scale }: AssignRowsProps) {
  const [width, setWidth] = useState(0);
  const keys = useMemo(() => parts.map(({ row }) => row.memberId), [parts]);
  const shown = useShownRows(keys, 220);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(Math.min(560, Math.floor(nativeEvent.layout.width)))}>
      <ShownCards
        {...shown}
        total={parts.length}
        testID="assign-table"
        cardTestID="assign-row"
        style={{ borderTop: `1.5px solid ${colors.ink}` }}
        cardStyle={{ padding: "8px 0" }}
      >
        {(index) => {
          const part = parts[index];
          return part ? (
            <Card
              part={part}
              ways={ways.get(part.row.memberId)}
              onDraft={onDraft}
              oneKey={oneKey}
              scale={scale}
              width={width}
            />
          ) : null;
        }}
      </ShownCards>
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
          <KeyLine>
            {oneKey ? <OneKey part={part} /> : <PartKey part={part} onDraft={onDraft} />}
            <PartFit part={part} />
          </KeyLine>
          <View style={{ minHeight: 48, alignItems: "flex-start", justifyContent: "center" }}>
            <PartWay part={part} ways={ways} onDraft={onDraft} />
          </View>
        </>
      )}
    </View>
  );
});
