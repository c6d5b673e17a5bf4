import { useMemo, type ReactNode } from "react";
import type { Scale } from "@/features/span/ladderGeometry";
import { SpanScale } from "@/features/span/SpanScale";
import { stripX } from "@/features/span/VoiceStrip";
import { ShownRows } from "@/features/ui/table/ShownRows";
import { SortHead } from "@/features/ui/table/SortHead";
import { table } from "@/features/ui/table/tableStyles";
import { useContentRoom } from "@/features/ui/table/useContentRoom";
import { useShownRows } from "@/features/ui/table/useShownRows";
import { unseen } from "@/features/ui/unseen";
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

/** px: pupil, instrument, band, assigned, last take; the last column takes the rest. */
const columns = { pupil: 128, instrument: 132, bands: 454, assigned: 206, take: 158, look: 150 } as const;
const roomLeft = columns.pupil + columns.instrument + columns.assigned + columns.take + columns.look;

/** The pupils as a table, for wide screens: all voices stand on one scale, so that the eye compares down the column. */
export function RosterTable({ rows: pupils, scale, now, sort, onSort }: RosterTableProps) {
  const keys = useMemo(() => pupils.map(({ memberId }) => memberId), [pupils]);
  const { frame, ...shown } = useShownRows(keys, 40);
  const room = useContentRoom();
  const width = bandsWidth(scale, Math.max(220, Math.min(columns.bands, room - roomLeft)));
  const column = (by: RosterSort | null, label: string, under?: ReactNode) => {
    const way = by === "take" ? "descending" : "ascending";
    return (
      <SortHead
        label={label}
        order={by !== null && sort === by ? way : null}
        wouldBe={way}
        onSort={by === null ? undefined : () => onSort(by)}
        testID={by === null ? undefined : `sort-${by}`}
      >
        {under}
      </SortHead>
    );
  };
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
        <ShownRows {...shown} testID="pupil">
          {(index) => {
            const row = pupils[index];
            return row ? <RosterCells row={row} scale={scale} width={width} now={now} /> : null;
          }}
        </ShownRows>
      </table>
    </div>
  );
}
