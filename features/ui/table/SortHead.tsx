import type { CSSProperties, ReactNode } from "react";
import { colors } from "../theme";
import { stuckHead } from "./tableStyles";

export interface SortHeadProps {
  label: string;
  /** how the rows stand by this column; null where they stand by another */
  order: "ascending" | "descending" | null;
  /** what the arrow shows where one presses to sort */
  wouldBe: "ascending" | "descending";
  /** absent for a column that one cannot sort by */
  onSort?: (() => void) | undefined;
  /** under the label, such as a scale */
  children?: ReactNode;
  testID?: string | undefined;
}

/** The head of a column: a button where the rows can be sorted by it. */
export function SortHead({ label, order, wouldBe, onSort, children, testID }: SortHeadProps) {
  return (
    <th scope="col" style={stuckHead} aria-sort={order ?? undefined}>
      {onSort === undefined ? (
        label
      ) : (
        <button type="button" onClick={onSort} style={sorter} data-testid={testID}>
          {label}
          <span aria-hidden style={{ visibility: order ? "visible" : "hidden", color: colors.plum }}>
            {wouldBe === "descending" ? " ↓" : " ↑"}
          </span>
        </button>
      )}
      {children}
    </th>
  );
}

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
