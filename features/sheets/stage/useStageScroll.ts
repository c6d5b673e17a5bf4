import { useCallback, useEffect, useRef, useState, type RefObject } from "react";

/** The line that is played stands here in the view, from its top. */
const readingShare = 0.35;
/** What a turn of the page leaves of the page before, px of the view's height. */
const keptShare = 0.15;

export interface StageScrollOptions {
  scroller: RefObject<HTMLElement | null>;
  /** upper edge of each row, px, and the height of all */
  tops: readonly number[];
  height: number;
  /** px a second */
  speed: number;
  /** no steady scroll: pages turn by themselves instead */
  paged: boolean;
  /** told at every frame while it runs: seconds since the last one */
  onTime: (seconds: number) => void;
}

/** Scrolls the words at a steady speed, follows a hand that moves them, and turns pages at a row. */
export function useStageScroll({ scroller, tops, height, speed, paged, onTime }: StageScrollOptions) {
  const [running, setRunning] = useState(false);
  const [row, setRow] = useState(0);
  /** what is played now, px from the top of all rows */
  const position = useRef(0);
  /** where this scrolled to last, to tell a hand's scrolling from its own */
  const own = useRef(0);
  const latest = useRef({ tops, height, speed, paged, onTime });
  useEffect(() => {
    latest.current = { tops, height, speed, paged, onTime };
  });

  const show = useCallback(() => {
    const all = latest.current.tops;
    const at = all.findLastIndex((top) => top <= position.current + 1);
    setRow(Math.max(0, at));
  }, []);
  const scrollTo = useCallback(
    (top: number) => {
      const node = scroller.current;
      if (!node) return;
      node.scrollTop = Math.max(0, top);
      own.current = node.scrollTop;
    },
    [scroller],
  );

  useEffect(() => {
    if (!running) return;
    let frame = 0;
    let before: number | null = null;
    const step = (now: number) => {
      const node = scroller.current;
      const { speed: fast, height: all, paged: turns, onTime: tell, tops: rows } = latest.current;
      // A tab that was away does not make up for it.
      const seconds = before === null ? 0 : Math.min(0.25, (now - before) / 1000);
      before = now;
      if (node) {
        position.current = Math.min(all, position.current + fast * seconds);
        const view = node.clientHeight;
        if (!turns) scrollTo(position.current - readingShare * view);
        else if (position.current > node.scrollTop + (1 - keptShare) * view) {
          scrollTo(rows.findLast((top) => top <= position.current) ?? 0);
        }
        tell(seconds);
        show();
        if (position.current >= all) {
          setRunning(false);
          return;
        }
      }
      frame = requestAnimationFrame(step);
    };
    frame = requestAnimationFrame(step);
    return () => cancelAnimationFrame(frame);
  }, [running, scroller, scrollTo, show]);

  useEffect(() => {
    const node = scroller.current;
    if (!node) return;
    const follow = () => {
      if (Math.abs(node.scrollTop - own.current) < 2) return;
      position.current += node.scrollTop - own.current;
      position.current = Math.max(0, Math.min(latest.current.height, position.current));
      own.current = node.scrollTop;
      show();
    };
    node.addEventListener("scroll", follow, { passive: true });
    return () => node.removeEventListener("scroll", follow);
  }, [scroller, show]);

  const turn = useCallback(
    (forward: boolean) => {
      const node = scroller.current;
      if (!node) return;
      const { tops: rows } = latest.current;
      const view = node.clientHeight;
      const wanted = node.scrollTop + (forward ? 1 : -1) * (1 - keptShare) * view;
      // A page begins with a whole row: never with words whose chords are above the edge.
      const top = wanted <= 0 ? 0 : (rows.findLast((each) => each <= wanted) ?? 0);
      const moved = forward && top <= node.scrollTop ? wanted : top;
      scrollTo(moved);
      const begin = own.current;
      position.current = begin === 0 ? 0 : begin + readingShare * view;
      show();
    },
    [scroller, scrollTo, show],
  );
  const restart = useCallback(() => {
    position.current = 0;
    scrollTo(0);
    show();
  }, [scrollTo, show]);
  const toggle = useCallback(() => {
    // At the end, starting begins anew.
    if (!running && position.current >= latest.current.height) restart();
    setRunning(!running);
  }, [running, restart]);
  return { running, row, turn, toggle };
}
