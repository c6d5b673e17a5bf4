import type { CSSProperties, ReactNode } from "react";
import { colors } from "../theme";
import type { ShownRows as Shown } from "./useShownRows";

export interface ShownCardsProps extends Shown {
  /** what stands in a card; null for one that is gone */
  children: (index: number) => ReactNode;
  /** how many there are in all, those out of sight too */
  total: number;
  /** of the list, and of every card */
  testID: string;
  cardTestID?: string;
  style?: CSSProperties;
  cardStyle?: CSSProperties;
}

/** The cards of a long list that are in sight, under one another, each with its place in the whole list. */
export function ShownCards({
  frame,
  rows,
  before,
  after,
  measure,
  children,
  total,
  testID,
  cardTestID,
  style,
  cardStyle,
}: ShownCardsProps) {
  return (
    <div ref={frame} role="list" data-testid={testID} style={{ ...style, paddingTop: before, paddingBottom: after }}>
      {rows.map(({ index, key }) => {
        const card = children(index);
        return (
          card !== null && (
            <div
              key={key}
              ref={measure}
              data-index={index}
              data-testid={cardTestID}
              role="listitem"
              aria-posinset={index + 1}
              aria-setsize={total}
              style={{ borderBottom: `1px solid ${colors.line}`, ...cardStyle }}
            >
              {card}
            </div>
          )
        );
      })}
    </div>
  );
}
