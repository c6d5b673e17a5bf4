import { useEffect, useRef } from "react";

/** How far down each address of a list was read. */
const places = new Map<string, number>();
let wentBackAt = -Infinity;
if (typeof window !== "undefined") window.addEventListener("popstate", () => (wentBackAt = performance.now()));

/** A change of page by the way back takes no longer than this, in ms. */
const soon = 2000;
const address = () => window.location.pathname + window.location.search;

/** Whoever comes back to a list finds it where it was left; whoever comes anew begins at its top. */
export function usePlaceInList(ready: boolean): void {
  const restored = useRef(false);
  useEffect(() => {
    const remember = () => places.set(address(), window.scrollY);
    window.addEventListener("scroll", remember, { passive: true });
    return () => window.removeEventListener("scroll", remember);
  }, []);
  useEffect(() => {
    if (!ready || restored.current) return;
    restored.current = true;
    const place = places.get(address());
    if (place === undefined || place === 0 || performance.now() - wentBackAt > soon) return;
    // After the page has put itself at its top, as every page does.
    const frame = requestAnimationFrame(() => window.scrollTo(0, place));
    return () => cancelAnimationFrame(frame);
  }, [ready]);
}
