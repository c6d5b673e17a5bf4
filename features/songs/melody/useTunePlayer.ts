import { useCallback, useEffect, useRef, useState } from "react";
import type { MelodyNote } from "@/shared/songs/melody";
import type { TapTone } from "./entry/tapTone";

/** Notes are given to the sound a little ahead, so that stopping is heard at once. */
const aheadS = 0.25;
const tickMs = 100;

/** Plays a tune from one of its notes at a tempo; `at` is the note that sounds. */
export function useTunePlayer(tone: () => TapTone, tempo: number) {
  const [at, setAt] = useState<number | null>(null);
  const timer = useRef<ReturnType<typeof setInterval> | null>(null);
  const stop = useCallback(() => {
    if (timer.current !== null) {
      clearInterval(timer.current);
      tone().stop();
    }
    timer.current = null;
    setAt(null);
  }, [tone]);
  const play = useCallback(
    (notes: readonly MelodyNote[], from: number) => {
      stop();
      const first = notes[from];
      if (!first) return;
      const sound = tone();
      const begun = performance.now();
      const seconds = (beats: number) => (beats * 60) / tempo;
      let next = from;
      const tick = () => {
        const now = (performance.now() - begun) / 1000;
        for (let note = notes[next]; note && seconds(note.start - first.start) < now + aheadS; note = notes[next]) {
          sound.play(note.midi, seconds(note.duration), Math.max(0, seconds(note.start - first.start) - now));
          next += 1;
        }
        const sounding = notes.findLastIndex(({ start }) => seconds(start - first.start) <= now);
        const last = notes.at(-1)!;
        if (now > seconds(last.start + last.duration - first.start)) stop();
        else setAt(sounding);
      };
      timer.current = setInterval(tick, tickMs);
      setAt(from);
      tick();
    },
    [stop, tempo, tone],
  );
  useEffect(
    () => () => {
      if (timer.current !== null) clearInterval(timer.current);
    },
    [],
  );
  return { at, play, stop };
}
