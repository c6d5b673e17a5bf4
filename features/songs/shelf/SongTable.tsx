import { useMemo, type ReactNode } from "react";
import { keySpanWidth } from "@/features/span/keySpanGeometry";
import { VoiceStripHeader } from "@/features/span/VoiceStrip";
import { ShownRows } from "@/features/ui/table/ShownRows";
import { SortHead } from "@/features/ui/table/SortHead";
import { stuckHead, table } from "@/features/ui/table/tableStyles";
import { useContentRoom } from "@/features/ui/table/useContentRoom";
import { useShownRows } from "@/features/ui/table/useShownRows";
import { unseen } from "@/features/ui/unseen";
import { shelfScale } from "./shelfScale";
import type { ShelfSort } from "./shelfView";
import { SongCells } from "./SongCells";
import type { SongRowsProps } from "./SongRows";

export interface SongTableProps extends SongRowsProps {
  sort: ShelfSort;
  onSort: (sort: ShelfSort) => void;
}

/** The songs as a table, for wide screens: the spans stand on one scale, so that the eye compares along a line. */
export function SongTable({ songs, total, more, voice, mineOf, fitOf, actions, sort, onSort }: SongTableProps) {
  const keys = useMemo(() => songs.map(({ id }) => id), [songs]);
  const { frame, ...shown } = useShownRows(keys, 60, more);
  const room = useContentRoom();
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
  const column = (by: ShelfSort | null, label: string, under?: ReactNode) => {
    const way = by === "played" || by === "fit" ? "descending" : "ascending";
    return (
      <SortHead
        label={label}
        order={by !== null && sort === by ? way : null}
        wouldBe={way}
        onSort={by === null ? undefined : () => onSort(by)}
      >
        {under}
      </SortHead>
    );
  };
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
              <th scope="col" style={stuckHead}>
                <span style={unseen}>Chosen</span>
              </th>
            )}
            {column("title", "Title")}
            {column("key", "Key")}
            {column(null, "My key")}
            {voice && scale && (
              <>
                {column(null, "Span over your voice", <VoiceStripHeader voice={voice} scale={scale} width={span} />)}
                {column("fit", "Fit")}
              </>
            )}
            {roomy && column(null, "Tags")}
            {column("played", "Last played")}
            <th scope="col" style={stuckHead}>
              <span style={unseen}>More</span>
            </th>
          </tr>
        </thead>
        <ShownRows {...shown}>
          {(index) => {
            const song = songs[index];
            return song ? (
              <SongCells
                song={song}
                voice={voice}
                mineOf={mineOf}
                fitOf={fitOf}
                actions={actions}
                width={span}
                roomy={roomy}
              />
            ) : null;
          }}
        </ShownRows>
      </table>
    </div>
  );
}
