import { useCallback, useReducer } from "react";
import { changeTo, redo, startHistory, undo, type EditHistory } from "./editHistory";
import type { SongDraft } from "./songDraft";

type Act =
  | { kind: "change"; changes: Partial<SongDraft>; tag: string | null; now: number }
  | { kind: "undo" }
  | { kind: "redo" };

export interface SongEdits {
  draft: SongDraft;
  /** `tag` names the field one types in: letters in a row are one step; without it the change is a step of its own */
  change: (changes: Partial<SongDraft>, tag?: string) => void;
  undo: () => void;
  redo: () => void;
  canUndo: boolean;
  canRedo: boolean;
}

function reduce(history: EditHistory<SongDraft>, act: Act): EditHistory<SongDraft> {
  if (act.kind === "undo") return undo(history);
  if (act.kind === "redo") return redo(history);
  const { present } = history;
  const names = Object.keys(act.changes) as (keyof SongDraft)[];
  if (names.every((name) => Object.is(present[name], act.changes[name]))) return history;
  return changeTo(history, { ...present, ...act.changes }, act.tag, act.now);
}

/** What is typed and done to a song, with every step back and forth. */
export function useSongEdits(first: SongDraft): SongEdits {
  const [history, act] = useReducer(reduce, first, startHistory<SongDraft>);
  const change = useCallback(
    (changes: Partial<SongDraft>, tag?: string) => act({ kind: "change", changes, tag: tag ?? null, now: Date.now() }),
    [],
  );
  return {
    draft: history.present,
    change,
    undo: useCallback(() => act({ kind: "undo" }), []),
    redo: useCallback(() => act({ kind: "redo" }), []),
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
  };
}
