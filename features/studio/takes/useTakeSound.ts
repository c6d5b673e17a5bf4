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

/** Plays a recording from the storage by a signed link, which is asked for anew when it has ended. */
export function useTakeSound(handInId: string, durationS: number): TakeSound {
  const [state, setState] = useState<TakeSound["state"]>("still");
  const [atS, setAtS] = useState(0);
  const [problem, setProblem] = useState<string | null>(null);
  const audio = useRef<HTMLAudioElement | null>(null);
  const endsAt = useRef(0);
  const wanted = useRef(0);

  useEffect(() => {
    const element = new Audio();
    element.preload = "none";
    audio.current = element;
    const follow = () => setAtS(element.currentTime);
    const ended = () => {
      setState("still");
      wanted.current = 0;
      setAtS(0);
    };
    element.addEventListener("ended", ended);
    let frame = requestAnimationFrame(function look() {
      frame = requestAnimationFrame(look);
      if (!element.paused) follow();
    });
    return () => {
      cancelAnimationFrame(frame);
      element.removeEventListener("ended", ended);
      element.pause();
      element.removeAttribute("src");
      element.load();
    };
  }, []);

  const play = useCallback(async () => {
    const element = audio.current;
    if (!element) return;
    setProblem(null);
    setState("loading");
    try {
      if (Date.now() > endsAt.current - marginMs) {
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
      setProblem(error instanceof ApiError ? error.message : "The recording could not be played here. Try again.");
    }
  }, [handInId]);
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
      if (audio.current && audio.current.readyState > 0) audio.current.currentTime = at;
    },
    [durationS],
  );
  return { state, atS, problem, play: () => void play(), pause, seek };
}
