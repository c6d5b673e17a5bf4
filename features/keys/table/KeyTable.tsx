import { useId } from "react";
import { useWindowDimensions } from "react-native";
import { KeySpan } from "@/features/span/KeySpan";
import { keySpanWidth } from "@/features/span/keySpanGeometry";
import { colors, fonts, sizes } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { commonScale, spellingIn, type KeyRow } from "../keyRows";
import { KeyTableHead } from "./KeyTableHead";
import { KeyTableRow } from "./KeyTableRow";
import type { KeyOrder, RowFacts } from "./keyOrder";
import { tableColumns } from "./tableColumns";

export interface KeyTableProps extends RowFacts {
  /** in the order in which they stand */
  rows: readonly KeyRow[];
  /** all keys, for the scale: it stays where it is when rows are left out */
  all: readonly KeyRow[];
  /** on whole semitones */
  voice: SingingVoice;
  selected: KeyRow | null;
  onSelect: (row: KeyRow) => void;
  /** whether one more key can be pinned */
  pinRoom: boolean;
  onPin: (row: KeyRow) => void;
  order: KeyOrder;
  onOrder: (order: KeyOrder) => void;
  /** what the ways are played on, such as "A D F♯"; null where the song has no chords, and so no ways */
  instrument: string | null;
  /** what is said of the decided key */
  markOf: (row: KeyRow) => string | null;
}

const perSemitone = 14.4;
/** Where there are no ways to show, the pictures may take their room. */
const perSemitoneAlone = 24;

/** The keys as rows: scores, spans on one scale, room, chords and the best way. One is chosen, up to four are pinned. */
export function KeyTable({
  rows,
  all,
  voice,
  selected,
  onSelect,
  pinned,
  pinRoom,
  onPin,
  order,
  onOrder,
  wayOf,
  instrument,
  markOf,
}: KeyTableProps) {
  const group = useId();
  const columns = tableColumns(useWindowDimensions().width - sizes.rail - 2 * sizes.gutterWide, instrument !== null);
  const scale = commonScale(all, voice);
  const most = columns.chords === "none" ? perSemitoneAlone : perSemitone;
  const step = Math.min(most, columns.span / keySpanWidth(scale, 1));
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
          {rows.length === all.length
            ? "All twelve keys for your voice, each with its score and its span against your voice"
            : `${rows.length} of twelve keys for your voice, each with its score and its span against your voice`}
        </caption>
        <colgroup>
          {columns.widths.map((width, index) => (
            <col key={index} style={{ width }} />
          ))}
        </colgroup>
        <KeyTableHead
          scale={{ voice, scale, perSemitone: step }}
          order={order}
          onOrder={onOrder}
          chords={columns.chords}
          instrument={instrument}
        />
        <tbody>
          {rows.map((row) => (
            <KeyTableRow
              key={row.shift}
              row={row}
              group={group}
              on={row === selected}
              onSelect={() => onSelect(row)}
              pinned={pinned(row)}
              pinRoom={pinRoom}
              onPin={() => onPin(row)}
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
