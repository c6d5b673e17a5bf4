import { useMemo, type CSSProperties, type ReactNode } from "react";
import { useWindowDimensions } from "react-native";
import { keySpanWidth } from "@/features/span/keySpanGeometry";
import { VoiceStripHeader } from "@/features/span/VoiceStrip";
import { colors, fonts, sizes } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { shelfScale } from "./shelfScale";
import type { ShelfSort } from "./shelfView";
import { SongCells } from "./SongCells";
import type { SongRowsProps } from "./SongRows";
import { useShownRows } from "@/features/ui/useShownRows";

export interface SongTableProps extends SongRowsProps {
  sort: ShelfSort;
  onSort: (sort: ShelfSort) => void;
}

/** The songs as a table, for wide screens: the spans stand on one scale, so that the eye compares along a line. */
export function SongTable({ songs, total, more, voice, mineOf, fitOf, actions, sort, onSort }: SongTableProps) {
  const keys = useMemo(() => songs.map(({ id }) => id), [songs]);
  const { frame, rows, before, after, measure } = useShownRows(keys, 60, more);
  const room = Math.min(sizes.content, useWindowDimensions().width - sizes.rail - 2 * sizes.gutterWide);
  const roomy = room >= 1100;
  const scale = voice && shelfScale(voice);
  const span = scale ? Math.min(roomy ? 300 : 200, keySpanWidth(scale, 9)) : 0;
  const widths = [
    ...(actions.chosen === null ? [] : [48]),
    null,
    64,
    84,
    ...(scale ? [span + 24, 56] : []),
    ...(roomy ? [170] : []),
    104,
    48,
  ];
  const column = (by: ShelfSort | null, label: string, more: CSSProperties = {}, under?: ReactNode) => (
    <th
      scope="col"
      style={{ ...th, ...more }}
      aria-sort={by === null || sort !== by ? undefined : by === "played" || by === "fit" ? "descending" : "ascending"}
    >
      {by === null ? (
        label
      ) : (
        <button type="button" onClick={() => onSort(by)} style={sorter}>
          {label}
          <span aria-hidden style={{ visibility: sort === by ? "visible" : "hidden", color: colors.plum }}>
            {by === "played" || by === "fit" ? " ↓" : " ↑"}
          </span>
        </button>
      )}
      {under}
    </th>
  );
  return (
    <div ref={frame}>
      <table aria-rowcount={total + 1} data-testid="songs" style={table}>
        <caption style={unseen}>Your songs, each with its key, your key, and its span against your voice</caption>
        <colgroup>
          {widths.map((width, index) => (
            <col key={index} style={width === null ? {} : { width }} />
          ))}
        </colgroup>
        <thead>
          <tr aria-rowindex={1}>
            {actions.chosen !== null && (
              <th scope="col" style={th}>
                <span style={unseen}>Chosen</span>
              </th>
            )}
            {column("title", "Title")}
            {column("key", "Key")}
            {column(null, "My key")}
            {voice && scale && (
              <>
                {column(
                  null,
                  "Span over your voice",
                  {},
                  <VoiceStripHeader voice={voice} scale={scale} width={span} />,
                )}
                {column("fit", "Fit")}
              </>
            )}
            {roomy && column(null, "Tags")}
            {column("played", "Last played")}
            <th scope="col" style={th}>
              <span style={unseen}>More</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {before > 0 && <Room height={before} />}
          {rows.map(({ index, key }) => {
            const song = songs[index];
            if (!song) return null;
            return (
              <tr key={key} ref={measure} data-index={index} aria-rowindex={index + 2}>
                <SongCells
                  song={song}
                  voice={voice}
                  mineOf={mineOf}
                  fitOf={fitOf}
                  actions={actions}
                  width={span}
                  roomy={roomy}
                />
              </tr>
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
  font: `400 14px/20px ${fonts.text}`,
  color: colors.ink,
};
const th: CSSProperties = {
  position: "sticky",
  top: 0,
  zIndex: 2,
  background: colors.paper,
  borderBottom: `1.5px solid ${colors.ink}`,
  font: `500 12px/16px ${fonts.text}`,
  color: colors.inkSoft,
  textAlign: "left",
  verticalAlign: "bottom",
  padding: "0 12px 8px 0",
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
