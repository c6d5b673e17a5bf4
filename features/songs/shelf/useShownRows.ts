import { useWindowVirtualizer, type VirtualItem } from "@tanstack/react-virtual";
import { useEffect, useLayoutEffect, useRef, useState, useSyncExternalStore } from "react";

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

/** The rows of a long list that are in sight, with some to spare; all of them on paper. */
export function useShownRows(keys: readonly string[], height: number, more: () => void): ShownRows {
  const frame = useRef<HTMLDivElement>(null);
  const [top, setTop] = useState(0);
  const printing = useSyncExternalStore(onPrint, isPrinting, () => false);
  useLayoutEffect(() => {
    const from = (frame.current?.getBoundingClientRect().top ?? 0) + window.scrollY;
    if (Math.abs(from - top) > 1) setTop(from);
  });
  const list = useWindowVirtualizer({
    count: keys.length,
    estimateSize: () => height,
    overscan: 8,
    scrollMargin: top,
    getItemKey: (index) => keys[index] ?? index,
  });
  const items = list.getVirtualItems();
  const last = items.at(-1)?.index ?? -1;
  const asked = useRef(more);
  useEffect(() => {
    asked.current = more;
  });
  useEffect(() => {
    if (keys.length > 0 && last >= keys.length - ahead) asked.current();
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
