import { summarize, type Scored, type Summary } from "./scoring";

/** One row to print: a tool in one condition. */
export interface TableRow {
  tool: string;
  scored: readonly Scored[];
  /** the same clips with the range taken from extreme frames; absent for tools with a range of their own */
  byExtremes?: readonly Scored[];
  timesRealTime?: number;
}

const COLUMNS = [
  "tool",
  "clips",
  "RPA %",
  "RCA %",
  "voicing recall %",
  "false alarm %",
  "octave errors %",
  "range by min/max %",
  "range by notes %",
  "singing refused %",
  "others accepted %",
  "× real time",
];

/** A Markdown table of the measures of each row. */
export function benchTable(rows: readonly TableRow[]): string {
  const cells = rows.map(({ tool, scored, byExtremes, timesRealTime }) => {
    const s: Summary = summarize(scored);
    const extremes = byExtremes ? summarize(byExtremes).bothEnds : null;
    const shares = [
      s.rpa,
      s.rca,
      s.voicingRecall,
      s.voicingFalseAlarm,
      s.octaveErrors,
      extremes,
      s.bothEnds,
      s.refused,
      s.accepted,
    ];
    return [
      tool,
      String(s.clips),
      ...shares.map(percent),
      timesRealTime === undefined ? "–" : timesRealTime.toFixed(0),
    ];
  });
  const widths = COLUMNS.map((column, k) => Math.max(column.length, ...cells.map((row) => row[k]!.length)));
  const line = (row: readonly string[]): string =>
    `| ${row.map((cell, k) => (k === 0 ? cell.padEnd(widths[k]!) : cell.padStart(widths[k]!))).join(" | ")} |`;
  const rule = `|${widths.map((w, k) => (k === 0 ? "-".repeat(w + 2) : `${"-".repeat(w + 1)}:`)).join("|")}|`;
  return [line(COLUMNS), rule, ...cells.map(line)].join("\n");
}

function percent(share: number | null): string {
  return share === null ? "–" : (100 * share).toFixed(1);
}
