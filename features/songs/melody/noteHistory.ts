import type { MelodyNote } from "@/shared/songs/melody";

/** First and last chosen note; null where none is. */
export type Chosen = { from: number; to: number } | null;

/** Notes as they stood at one time. */
export interface Moment {
  notes: readonly MelodyNote[];
  chosen: Chosen;
}

/** The notes being edited, with the way back and forth. */
export interface NoteHistory extends Moment {
  past: readonly Moment[];
  future: readonly Moment[];
}

export type NoteStep =
  | { kind: "edit"; notes: readonly MelodyNote[]; chosen: Chosen }
  | { kind: "choose"; chosen: Chosen }
  | { kind: "undo" }
  | { kind: "redo" };

const mostSteps = 200;
const mostKept = { steps: 30, notes: 3_000 };

export function beginHistory(notes: readonly MelodyNote[]): NoteHistory {
  return { notes, chosen: notes.length > 0 ? { from: 0, to: 0 } : null, past: [], future: [] };
}

/** The latest steps that are kept with a draft, so that a reload leaves the way back: as many as stay small. */
export function stepsToKeep({ past }: NoteHistory): Moment[] {
  let left = mostKept.notes;
  const enough = past.slice(-mostKept.steps).findLastIndex(({ notes }) => (left -= notes.length) < 0);
  return past.slice(-mostKept.steps).slice(enough + 1);
}

/** One step: an edit forgets what was undone; choosing notes is no edit. */
export function noteHistory(state: NoteHistory, step: NoteStep): NoteHistory {
  const now = { notes: state.notes, chosen: state.chosen };
  if (step.kind === "choose") return { ...state, chosen: within(step.chosen, state.notes.length) };
  if (step.kind === "edit") {
    const past = [...state.past, now].slice(-mostSteps);
    return { notes: step.notes, chosen: within(step.chosen, step.notes.length), past, future: [] };
  }
  const [from, to] = step.kind === "undo" ? (["past", "future"] as const) : (["future", "past"] as const);
  const target = state[from].at(-1);
  if (!target) return state;
  return { ...target, [from]: state[from].slice(0, -1), [to]: [...state[to], now] } as unknown as NoteHistory;
}

function within(chosen: Chosen, count: number): Chosen {
  if (!chosen || count === 0) return null;
  const clamp = (index: number) => Math.max(0, Math.min(count - 1, index));
  const [from, to] = [clamp(chosen.from), clamp(chosen.to)];
  return from <= to ? { from, to } : { from: to, to: from };
}
