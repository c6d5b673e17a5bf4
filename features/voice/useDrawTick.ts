import { useEffect, useState } from "react";

const calmMs = 250;

/** Draws again at the screen's own pace, or every `everyMs`; four times a second where motion is not wanted. */
export function useDrawTick(everyMs = 0): number {
  const [nowMs, setNowMs] = useState(() => performance.now());
  useEffect(() => {
    const calm = window.matchMedia?.("(prefers-reduced-motion: reduce)").matches ?? false;
    const pace = calm ? Math.max(calmMs, everyMs) : everyMs;
    let last = -Infinity;
    let handle = requestAnimationFrame(function draw(atMs) {
      if (atMs - last >= pace) {
        last = atMs;
        setNowMs(performance.now());
      }
      handle = requestAnimationFrame(draw);
    });
    return () => cancelAnimationFrame(handle);
  }, [everyMs]);
  return nowMs;
}
