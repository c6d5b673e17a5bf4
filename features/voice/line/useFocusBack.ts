import { useEffect, useRef, type RefObject } from "react";
import type { View } from "react-native";

/** Stop goes away when the singing is over: where that left the focus nowhere, it comes back to the button that began it. */
export function useFocusBack(place: RefObject<View | null>, resting: boolean): void {
  const wasAway = useRef(false);
  useEffect(() => {
    const back = resting && wasAway.current && document.activeElement === document.body;
    wasAway.current = !resting;
    if (back) (place.current as unknown as HTMLElement | null)?.querySelector("button")?.focus({ preventScroll: true });
  }, [place, resting]);
}
