import { useCallback, useEffect, useReducer } from "react";
import { deviceDraft } from "@/features/api/deviceDraft";
import { changeTo, redo, undo, type EditHistory } from "./editHistory";
import { packSteps, unpackSteps, type KeptSteps } from "./keptSteps";
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

const steps = deviceDraft<KeptSteps>("song-steps", "tab");

/** Lets the steps of a song go: null for a new one. */
export function forgetSteps(id: string | null): void {
  steps.clear(id ?? "new");
}

function reduce(history: EditHistory<SongDraft>, act: Act): EditHistory<SongDraft> {
  if (act.kind === "undo") return undo(history);
  if (act.kind === "redo") return redo(history);
  const { present } = history;
  const names = Object.keys(act.changes) as (keyof SongDraft)[];
  if (names.every((name) => Object.is(present[name], act.changes[name]))) return history;
  return changeTo(history, { ...present, ...act.changes }, act.tag, act.now);
}

/** What is typed and done to a song, with every step back and forth; in one tab the latest outlive a reload. */
export function useSongEdits(first: SongDraft, id: string | null): SongEdits {
  const place = id ?? "new";
  const [history, act] = useReducer(reduce, first, (draft) => unpackSteps(draft, steps.load(place)));
  useEffect(() => {
    if (history.past.length + history.future.length > 0) steps.save(place, packSteps(history));
  }, [history, place]);
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
