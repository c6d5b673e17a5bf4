import type { ReactNode } from "react";
import type { ShownRows as Shown } from "./useShownRows";

export interface ShownRowsProps extends Pick<Shown, "rows" | "before" | "after" | "measure"> {
  /** the cells of a row; null for one that is gone */
  children: (index: number) => ReactNode;
  /** of every row */
  testID?: string;
}

/** The rows of a long table that are in sight; the first below the head is row 2. */
export function ShownRows({ rows, before, after, measure, children, testID }: ShownRowsProps) {
  return (
    <tbody>
      {before > 0 && <OutOfSight height={before} />}
      {rows.map(({ index, key }) => {
        const cells = children(index);
        return (
          cells !== null && (
            <tr key={key} ref={measure} data-index={index} aria-rowindex={index + 2} data-testid={testID}>
              {cells}
            </tr>
          )
        );
      })}
      {after > 0 && <OutOfSight height={after} />}
    </tbody>
  );
}

/** In the place of rows that are out of sight. */
function OutOfSight({ height }: { height: number }) {
  return (
    <tr aria-hidden style={{ height }}>
      <td style={{ padding: 0 }} />
    </tr>
  );
}
