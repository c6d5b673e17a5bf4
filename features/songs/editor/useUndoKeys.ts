import { useEffect, useLayoutEffect, useRef, type RefObject } from "react";
import { caretToChange } from "./chartBox";
import type { SongEdits } from "./useSongEdits";

/** Fields that go back and forth by themselves: what is typed there is no part of the song yet. */
function goesAlone(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement)) return false;
  return !/^(song|tune)-/.test(target.dataset.testid ?? "");
}

/** Ctrl+Z, Ctrl+Shift+Z and Ctrl+Y, and the same from the browser's menu, step through everything done to the song. */
export function useUndoKeys({ draft, undo, redo }: SongEdits, chartBox: RefObject<HTMLElement | null>): void {
  const stepped = useRef(false);
  const shown = useRef(draft.chart);
  useLayoutEffect(() => {
    if (stepped.current) caretToChange(chartBox.current, shown.current, draft.chart);
    stepped.current = false;
    shown.current = draft.chart;
  }, [draft.chart, chartBox]);
  useEffect(() => {
    const step = (event: Event, back: boolean) => {
      event.preventDefault();
      stepped.current = true;
      if (back) undo();
      else redo();
    };
    const keys = (event: KeyboardEvent) => {
      const key = event.key.toLowerCase();
      if (!(event.ctrlKey || event.metaKey) || event.altKey || goesAlone(event.target)) return;
      if (key === "z") step(event, !event.shiftKey);
      else if (key === "y" && !event.shiftKey) step(event, false);
    };
    const menu = (event: InputEvent) => {
      if (goesAlone(event.target)) return;
      if (event.inputType === "historyUndo") step(event, true);
      else if (event.inputType === "historyRedo") step(event, false);
    };
    // On their way down: fields let no key rise any further.
    document.addEventListener("keydown", keys, true);
    document.addEventListener("beforeinput", menu);
    return () => {
      document.removeEventListener("keydown", keys, true);
      document.removeEventListener("beforeinput", menu);
    };
  }, [undo, redo]);
}
