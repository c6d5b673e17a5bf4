import type { CSSProperties } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { unseen } from "@/features/ui/unseen";
import type { Fit, GroupPart } from "./groupKey";

/** One singer in one key: the score, warmer the higher it is, and at its foot how the tune lies: solid, hatched or dotted. */
export function HeatCell({ part, strong }: { part: GroupPart; strong: boolean }) {
  const { fit, score } = part;
  const points = Math.round(score);
  return (
    <span
      style={{
        ...box,
        background: fit === "beyond" ? "transparent" : heat(points),
        border: fit === "beyond" ? `1.5px dotted ${colors.brick}` : "1.5px solid transparent",
        color: fit === "beyond" ? colors.brick : colors.ink,
      }}
    >
      <span style={{ font: `${strong ? 700 : 600} 16px/20px ${fonts.display}` }}>
        {points}
        {fit === "beyond" && <span style={{ fontSize: 11 }}> {setSigns(arrows(part))}</span>}
      </span>
      {fit !== "beyond" && <span aria-hidden style={{ ...strip, background: strips[fit] }} />}
      <span style={unseen}>{`, ${part.short}`}</span>
    </span>
  );
}

/** What the pictures in the cells mean. */
export function HeatLegend() {
  const items: [Fit, string][] = [
    ["comfort", "all in the comfort band"],
    ["reach", "some of it in reach"],
    ["beyond", "some of it beyond the range, ▲ above, ▼ below"],
  ];
  return (
    <ul style={{ ...legend, margin: "10px 0 0", padding: 0, listStyle: "none" }}>
      {items.map(([fit, words]) => (
        <li key={fit} style={{ display: "flex", alignItems: "center", gap: 8 }}>
          {fit === "beyond" ? (
            <span
              aria-hidden
              style={{ width: 22, height: 12, border: `1.5px dotted ${colors.brick}`, borderRadius: 4 }}
            />
          ) : (
            <span aria-hidden style={{ ...strip, width: 24, height: 6, background: strips[fit] }} />
          )}
          <span>{setSigns(words)}</span>
        </li>
      ))}
    </ul>
  );
}

function arrows({ over, under }: GroupPart): string {
  return `${over > 0 ? "▲" : ""}${under > 0 ? "▼" : ""}`;
}

/** No key without a note outside has fewer points. */
const leastInside = 43;

function heat(points: number): string {
  const share = Math.max(0, Math.min(1, (points - leastInside) / (100 - leastInside)));
  return `color-mix(in srgb, ${colors.lagoon} ${Math.round(4 + 34 * share ** 1.5)}%, ${colors.card})`;
}

const strips: Record<Exclude<Fit, "beyond">, string> = {
  comfort: colors.lagoon,
  reach: `repeating-linear-gradient(135deg, ${colors.honey} 0 2px, transparent 2px 5px)`,
};
const strip: CSSProperties = { display: "block", width: 24, height: 5, borderRadius: 2, flexShrink: 0 };
const box: CSSProperties = {
  position: "relative",
  display: "flex",
  flexDirection: "column",
  alignItems: "center",
  justifyContent: "center",
  gap: 3,
  boxSizing: "border-box",
  height: 44,
  margin: "2px 4px",
  borderRadius: 8,
};
const legend: CSSProperties = {
  display: "flex",
  flexWrap: "wrap",
  columnGap: 28,
  rowGap: 6,
  font: `400 13px/18px ${fonts.text}`,
  color: colors.inkSoft,
};
