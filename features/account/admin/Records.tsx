import type { CSSProperties, ReactNode } from "react";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { Text } from "@/features/ui/Text";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { useLayout } from "@/features/ui/useLayout";

export interface RecordsProps<Row> {
  caption: string;
  columns: readonly string[];
  rows: readonly Row[];
  keyOf: (row: Row) => string;
  cellsOf: (row: Row) => readonly ReactNode[];
}

/** Plain records: a table where there is room, else a card each; nothing where there are none. */
export function Records<Row>({ caption, columns, rows, keyOf, cellsOf }: RecordsProps<Row>) {
  const wide = useLayout() === "wide";
  if (rows.length === 0) return null;
  if (!wide)
    return (
      <View role="list" aria-label={caption} style={{ gap: 12 }}>
        {rows.map((row) => (
          <View key={keyOf(row)} role="listitem">
            <Card style={{ gap: 4 }}>
              {cellsOf(row).map((cell, k) => (
                <View key={columns[k]} style={{ flexDirection: "row", columnGap: 12, alignItems: "baseline" }}>
                  <View style={{ width: 72 }}>
                    <Text variant="tiny" tone="soft">
                      {columns[k]}
                    </Text>
                  </View>
                  {typeof cell === "string" ? (
                    <Text variant="small" style={{ flexShrink: 1, overflowWrap: "anywhere" } as object}>
                      {cell}
                    </Text>
                  ) : (
                    cell
                  )}
                </View>
              ))}
            </Card>
          </View>
        ))}
      </View>
    );
  return (
    <table
      style={{ width: "100%", borderCollapse: "collapse", font: `400 14px/20px ${fonts.text}`, color: colors.ink }}
    >
      <caption style={unseen}>{caption}</caption>
      <thead>
        <tr>
          {columns.map((column) => (
            <th key={column} scope="col" style={head}>
              {column}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={keyOf(row)}>
            {cellsOf(row).map((cell, k) => (
              <td key={columns[k]} style={place}>
                {cell}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const head: CSSProperties = {
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  padding: "0 12px 8px 0",
  borderBottom: `1.5px solid ${colors.ink}`,
};
const place: CSSProperties = {
  padding: "8px 12px 8px 0",
  borderBottom: `1px solid ${colors.line}`,
  verticalAlign: "middle",
  overflowWrap: "anywhere",
};
