import { memo, type CSSProperties } from "react";
import { setSigns } from "@/features/ui/textSigns";
import { colors, fonts } from "@/features/ui/theme";
import { glyphs } from "@/shared/music/pitch";
import type { ChartRow, RowSign } from "@/shared/sheets/chartRows";
import { rowHeight } from "@/shared/sheets/sheetRowPieces";

export interface SheetLinesProps {
  rows: readonly ChartRow[];
  /** px */
  size: number;
  /** level of the headings of parts */
  level: 2 | 3;
  /** the row that is played now; null for none */
  now?: number | null;
}

/** The rows of a sheet on a screen, each exactly as high as the layout counts it. */
export function SheetLines({ rows, size, level, now = null }: SheetLinesProps) {
  return (
    <div data-mono="" style={{ font: `400 ${size}px/1 ${fonts.mono}`, color: colors.ink }}>
      {rows.map((row, index) => (
        <Row key={index} row={row} size={size} level={level} now={index === now} />
      ))}
    </div>
  );
}

/** How wide one column of letters is, px. */
export const columnsIn = (width: number, size: number) => Math.max(8, Math.floor(width / (size * 0.58) + 1e-6));

const Row = memo(function Row({ row, size, level, now }: { row: ChartRow; size: number; level: 2 | 3; now: boolean }) {
  const height = rowHeight(row, size);
  const box: CSSProperties = { position: "relative", height, ...(now ? marked : null) };
  if (row.kind === "blank") return <div style={{ height }} />;
  if (row.kind === "heading")
    return (
      <div style={{ ...box, display: "flex", alignItems: "center", gap: 10 }}>
        <span
          role="heading"
          aria-level={level}
          style={{ font: `700 ${size * 0.85}px/1.2 ${fonts.display}`, color: colors.inkSoft }}
        >
          {setSigns(glyphs(row.words.replace(/\(?\b[x×]\s?(\d{1,2})\)?$/i, "×$1")))}
        </span>
        <span style={{ flexGrow: 1, height: 1, background: colors.line }} />
      </div>
    );
  const remark = row.kind === "remark" ? { color: colors.inkSoft, fontStyle: "italic" } : null;
  return (
    <div style={box} data-now={now ? "" : undefined}>
      {row.signs.map((sign) => (
        <Sign key={sign.column} sign={sign} size={size} />
      ))}
      {row.words !== "" && (
        <span
          style={{ position: "absolute", left: 0, bottom: size * 0.18, whiteSpace: "pre", lineHeight: 1.2, ...remark }}
        >
          {setSigns(row.words)}
        </span>
      )}
    </div>
  );
});

/** A bar beside the line that stands outside of it, so that nothing moves. */
const marked: CSSProperties = { boxShadow: `-12px 0 0 0 ${colors.paper}, -16px 0 0 0 ${colors.plum}` };

function Sign({ sign: { column, text, chord, number }, size }: { sign: RowSign; size: number }) {
  return (
    <span style={{ position: "absolute", left: `${column}ch`, top: size * 0.24, whiteSpace: "pre", fontWeight: 600 }}>
      {number !== null && (
        <span
          style={{
            display: "block",
            font: `400 ${size * 0.68}px/${size * 0.85}px ${fonts.mono}`,
            color: colors.inkSoft,
          }}
        >
          {setSigns(`${number} `)}
        </span>
      )}
      <span style={{ color: chord ? colors.plum : colors.inkSoft }}>{setSigns(text)}</span>{" "}
    </span>
  );
}
