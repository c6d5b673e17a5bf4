/** What was, is, and was taken back. Values are never changed in place. */
export interface EditHistory<Value> {
  past: readonly Value[];
  present: Value;
  future: readonly Value[];
  /** where one is typing: more of it joins the same step */
  typing: { tag: string; since: number; last: number } | null;
}

/** A pause in typing of so many milliseconds begins a new step; nor does a step take longer than the second figure. */
const pause = 1000;
const longestStep = 6000;
const mostSteps = 300;

export function startHistory<Value>(present: Value): EditHistory<Value> {
  return { past: [], present, future: [], typing: null };
}

/**
 * Makes a change.
 *
 * @param tag the field one types in, so that letters typed in a row become one step; null for a step of its own
 * @param now milliseconds
 */
export function changeTo<Value>(
  history: EditHistory<Value>,
  present: Value,
  tag: string | null,
  now: number,
): EditHistory<Value> {
  const { typing } = history;
  const joins = typing !== null && typing.tag === tag && now - typing.last < pause && now - typing.since < longestStep;
  return {
    past: joins ? history.past : [...history.past, history.present].slice(-mostSteps),
    present,
    future: [],
    typing: tag === null ? null : { tag, since: joins ? typing.since : now, last: now },
  };
}

export function undo<Value>(history: EditHistory<Value>): EditHistory<Value> {
  const before = history.past.at(-1);
  if (before === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: before,
    future: [history.present, ...history.future],
    typing: null,
  };
}

export function redo<Value>(history: EditHistory<Value>): EditHistory<Value> {
  const [next, ...future] = history.future;
  if (next === undefined) return history;
  return { past: [...history.past, history.present], present: next, future, typing: null };
}
