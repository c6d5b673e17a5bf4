import { useCallback, useEffect, useRef, useState } from "react";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { type BackingSounds, createBackingSounds } from "./backingSounds";
import { type Backing, type BackingStart, createBacking, MODERATE_LEVEL } from "./createBacking";

type Playing = "silent" | "playing" | "paused";

export interface BackingPlayer {
  playing: Playing;
  /** false where the browser has no Web Audio */
  possible: boolean;
  /**
   * From a press.
   *
   * @returns time of the context at which the first sound is given to the device; null without plan or Web Audio
   */
  start(how?: BackingStart): number | null;
  pause(): void;
  resume(): void;
  stop(): void;
  level: number;
  setLevel(level: number): void;
  /** time of the plan that is heard now; null while it is silent */
  heard(): number | null;
  /** the moment, by the page's clock (performance.now), at which time 0 of the plan was or will be heard; null if silent */
  begunMs(): number | null;
}

/** Opens the sound with the page, renders what the plan needs, and plays it. A new plan silences the one before. */
export function useBacking(plan: BackingPlan | null, onEnded?: () => void): BackingPlayer {
  const [playing, setPlaying] = useState<Playing>("silent");
  const [level, keepLevel] = useState(MODERATE_LEVEL);
  const context = useRef<AudioContext | null>(null);
  const sounds = useRef<BackingSounds | null>(null);
  const backing = useRef<Backing | null>(null);
  const ended = useRef(onEnded);
  const loudness = useRef(level);
  const possible = typeof AudioContext !== "undefined";
  useEffect(() => {
    ended.current = onEnded;
    loudness.current = level;
  }, [onEnded, level]);

  useEffect(() => {
    if (!possible) return;
    const opened = new AudioContext({ latencyHint: "interactive" });
    context.current = opened;
    sounds.current = createBackingSounds(opened);
    return () => {
      context.current = null;
      void opened.close().catch(() => undefined);
    };
  }, [possible]);

  useEffect(() => {
    if (!plan || !context.current || !sounds.current) return;
    const made = createBacking(plan, context.current, sounds.current, () => {
      setPlaying("silent");
      ended.current?.();
    });
    made.setLevel(loudness.current);
    backing.current = made;
    void made.prepare();
    return () => {
      made.close();
      backing.current = null;
      setPlaying("silent");
    };
  }, [plan]);

  const start = useCallback((how?: BackingStart) => {
    if (!backing.current) return null;
    setPlaying("playing");
    return backing.current.start(how);
  }, []);
  const pause = useCallback(() => {
    backing.current?.pause();
    setPlaying("paused");
  }, []);
  const resume = useCallback(() => {
    backing.current?.resume();
    setPlaying("playing");
  }, []);
  const stop = useCallback(() => {
    backing.current?.stop();
    setPlaying("silent");
  }, []);
  const setLevel = useCallback((value: number) => {
    keepLevel(value);
    backing.current?.setLevel(value);
  }, []);
  const heard = useCallback(() => backing.current?.heard() ?? null, []);
  const begunMs = useCallback(() => {
    const began = backing.current?.beganAt() ?? null;
    if (began === null || !backing.current || !context.current) return null;
    return performance.now() + 1000 * (began - context.current.currentTime + backing.current.latencyS());
  }, []);
  return { playing, possible, start, pause, resume, stop, level, setLevel, heard, begunMs };
}
