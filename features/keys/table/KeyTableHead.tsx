import type { CSSProperties, ReactNode } from "react";
import { KeySpanHeader, type KeySpanHeaderProps } from "@/features/span/KeySpanHeader";
import { Icon } from "@/features/ui/Icon";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { ariaSort, pressed, type KeyOrder, type SortColumn } from "./keyOrder";
import { cell, firstColumn, secondColumn } from "./tableCells";
import type { TableColumns } from "./tableColumns";

export interface KeyTableHeadProps {
  scale: KeySpanHeaderProps;
  order: KeyOrder;
  onOrder: (order: KeyOrder) => void;
  chords: TableColumns["chords"];
  /** strings of the instrument, such as "A D F♯"; null where no ways are shown */
  instrument: string | null;
}

/** Heads of the columns; each is a button that puts the rows in its order, and the other way round. */
export function KeyTableHead({ scale, order, onOrder, chords, instrument }: KeyTableHeadProps) {
  const own = chords === "own";
  const head = (by: SortColumn, label: ReactNode, style: CSSProperties = {}, align: "left" | "center" = "left") => (
    <th scope="col" aria-sort={ariaSort(order, by)} style={{ ...th, ...style }}>
      <Sorter by={by} order={order} onOrder={onOrder} align={align}>
        {label}
      </Sorter>
    </th>
  );
  return (
    <thead>
      <tr style={{ height: 56 }}>
        {head(
          "pinned",
          <>
            <span style={unseen}>Pinned</span>
            <Icon name="bookmark" size={16} />
          </>,
          { ...firstColumn, zIndex: 3 },
        )}
        {head("move", "Key, semitones from written", { ...secondColumn, zIndex: 3 })}
        {head("score", "Score, and what decides it")}
        <th scope="col" aria-sort={ariaSort(order, "span")} style={{ ...th, padding: 0 }}>
          <div style={{ position: "absolute", left: 0, top: -4, width: 60, zIndex: 1 }}>
            <Sorter by="span" order={order} onOrder={onOrder} align="left">
              Span
            </Sorter>
          </div>
          <span style={unseen}>of the tune against your voice</span>
          <KeySpanHeader {...scale} />
        </th>
        {head("below", "Room below", {}, "center")}
        {head("above", "Room above", {}, "center")}
        {own && head("chords", "Chords", { paddingLeft: 8 })}
        {instrument !== null &&
          head(
            "way",
            setSigns(`${own ? "Best" : "Chords, and the best"} way on ${instrument}`),
            own ? {} : { paddingLeft: 8 },
          )}
      </tr>
    </thead>
  );
}

interface SorterProps {
  by: SortColumn;
  order: KeyOrder;
  onOrder: (order: KeyOrder) => void;
  align: "left" | "center";
  children: ReactNode;
}

function Sorter({ by, order, onOrder, align, children }: SorterProps) {
  const on = order.by === by;
  const arrow = ariaSort(order, by) === "ascending" ? "↑" : "↓";
  return (
    <button
      type="button"
      onClick={() => onOrder(pressed(order, by))}
      data-testid={`sort-${by}`}
      style={{ ...sorter, textAlign: align, color: on ? colors.ink : colors.inkSoft }}
    >
      {children}
      <span aria-hidden style={{ visibility: on ? "visible" : "hidden", color: colors.plum, fontWeight: 600 }}>
        {` ${arrow}`}
      </span>
    </button>
  );
}

const th: CSSProperties = {
  ...cell,
  position: "sticky",
  top: 0,
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
  background: "none",
  border: 0,
  padding: 0,
  minHeight: 32,
  width: "100%",
  cursor: "pointer",
  display: "block",
};
