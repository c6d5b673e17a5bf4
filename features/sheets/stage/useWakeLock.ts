import { useEffect, useState } from "react";

interface Sentinel {
  release(): Promise<void>;
  addEventListener(type: "release", listener: () => void): void;
}

/** Whether the screen stays on: asked for, held, or not to be had. */
export type Wakefulness = "asking" | "held" | "refused" | "unknown-here";

const lockOf = () =>
  (navigator as unknown as { wakeLock?: { request(type: "screen"): Promise<Sentinel> } }).wakeLock ?? null;

/** Keeps the screen on while the page is shown, where the browser can; asks again when one comes back to it. */
export function useWakeLock(): Wakefulness {
  const [state, setState] = useState<Wakefulness>(() => (lockOf() ? "asking" : "unknown-here"));
  useEffect(() => {
    const lock = lockOf();
    if (!lock) return;
    let gone = false;
    let held: Sentinel | null = null;
    const ask = async () => {
      if (document.visibilityState !== "visible" || held) return;
      try {
        const got = await lock.request("screen");
        if (gone) return void got.release();
        held = got;
        got.addEventListener("release", () => {
          held = null;
        });
        setState("held");
      } catch {
        if (!gone) setState("refused");
      }
    };
    const again = () => void ask();
    again();
    document.addEventListener("visibilitychange", again);
    return () => {
      gone = true;
      document.removeEventListener("visibilitychange", again);
      void held?.release();
    };
  }, []);
  return state;
}
