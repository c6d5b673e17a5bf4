import { useMemo, type CSSProperties, type ReactNode } from "react";
import { useWindowDimensions } from "react-native";
import type { Scale } from "@/features/span/ladderGeometry";
import { SpanScale } from "@/features/span/SpanScale";
import { stripX } from "@/features/span/VoiceStrip";
import { colors, fonts, sizes } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { useShownRows } from "@/features/ui/useShownRows";
import type { RosterRow } from "@/shared/contract/studio/roster";
import { RosterCells } from "./RosterCells";
import { bandsWidth } from "./rosterScale";
import type { RosterSort } from "./rosterView";

export interface RosterRowsProps {
  rows: readonly RosterRow[];
  /** the same for every row, whichever are shown */
  scale: Scale;
  now: Date;
}

export interface RosterTableProps extends RosterRowsProps {
  sort: RosterSort;
  onSort: (sort: RosterSort) => void;
}

const nothing = () => undefined;
/** px: pupil, instrument, band, assigned, last take; the last column takes the rest. */
const columns = { pupil: 128, instrument: 132, bands: 454, assigned: 206, take: 158, look: 150 } as const;
const roomLeft = columns.pupil + columns.instrument + columns.assigned + columns.take + columns.look;

/** The pupils as a table, for wide screens: all voices stand on one scale, so that the eye compares down the column. */
export function RosterTable({ rows: pupils, scale, now, sort, onSort }: RosterTableProps) {
  const keys = useMemo(() => pupils.map(({ memberId }) => memberId), [pupils]);
  const { frame, rows, before, after, measure } = useShownRows(keys, 40, nothing);
  const room = Math.min(sizes.content, useWindowDimensions().width - sizes.rail - 2 * sizes.gutterWide);
  const width = bandsWidth(scale, Math.max(220, Math.min(columns.bands, room - roomLeft)));
  const column = (by: RosterSort | null, label: string, children?: ReactNode) => (
    <th
      scope="col"
      style={th}
      aria-sort={by === null || sort !== by ? undefined : by === "take" ? "descending" : "ascending"}
    >
      {by === null ? (
        label
      ) : (
        <button type="button" onClick={() => onSort(by)} style={sorter} data-testid={`sort-${by}`}>
          {label}
          <span aria-hidden style={{ visibility: sort === by ? "visible" : "hidden", color: colors.plum }}>
            {by === "take" ? " ↓" : " ↑"}
          </span>
        </button>
      )}
      {children}
    </th>
  );
  return (
    <div ref={frame}>
      <table aria-rowcount={pupils.length + 1} data-testid="roster" style={table}>
        <caption style={unseen}>
          The pupils, each with voice, instrument, songs and last take. In the band: comfort solid, reach hatched, the
          assigned song as a line.
        </caption>
        <colgroup>
          {[columns.pupil, columns.instrument, width + 12, columns.assigned, columns.take, null].map((each, k) => (
            <col key={k} style={each === null ? {} : { width: each }} />
          ))}
        </colgroup>
        <thead>
          <tr aria-rowindex={1}>
            {column("name", "Pupil")}
            {column(null, "Instrument")}
            {column(
              "voice",
              "Voice: comfort solid, reach hatched, the assigned song as a line",
              <div style={{ height: 18 }}>
                <SpanScale full scale={scale} width={width} x={(midi) => stripX(midi, scale, width)} />
              </div>,
            )}
            {column("due", "Assigned, in own key")}
            {column("take", "Last take, and how it felt")}
            {column(null, "Look after")}
          </tr>
        </thead>
        <tbody>
          {before > 0 && <Room height={before} />}
          {rows.map(({ index, key }) => {
            const row = pupils[index];
            return (
              row && (
                <tr key={key} ref={measure} data-index={index} aria-rowindex={index + 2} data-testid="pupil">
                  <RosterCells row={row} scale={scale} width={width} now={now} />
                </tr>
              )
            );
          })}
          {after > 0 && <Room height={after} />}
        </tbody>
      </table>
    </div>
  );
}

/** In the place of rows that are out of sight. */
function Room({ height }: { height: number }) {
  return (
    <tr aria-hidden style={{ height }}>
      <td style={{ padding: 0 }} />
    </tr>
  );
}

const table: CSSProperties = {
  width: "100%",
  tableLayout: "fixed",
  borderCollapse: "separate",
  borderSpacing: 0,
  font: `400 14px/18px ${fonts.text}`,
  color: colors.ink,
};
const th: CSSProperties = {
  position: "sticky",
  top: 0,
  zIndex: 2,
  background: colors.paper,
  borderBottom: `1px solid ${colors.ink}`,
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  verticalAlign: "bottom",
  padding: "0 12px 6px 0",
};
const sorter: CSSProperties = {
  font: "inherit",
  color: "inherit",
  background: "none",
  border: 0,
  padding: 0,
  minHeight: 24,
  display: "inline-flex",
  alignItems: "flex-end",
  cursor: "pointer",
  textAlign: "left",
  whiteSpace: "nowrap",
};
