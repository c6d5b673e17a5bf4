/** What a key does on stage. Pedals send the keys of a keyboard. */
export type StageAct = "start-stop" | "forward" | "back" | "faster" | "slower" | "tap" | "leave";

const acts: Readonly<Record<string, StageAct>> = {
  " ": "start-stop",
  Enter: "start-stop",
  PageDown: "forward",
  ArrowDown: "forward",
  ArrowRight: "forward",
  PageUp: "back",
  ArrowUp: "back",
  ArrowLeft: "back",
  "+": "faster",
  "=": "faster",
  "-": "slower",
  t: "tap",
  T: "tap",
  Escape: "leave",
};

/** Null for keys that mean nothing here, with a modifier, or that press the button which has the focus. */
export function stageAct(
  event: Pick<KeyboardEvent, "key" | "ctrlKey" | "metaKey" | "altKey">,
  onButton: boolean,
): StageAct | null {
  if (event.ctrlKey || event.metaKey || event.altKey) return null;
  if (onButton && (event.key === " " || event.key === "Enter")) return null;
  return acts[event.key] ?? null;
}

/** Taps further apart than this begin anew. */
const longestGapMs = 2500;
const mostTaps = 8;

/** The tempo that taps give, by the middle one of their gaps; null before the third. Times in ms. */
export function tappedTempo(taps: readonly number[]): number | null {
  const gaps = taps.slice(1).map((time, k) => time - taps[k]!);
  const sorted = [...gaps].sort((a, b) => a - b);
  const middle = sorted[sorted.length >> 1];
  return gaps.length < 2 || middle === undefined || middle <= 0
    ? null
    : Math.min(240, Math.max(30, Math.round(60_000 / middle)));
}

/** The taps so far with one more. */
export function withTap(taps: readonly number[], now: number): number[] {
  const last = taps.at(-1);
  return last === undefined || now - last > longestGapMs ? [now] : [...taps, now].slice(-mostTaps);
}
