import { useId, type CSSProperties, type ReactNode } from "react";
import { useWindowDimensions } from "react-native";
import { KeySpan } from "@/features/span/KeySpan";
import { KeySpanHeader } from "@/features/span/KeySpanHeader";
import { keySpanWidth } from "@/features/span/keySpanGeometry";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts, sizes } from "@/features/ui/theme";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { commonScale, spellingIn, type KeyOrder, type KeyRow, type Room } from "./keyRows";

/** The best way to play a key, in two short lines; undefined while it is searched, null where there is none. */
export type TableWay = { title: string; cost: string } | null | undefined;

export interface KeyTableProps {
  rows: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow | null;
  onSelect: (row: KeyRow) => void;
  order: KeyOrder;
  onOrder: (order: KeyOrder) => void;
  wayOf: (row: KeyRow) => TableWay;
  /** what the ways are played on, such as "A D F♯" */
  instrument: string;
}

const widths = [28, 104, 226, 470, 56, 56, 160, 180] as const;
const tableWidth = 1280;
const perSemitone = 14.4;

/** The keys as rows: scores, spans on one scale, room, chords and the best way. One of them is chosen by its radio button. */
export function KeyTable({ rows, voice, selected, onSelect, order, onOrder, wayOf, instrument }: KeyTableProps) {
  const group = useId();
  const fits = useWindowDimensions().width >= sizes.rail + 2 * sizes.gutterWide + tableWidth;
  const scale = commonScale(rows, voice);
  const step = Math.min(perSemitone, (widths[3] / keySpanWidth(scale, perSemitone)) * perSemitone);
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
    <div style={fits ? roomy : scrolling} data-testid="key-table">
      <table
        style={{
          width: tableWidth,
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
          {widths.map((width, index) => (
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
            <th scope="col" style={{ ...head, paddingLeft: 8 }}>
              Chords
            </th>
            <th scope="col" style={head}>
              {setSigns(`Best way on ${instrument}`)}
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row
              key={row.shift}
              row={row}
              group={group}
              on={row === selected}
              onSelect={() => onSelect(row)}
              way={wayOf(row)}
            >
              <KeySpan
                voice={voice}
                marks={row.marks}
                scale={scale}
                perSemitone={step}
                height={51}
                spelling={spellingIn(row.key)}
                selected={row === selected}
              />
            </Row>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Row({
  row,
  group,
  on,
  onSelect,
  way,
  children,
}: {
  row: KeyRow;
  group: string;
  on: boolean;
  onSelect: () => void;
  way: TableWay;
  children: ReactNode;
}) {
  const ground = on ? colors.card : colors.paper;
  const td: CSSProperties = { ...cell, background: ground, borderBottom: `1px solid ${colors.line}`, height: 50 };
  const faint = row.beyond ? colors.inkSoft : colors.ink;
  return (
    <tr onClick={onSelect} style={{ cursor: "pointer" }} data-testid={`key-row-${row.key.tonic}`}>
      <td style={{ ...td, ...firstColumn, boxShadow: on ? `-12px 0 0 ${colors.card}` : undefined }}>
        {on && (
          <span
            style={{
              position: "absolute",
              left: -12,
              top: 0,
              bottom: 0,
              width: 4,
              borderRadius: 2,
              background: colors.plum,
            }}
          />
        )}
        <input
          type="radio"
          name={group}
          checked={on}
          onChange={onSelect}
          aria-label={`${row.sign}, ${row.moved}`}
          style={{ width: 18, height: 18, margin: 0, display: "block", accentColor: colors.plum }}
        />
      </td>
      <th scope="row" style={{ ...td, ...secondColumn, textAlign: "left", fontWeight: 400 }}>
        <span style={{ font: `700 26px/1 ${fonts.display}`, display: "inline-block", minWidth: 40, color: faint }}>
          {setSigns(row.sign)}
        </span>
        <span style={{ font: `500 12px/1 ${fonts.text}`, color: colors.inkSoft, whiteSpace: "nowrap" }}>
          {row.moved}
        </span>
      </th>
      <td style={td}>
        <div style={{ display: "grid", gridTemplateColumns: "46px 1fr", alignItems: "center" }}>
          <span
            data-testid="key-score"
            style={{
              font: `${on ? 700 : 600} ${on ? 26 : 20}px/1 ${fonts.display}`,
              color: row.beyond ? colors.brick : on ? colors.lagoon : colors.ink,
            }}
          >
            {row.score}
          </span>
          <span
            style={{ font: `400 13px/16px ${fonts.text}`, color: on ? colors.ink : colors.inkSoft, paddingRight: 12 }}
          >
            {setSigns(row.reason.replace(/\.$/, ""))}
          </span>
        </div>
      </td>
      <td style={{ ...td, padding: 0, lineHeight: 0 }}>{children}</td>
      <RoomCell room={row.below} style={td} strong={on} />
      <RoomCell room={row.above} style={td} strong={on} />
      <td style={{ ...td, paddingLeft: 8 }}>
        <div
          data-mono
          style={{
            display: "grid",
            gridTemplateColumns: "repeat(4, 36px)",
            font: `${on ? 600 : 400} 14px/20px ${fonts.mono}`,
            color: faint,
            whiteSpace: "nowrap",
          }}
        >
          {row.chords.map((chord) => (
            <span key={chord}>{setSigns(chord)}</span>
          ))}
        </div>
      </td>
      <td style={td}>
        {way === undefined ? (
          <span style={{ display: "block", height: 12, width: 120, borderRadius: 6, background: colors.line }}>
            <span style={unseen}>Searching</span>
          </span>
        ) : way === null ? (
          <span style={{ color: colors.inkSoft }}>None found</span>
        ) : (
          <>
            <span style={{ display: "block", font: `${on ? 600 : 500} 14px/17px ${fonts.text}`, color: faint }}>
              {setSigns(way.title)}
            </span>
            <span style={{ display: "block", font: `400 12px/15px ${fonts.text}`, color: colors.inkSoft }}>
              {way.cost}
            </span>
          </>
        )}
      </td>
    </tr>
  );
}

function RoomCell({ room, style, strong }: { room: Room; style: CSSProperties; strong: boolean }) {
  const color = { ink: colors.ink, honey: colors.honeyText, brick: colors.brick }[room.tone];
  return (
    <td style={{ ...style, textAlign: "center", font: `${strong ? 600 : 400} 14px/1 ${fonts.mono}`, color }}>
      {room.text}
    </td>
  );
}

const unseen: CSSProperties = {
  position: "absolute",
  width: 1,
  height: 1,
  margin: -1,
  overflow: "hidden",
  clipPath: "inset(50%)",
  whiteSpace: "nowrap",
};
const cell: CSSProperties = { padding: 0, boxSizing: "border-box", verticalAlign: "middle" };
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
const firstColumn: CSSProperties = { position: "sticky", left: 0, zIndex: 1 };
const secondColumn: CSSProperties = { position: "sticky", left: 28, zIndex: 1 };
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
const roomy: CSSProperties = { position: "relative" };
const scrolling: CSSProperties = {
  position: "relative",
  overflow: "auto",
  maxHeight: "calc(100dvh - 48px)",
  paddingLeft: 12,
  marginLeft: -12,
};
