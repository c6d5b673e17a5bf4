import { useCallback, useEffect, useRef, useState } from "react";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import type { SoundLink } from "@/shared/contract/studio/handIn";

export interface TakeSound {
  state: "still" | "loading" | "playing";
  /** seconds from the beginning */
  atS: number;
  /** why it cannot be heard */
  problem: string | null;
  play(): void;
  pause(): void;
  seek(atS: number): void;
}

const marginMs = 10_000;
const hasEnded = (endsAt: number) => Date.now() > endsAt - marginMs;
const notPlayed = "The recording could not be played here. Try again.";

/** Plays a recording from the storage by a signed link, which is asked for anew when it has ended. */
export function useTakeSound(handInId: string, durationS: number): TakeSound {
  const [state, setState] = useState<TakeSound["state"]>("still");
  const [atS, setAtS] = useState(0);
  const [problem, setProblem] = useState<string | null>(null);
  const audio = useRef<HTMLAudioElement | null>(null);
  const endsAt = useRef(0);
  const wanted = useRef(0);
  /** a try to play runs, and tells itself how it ends */
  const trying = useRef(false);
  /** where it was tried anew because it broke off */
  const triedAnewAt = useRef<number | null>(null);
  const playAnew = useRef<() => void>(() => undefined);

  useEffect(() => {
    const element = new Audio();
    element.preload = "none";
    audio.current = element;
    const paused = () => {
      if (trying.current || !element.paused) return;
      wanted.current = element.currentTime;
      setState("still");
    };
    const broke = () => {
      if (trying.current) return;
      const at = element.currentTime;
      wanted.current = at;
      endsAt.current = 0;
      if (triedAnewAt.current === null || at > triedAnewAt.current + 1) {
        triedAnewAt.current = at;
        playAnew.current();
      } else {
        setState("still");
        setProblem(notPlayed);
      }
    };
    const ended = () => {
      setState("still");
      wanted.current = 0;
      setAtS(0);
    };
    element.addEventListener("ended", ended);
    element.addEventListener("pause", paused);
    element.addEventListener("error", broke);
    return () => {
      element.removeEventListener("ended", ended);
      element.removeEventListener("pause", paused);
      element.removeEventListener("error", broke);
      element.pause();
      element.removeAttribute("src");
      element.load();
    };
  }, []);

  useEffect(() => {
    if (state !== "playing") return;
    let frame = requestAnimationFrame(function look() {
      frame = requestAnimationFrame(look);
      const element = audio.current;
      if (element && !element.paused) setAtS(element.currentTime);
    });
    return () => cancelAnimationFrame(frame);
  }, [state]);

  const play = useCallback(async () => {
    const element = audio.current;
    if (!element) return;
    setProblem(null);
    setState("loading");
    trying.current = true;
    try {
      if (hasEnded(endsAt.current)) {
        const { url, expiresAt } = await http.get<SoundLink>(`/hand-ins/${handInId}/sound`);
        endsAt.current = Date.parse(expiresAt);
        element.src = url;
      }
      element.currentTime = wanted.current;
      await element.play();
      setState("playing");
    } catch (error) {
      endsAt.current = 0;
      setState("still");
      setProblem(error instanceof ApiError ? error.message : notPlayed);
    } finally {
      trying.current = false;
    }
  }, [handInId]);
  useEffect(() => {
    playAnew.current = () => void play();
  }, [play]);
  const pause = useCallback(() => {
    const element = audio.current;
    if (!element) return;
    element.pause();
    wanted.current = element.currentTime;
    setState("still");
  }, []);
  const seek = useCallback(
    (to: number) => {
      const at = Math.min(durationS, Math.max(0, to));
      wanted.current = at;
      setAtS(at);
      const element = audio.current;
      if (!element || element.readyState === 0) return;
      if (!hasEnded(endsAt.current)) element.currentTime = at;
      // One that is still gets its new link when it is played.
      else if (!element.paused) void play();
    },
    [durationS, play],
  );
  const begin = () => {
    triedAnewAt.current = null;
    void play();
  };
  return { state, atS, problem, play: begin, pause, seek };
}
