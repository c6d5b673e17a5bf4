import { useId, type CSSProperties, type ReactNode } from "react";
import { useWindowDimensions } from "react-native";
import { KeySpan } from "@/features/span/KeySpan";
import { KeySpanHeader } from "@/features/span/KeySpanHeader";
import { keySpanWidth } from "@/features/span/keySpanGeometry";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts, sizes } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { commonScale, spellingIn, type KeyOrder, type KeyRow } from "../keyRows";
import { cell, firstColumn, KeyTableRow, secondColumn, type TableWay } from "./KeyTableRow";
import { tableColumns } from "./tableColumns";

export interface KeyTableProps {
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow | null;
  onSelect: (row: KeyRow) => void;
  order: KeyOrder;
  onOrder: (order: KeyOrder) => void;
  wayOf: (row: KeyRow) => TableWay;
  /** what the ways are played on, such as "A D F♯"; null where the song has no chords, and so no ways */
  instrument: string | null;
  /** what is said of the decided key */
  markOf: (row: KeyRow) => string | null;
}

const perSemitone = 14.4;
/** Where there are no ways to show, the pictures may take their room. */
const perSemitoneAlone = 24;

/** The keys as rows: scores, spans on one scale, room, chords and the best way. One of them is chosen by its radio button. */
export function KeyTable({
  rows,
  voice,
  selected,
  onSelect,
  order,
  onOrder,
  wayOf,
  instrument,
  markOf,
}: KeyTableProps) {
  const group = useId();
  const columns = tableColumns(useWindowDimensions().width - sizes.rail - 2 * sizes.gutterWide, instrument !== null);
  const scale = commonScale(rows, voice);
  const most = columns.chords === "none" ? perSemitoneAlone : perSemitone;
  const step = Math.min(most, columns.span / keySpanWidth(scale, 1));
  const head = { ...cell, ...th, top: 0 };
  const sortBy = (by: KeyOrder, label: ReactNode, align: "left" | "center" = "left") => (
    <button type="button" onClick={() => onOrder(by)} style={{ ...sorter, textAlign: align }}>
      {label}
      <span aria-hidden style={{ visibility: order === by ? "visible" : "hidden", color: colors.plum }}>
        {by === "move" ? " ↑" : " ↓"}
      </span>
    </button>
  );
  const sorted = (by: KeyOrder) => (order === by ? (by === "move" ? "ascending" : "descending") : undefined);
  return (
    <div style={{ position: "relative" }} data-testid="key-table">
      <table
        style={{
          width: columns.total,
          tableLayout: "fixed",
          borderCollapse: "separate",
          borderSpacing: 0,
          font: `400 14px/20px ${fonts.text}`,
          color: colors.ink,
        }}
      >
        <caption style={unseen}>
          All twelve keys for your voice, each with its score and its span against your voice
        </caption>
        <colgroup>
          {columns.widths.map((width, index) => (
            <col key={index} style={{ width }} />
          ))}
        </colgroup>
        <thead>
          <tr style={{ height: 56 }}>
            <th scope="col" style={{ ...head, ...firstColumn, zIndex: 3 }}>
              <span style={unseen}>Chosen</span>
            </th>
            <th scope="col" aria-sort={sorted("move")} style={{ ...head, ...secondColumn, zIndex: 3 }}>
              {sortBy("move", <>Key, semitones from written</>)}
            </th>
            <th scope="col" aria-sort={sorted("score")} style={head}>
              {sortBy("score", <>Score, and what decides it</>)}
            </th>
            <th scope="col" style={{ ...head, padding: 0 }}>
              <span style={unseen}>Span of the tune against your voice</span>
              <KeySpanHeader voice={voice} scale={scale} perSemitone={step} />
            </th>
            <th scope="col" aria-sort={sorted("below")} style={head}>
              {sortBy("below", <>Room below</>, "center")}
            </th>
            <th scope="col" aria-sort={sorted("above")} style={head}>
              {sortBy("above", <>Room above</>, "center")}
            </th>
            {columns.chords === "own" && (
              <th scope="col" style={{ ...head, paddingLeft: 8 }}>
                Chords
              </th>
            )}
            {instrument !== null && (
              <th scope="col" style={{ ...head, paddingLeft: columns.chords === "own" ? 0 : 8 }}>
                {setSigns(`${columns.chords === "own" ? "Best" : "Chords, and the best"} way on ${instrument}`)}
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <KeyTableRow
              key={row.shift}
              row={row}
              group={group}
              on={row === selected}
              onSelect={() => onSelect(row)}
              chords={columns.chords}
              way={wayOf(row)}
              mark={markOf(row)}
            >
              {(height) => (
                <KeySpan
                  voice={voice}
                  marks={row.marks}
                  scale={scale}
                  perSemitone={step}
                  height={height}
                  spelling={spellingIn(row.key)}
                  selected={row === selected}
                />
              )}
            </KeyTableRow>
          ))}
        </tbody>
      </table>
    </div>
  );
}

const th: CSSProperties = {
  position: "sticky",
  zIndex: 2,
  background: colors.paper,
  borderBottom: `1.5px solid ${colors.ink}`,
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  verticalAlign: "bottom",
  paddingBottom: 8,
};
const sorter: CSSProperties = {
  font: "inherit",
  color: "inherit",
  background: "none",
  border: 0,
  padding: 0,
  minHeight: 32,
  width: "100%",
  cursor: "pointer",
  display: "block",
};
