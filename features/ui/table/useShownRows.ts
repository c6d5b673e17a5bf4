import { useWindowVirtualizer, type VirtualItem } from "@tanstack/react-virtual";
import { useCallback, useEffect, useLayoutEffect, useRef, useState, useSyncExternalStore } from "react";

export interface ShownRows {
  /** of the element that holds the rows */
  frame: React.RefObject<HTMLDivElement | null>;
  rows: readonly Pick<VirtualItem, "index" | "key">[];
  /** room for the rows over and under those that are there */
  before: number;
  after: number;
  /** for each row's element, which must carry `data-index` */
  measure: ((row: Element | null) => void) | undefined;
}

/** How near the end the next page is asked for, in rows. */
const ahead = 30;

/** The rows of a long list that are in sight, with some to spare; all of them on paper. `more` fetches what follows. */
export function useShownRows(keys: readonly string[], height: number, more?: () => void): ShownRows {
  const frame = useRef<HTMLDivElement>(null);
  const top = useTopOf(frame, keys);
  const printing = useSyncExternalStore(onPrint, isPrinting, () => false);
  const estimateSize = useCallback(() => height, [height]);
  const getItemKey = useCallback((index: number) => keys[index] ?? index, [keys]);
  const list = useWindowVirtualizer({
    count: keys.length,
    estimateSize,
    getItemKey,
    overscan: 8,
    scrollMargin: top,
    // Rows come in a render of their own, so that scrolling itself never waits for them.
    useFlushSync: false,
  });
  const items = list.getVirtualItems();
  const last = items.at(-1)?.index ?? -1;
  const asked = useRef(more);
  useEffect(() => {
    asked.current = more;
  });
  useEffect(() => {
    if (keys.length > 0 && last >= keys.length - ahead) asked.current?.();
  }, [last, keys.length]);
  if (printing)
    return {
      frame,
      rows: keys.map((key, index) => ({ key, index })),
      before: 0,
      after: 0,
      measure: undefined,
    };
  return {
    frame,
    rows: items,
    before: (items[0]?.start ?? top) - top,
    after: Math.max(0, list.getTotalSize() - ((items.at(-1)?.end ?? top) - top)),
    measure: list.measureElement,
  };
}

/** Where the list begins on the page; what stands over it may grow and shrink. */
function useTopOf(frame: React.RefObject<HTMLDivElement | null>, keys: readonly string[]): number {
  const [top, setTop] = useState(0);
  useLayoutEffect(() => {
    const look = () => setTop(Math.round((frame.current?.getBoundingClientRect().top ?? 0) + window.scrollY));
    look();
    if (typeof ResizeObserver === "undefined") return;
    const watch = new ResizeObserver(look);
    watch.observe(document.documentElement);
    return () => watch.disconnect();
  }, [frame, keys]);
  return top;
}

let printing = false;

function isPrinting(): boolean {
  return printing;
}

function onPrint(changed: () => void): () => void {
  const begin = () => {
    printing = true;
    changed();
  };
  const end = () => {
    printing = false;
    changed();
  };
  window.addEventListener("beforeprint", begin);
  window.addEventListener("afterprint", end);
  return () => {
    window.removeEventListener("beforeprint", begin);
    window.removeEventListener("afterprint", end);
  };
}
