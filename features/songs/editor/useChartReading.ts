import { useDeferredValue, useMemo } from "react";
import type { KeyName } from "@/shared/music/keyName";
import { parseChart, type Chart } from "@/shared/songs/chart";
import { findKey, type KeyFinding } from "@/shared/songs/findKey";
import type { SongDraft } from "./songDraft";

export interface ChartReading {
  chart: Chart;
  finding: KeyFinding | null;
}

const notesOf = (draft: SongDraft) => (draft.tune === "melody" ? draft.melody?.notes : undefined);

/** What is read from the chart while it is typed; it may be a letter behind. */
export function useChartReading(draft: SongDraft): ChartReading {
  const text = useDeferredValue(draft.chart);
  const chart = useMemo(() => parseChart(text), [text]);
  const notes = notesOf(draft);
  const finding = useMemo(() => findKey({ chart, ...(notes ? { notes } : null) }), [chart, notes]);
  return { chart, finding };
}

/** The key that chart and tune speak of, from their last letter. */
export function keyOfDraft(draft: SongDraft): KeyName | null {
  const notes = notesOf(draft);
  return findKey({ chart: parseChart(draft.chart), ...(notes ? { notes } : null) })?.key ?? null;
}
