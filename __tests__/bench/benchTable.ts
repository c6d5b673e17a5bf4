import { BARS, measureBar, type TaggedScore } from "./bars";
import { summarize, type Scored, type Summary } from "./scoring";

/** One row to print: a tool, or a condition. */
export interface TableRow {
  name: string;
  scored: readonly Scored[];
  /** the same clips with the range taken from extreme frames */
  byExtremes: readonly Scored[];
  timesRealTime?: number;
}

const COLUMNS = [
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

/** A Markdown table of all measures, a row each. */
export function measuresTable(head: string, rows: readonly TableRow[]): string {
  const cells = rows.map(({ name, scored, byExtremes, timesRealTime }) => {
    const s = summarize(scored);
    const track = [s.rpa, s.rca, s.voicingRecall, s.voicingFalseAlarm, s.octaveErrors];
    const shares = [...track, summarize(byExtremes).bothEnds, s.bothEnds, s.refused, s.accepted];
    return [name, String(s.clips), ...shares.map(percent), timesRealTime?.toFixed(0) ?? "–"];
  });
  return markdown([head, ...COLUMNS], cells);
}

/** A Markdown table of one measure: a row a condition, a column a tool. */
export function comparisonTable(
  measure: Exclude<keyof Summary, "clips">,
  tools: readonly string[],
  conditions: readonly { name: string; byTool: readonly (readonly Scored[])[] }[],
): string {
  const cells = conditions.map(({ name, byTool }) => [
    name,
    String(byTool[0]?.length ?? 0),
    ...byTool.map((scored) => percent(summarize(scored)[measure])),
  ]);
  return markdown(["condition", "clips", ...tools], cells);
}

/** A Markdown table of the bars: what is asked, what was measured. */
export function barsTable(scores: readonly TaggedScore[]): string {
  const cells = BARS.map((bar) => {
    const { value, met } = measureBar(bar, scores);
    const asked = bar.atLeast === undefined ? `≤ ${percent(bar.atMost ?? 0)}` : `≥ ${percent(bar.atLeast)}`;
    return [bar.name, asked, percent(value), value === null ? "no such clip" : met ? "reached" : "missed"];
  });
  return markdown(["bar", "asked %", "measured %", ""], cells);
}

function markdown(head: readonly string[], cells: readonly (readonly string[])[]): string {
  const widths = head.map((column, k) => Math.max(column.length, ...cells.map((row) => row[k]!.length)));
  const line = (row: readonly string[]): string =>
    `| ${row.map((cell, k) => (k === 0 ? cell.padEnd(widths[k]!) : cell.padStart(widths[k]!))).join(" | ")} |`;
  const rule = `|${widths.map((w, k) => (k === 0 ? "-".repeat(w + 2) : `${"-".repeat(w + 1)}:`)).join("|")}|`;
  return [line(head), rule, ...cells.map(line)].join("\n");
}

function percent(share: number | null): string {
  return share === null ? "–" : (100 * share).toFixed(1);
}
