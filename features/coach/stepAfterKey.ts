/** Where a key leads from one step; null where it means something else, as in a field or among answers. */
export function stepAfterKey(event: { key: string; target?: unknown }, at: number, count: number): number | null {
  const on = event.target instanceof Element ? event.target : null;
  if (on?.closest("input,select,textarea,[role=radiogroup],[role=group]")) return null;
  if (event.key === "ArrowRight" && at < count - 1) return at + 1;
  return event.key === "ArrowLeft" && at > 0 ? at - 1 : null;
}
