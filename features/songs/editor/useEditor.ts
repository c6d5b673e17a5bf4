import { useCallback, useEffect, useRef, useState, type RefObject } from "react";
import type { KeyName } from "@/shared/music/keyName";
import { showInChart } from "./chartBox";
import { usePlacing, type Placing } from "./place/usePlacing";
import { draftErrors, type DraftErrors, type SongDraft } from "./songDraft";
import type { EditMode, SongFormProps } from "./SongForm";
import { useChartReading, type ChartReading } from "./useChartReading";
import { useSongEdits, type SongEdits } from "./useSongEdits";
import { useUndoKeys } from "./useUndoKeys";

export interface Editor {
  edits: SongEdits;
  reading: ChartReading;
  placing: Placing;
  mode: EditMode;
  chartBox: RefObject<HTMLDivElement | null>;
  /** what is wrong with the draft as it stands */
  wrong: DraftErrors;
  /** everything that the form asks for, but the errors to show */
  form: Omit<SongFormProps, "errors">;
}

/** One song being written (`id` null: a new one): its steps, how it reads, and where one is in it. */
export function useEditor(first: SongDraft, id: string | null): Editor {
  const edits = useSongEdits(first, id);
  const { draft, change } = edits;
  const reading = useChartReading(draft);
  const key: KeyName | null = draft.key ?? reading.finding?.key ?? null;
  const [mode, setMode] = useState<EditMode>("type");
  // While chords are placed the key may be found anew with each; the palette keeps its order under the thumb.
  const [pinned, setPinned] = useState<KeyName | null>(null);
  const placing = usePlacing({
    text: draft.chart,
    chart: reading.chart,
    key: mode === "place" ? (pinned ?? key) : key,
    placing: mode === "place",
    onText: (chart) => change({ chart }),
  });
  const goTo = (next: EditMode) => {
    setPinned(key);
    setMode(next);
  };
  const chartBox = useRef<HTMLDivElement>(null);
  useUndoKeys(edits, chartBox);

  const wanted = useRef<[number, number, number] | null>(null);
  useEffect(() => {
    // The field of the chart comes back with the mode it stands in.
    if (mode === "type" && wanted.current) showInChart(chartBox.current, ...wanted.current);
    wanted.current = null;
  }, [mode]);
  const onShow = useCallback(
    (row: number, column: number, length: number) => {
      if (mode === "type") showInChart(chartBox.current, row, column, length);
      else {
        wanted.current = [row, column, length];
        setMode("type");
      }
    },
    [mode],
  );
  const wrong = draftErrors(draft, key);
  return {
    edits,
    reading,
    placing,
    mode,
    chartBox,
    wrong,
    form: { edits, reading, mode, onMode: goTo, placing, chartBox, onShow },
  };
}

/** Puts the focus on the first field that is wrong. */
export function focusFirstWrong(): void {
  requestAnimationFrame(() => document.querySelector<HTMLElement>('form [aria-invalid="true"]')?.focus());
}
