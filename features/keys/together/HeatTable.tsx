import { useId, type CSSProperties } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import { useLayout } from "@/features/ui/useLayout";
import type { GroupKey } from "./groupKey";
import { HeatCell } from "./HeatCell";

export interface HeatTableProps {
  /** in the order asked for */
  keys: readonly GroupKey[];
  singers: readonly { id: string; name: string }[];
  selected: GroupKey;
  onSelect: (key: GroupKey) => void;
}

const nameWidth = { phone: 112, middle: 150, wide: 190 } as const;
const leastWidth = 58;

/** Singers as rows, keys as columns; every cell is a score with its picture. A key is picked by the button over its column. */
export function HeatTable({ keys, singers, selected, onSelect }: HeatTableProps) {
  const layout = useLayout();
  const caption = useId();
  const names = nameWidth[layout];
  return (
    <div
      role="region"
      aria-labelledby={caption}
      tabIndex={0}
      data-testid="heat-scroll"
      style={{ overflowX: "auto", position: "relative" }}
    >
      <table
        data-testid="heat-table"
        style={{
          width: "100%",
          minWidth: names + keys.length * leastWidth,
          tableLayout: "fixed",
          borderCollapse: "separate",
          borderSpacing: 0,
          font: `400 14px/18px ${fonts.text}`,
          color: colors.ink,
        }}
      >
        <caption id={caption} style={unseen}>
          {`Scores of 100 for ${singers.length} singers in ${keys.length} keys. The lowest score and the average stand in the last two rows.`}
        </caption>
        <colgroup>
          <col style={{ width: names }} />
          {keys.map((key) => (
            <col key={key.key.tonic} />
          ))}
        </colgroup>
        <thead>
          <tr>
            <th scope="col" style={{ ...first, ...foot, verticalAlign: "bottom", borderBottom: rule }}>
              Singer
            </th>
            {keys.map((key) => (
              <th key={key.key.tonic} scope="col" style={{ ...column(key === selected), borderBottom: rule }}>
                <button
                  type="button"
                  aria-pressed={key === selected}
                  data-testid={`pick-${key.key.tonic}`}
                  onClick={() => onSelect(key)}
                  style={picker(key === selected)}
                >
                  {setSigns(key.sign)}
                  <span style={under}>{key.place === 1 ? " fairest" : ""}</span>
                  <span style={unseen}>{`, ${key.spoken}`}</span>
                </button>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {singers.map((singer, row) => (
            <tr key={singer.id}>
              <th scope="row" style={{ ...first, borderBottom: line }}>
                <span style={clamp}>{setSigns(singer.name)}</span>
              </th>
              {keys.map((key) => {
                const part = key.parts[row];
                return (
                  <td
                    key={key.key.tonic}
                    onClick={() => onSelect(key)}
                    style={{ ...column(key === selected), borderBottom: line, cursor: "pointer" }}
                  >
                    {part && <HeatCell part={part} strong={key === selected} />}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
        <tfoot>
          {(["lowest", "mean"] as const).map((row) => (
            <tr key={row}>
              <th scope="row" style={{ ...first, ...foot }}>
                {row === "lowest" ? "Lowest score" : "Average"}
              </th>
              {keys.map((key) => (
                <td
                  key={key.key.tonic}
                  style={{
                    ...column(key === selected),
                    height: 32,
                    font: `${row === "lowest" || key === selected ? 600 : 400} 14px/1 ${fonts.mono}`,
                    color: row === "lowest" && key.beyond ? colors.brick : colors.ink,
                  }}
                >
                  {Math.round(key[row])}
                </td>
              ))}
            </tr>
          ))}
        </tfoot>
      </table>
    </div>
  );
}

const rule = `1.5px solid ${colors.ink}`;
const line = `1px solid ${colors.line}`;
const first: CSSProperties = {
  position: "sticky",
  left: 0,
  zIndex: 2,
  background: colors.paper,
  boxSizing: "border-box",
  padding: "4px 10px 4px 0",
  textAlign: "left",
  font: `600 15px/18px ${fonts.text}`,
};
const foot: CSSProperties = { font: `500 13px/16px ${fonts.text}`, color: colors.inkSoft };
const clamp: CSSProperties = {
  display: "-webkit-box",
  WebkitBoxOrient: "vertical",
  WebkitLineClamp: 2,
  overflow: "hidden",
  overflowWrap: "anywhere",
};
const under: CSSProperties = { display: "block", font: `500 12px/14px ${fonts.text}`, minHeight: 14 };

function column(on: boolean): CSSProperties {
  return {
    padding: 0,
    boxSizing: "border-box",
    textAlign: "center",
    background: on ? colors.card : "transparent",
    boxShadow: on ? `inset 2px 0 0 ${colors.plum}, inset -2px 0 0 ${colors.plum}` : undefined,
  };
}

function picker(on: boolean): CSSProperties {
  return {
    width: "100%",
    minHeight: 52,
    padding: "6px 2px 4px",
    border: 0,
    borderTop: `4px solid ${on ? colors.plum : "transparent"}`,
    background: "none",
    color: on ? colors.plum : colors.ink,
    font: `700 20px/22px ${fonts.display}`,
    cursor: "pointer",
  };
}
