/** A part of the program that is fetched when it is first wanted, or before, while nothing else is to do. */
export type LazyPart = () => Promise<unknown>;

function idle(then: () => void): void {
  if (typeof window.requestIdleCallback === "function") window.requestIdleCallback(then, { timeout: 5000 });
  else setTimeout(then, 200);
}

const savesData = () => (navigator as { connection?: { saveData?: boolean } }).connection?.saveData === true;

/**
 * Fetches the given parts one after the other, each in an idle moment, so that they are there should the connection go.
 * A part that cannot be had now is fetched when it is wanted. Returns how to stop.
 */
export function fetchWhenIdle(parts: readonly LazyPart[]): () => void {
  let stopped = savesData();
  const next = (index: number): void => {
    const part = parts[index];
    if (stopped || !part) return;
    idle(() => {
      if (stopped) return;
      const going = () => next(index + 1);
      part().then(going, going);
    });
  };
  const start = () => next(0);
  if (document.readyState === "complete") start();
  else window.addEventListener("load", start, { once: true });
  return () => {
    stopped = true;
    window.removeEventListener("load", start);
  };
}
