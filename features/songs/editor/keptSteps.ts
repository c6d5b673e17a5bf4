import { startHistory, type EditHistory } from "./editHistory";
import type { SongDraft } from "./songDraft";

/** What a step changes: of texts the letters between an unchanged beginning and end, all else as a whole. */
type Step = Partial<Record<keyof SongDraft, { head: number; tail: number; text: string } | { value: unknown }>>;

/** The steps of a draft as they outlive a reload. */
export interface KeptSteps {
  /** tells which draft they lead away from */
  of: string;
  /** the nearest first */
  past: Step[];
  future: Step[];
}

const mostSteps = 60;
const mostLetters = 200_000;

/** The nearest steps back and forth, as far as they are worth keeping. */
export function packSteps({ past, present, future }: EditHistory<SongDraft>): KeptSteps {
  let left = mostLetters;
  const pack = (states: readonly SongDraft[]): Step[] => {
    const steps: Step[] = [];
    let from = present;
    for (const state of states.slice(0, mostSteps)) {
      const step = stepTo(from, state);
      left -= JSON.stringify(step).length;
      if (left < 0) break;
      steps.push(step);
      from = state;
    }
    return steps;
  };
  return { of: markOf(present), past: pack([...past].reverse()), future: pack(future) };
}

/** The history of a draft with its kept steps; without them where they belong to another draft. */
export function unpackSteps(present: SongDraft, kept: KeptSteps | null): EditHistory<SongDraft> {
  const history = startHistory(present);
  if (kept?.of !== markOf(present)) return history;
  const unpack = (steps: readonly Step[]) => {
    let state = present;
    return steps.map((step) => (state = take(state, step)));
  };
  return { ...history, past: unpack(kept.past).reverse(), future: unpack(kept.future) };
}

/** What is the same before and after a song was kept: a key that was found is then a key that is written. */
function markOf({ key: _key, melody, ...draft }: SongDraft): string {
  return JSON.stringify([draft, melody?.notes.length ?? null]);
}

function stepTo(from: SongDraft, to: SongDraft): Step {
  const names = (Object.keys(to) as (keyof SongDraft)[]).filter((name) => !Object.is(from[name], to[name]));
  return Object.fromEntries(names.map((name) => [name, difference(from[name], to[name])]));
}

function difference(from: unknown, to: unknown): Step[keyof SongDraft] {
  if (typeof from !== "string" || typeof to !== "string") return { value: to };
  const most = Math.min(from.length, to.length);
  let head = 0;
  while (head < most && from[head] === to[head]) head += 1;
  let tail = 0;
  while (tail < most - head && from[from.length - 1 - tail] === to[to.length - 1 - tail]) tail += 1;
  return { head, tail, text: to.slice(head, to.length - tail) };
}

function take(state: SongDraft, step: Step): SongDraft {
  const changes = Object.entries(step).map(([name, change]) => {
    if ("value" in change) return [name, change.value];
    const before = state[name as keyof SongDraft] as string;
    return [name, before.slice(0, change.head) + change.text + before.slice(before.length - change.tail)];
  });
  return { ...state, ...(Object.fromEntries(changes) as Partial<SongDraft>) };
}
