import { useCallback, useSyncExternalStore } from "react";
import type { LiveSound } from "../recorder/liveSound";

/**
 * Follows what is heard: draws again at once when `read` gives another value, and only then. The value must be a plain
 * one (a number, a text), so that it can be compared.
 */
export function useHeard<Value extends string | number>(live: LiveSound, read: (live: LiveSound) => Value): Value {
  const subscribe = useCallback(
    (listener: () => void) => {
      live.listeners.add(listener);
      return () => void live.listeners.delete(listener);
    },
    [live],
  );
  return useSyncExternalStore(subscribe, () => read(live));
}
