import { useCallback, useEffect, useRef, useState } from "react";
import type { TakePart } from "./takeProtocol";
import { takeSound } from "./sound/takeSound";

export interface Playback {
  playing: boolean;
  /** true where this browser could not play it */
  failed: boolean;
  play(part: TakePart): Promise<void>;
  stop(): void;
  /** seconds of the take that sound right now */
  position(): number;
}

// The player is loaded with the result that may be played, not with the page.
const loadPlayer = () => import("expo-av");

/** The player says where it is a few times a second only; in between, the clock goes on, but never far ahead of it. */
const longestGuessS = 0.6;

/** Plays a take, or a part of it, from this device's memory; nothing is sent anywhere. */
export function usePlayback(pcm: Float32Array, sampleRate: number): Playback {
  const [playing, setPlaying] = useState(false);
  const [failed, setFailed] = useState(false);
  const release = useRef<(() => void) | null>(null);
  const place = useRef({ startS: 0, endS: 0, atS: 0, saidMs: 0, running: false });

  const stop = useCallback(() => {
    release.current?.();
    release.current = null;
    setPlaying(false);
  }, []);
  useEffect(() => stop, [stop, pcm]);
  useEffect(() => {
    // Loaded ahead, because some browsers play only right after the press. A failure shows when it is pressed.
    loadPlayer().catch(() => undefined);
  }, []);

  const play = useCallback(
    async ({ startS, endS }: TakePart) => {
      stop();
      setFailed(false);
      setPlaying(true);
      place.current = { startS, endS, atS: startS, saidMs: performance.now(), running: false };
      const turn = { over: false };
      release.current = () => {
        turn.over = true;
      };
      try {
        const { Audio } = await loadPlayer();
        if (turn.over) return;
        const part = pcm.subarray(Math.round(startS * sampleRate), Math.round(endS * sampleRate));
        const uri = URL.createObjectURL(takeSound(part, sampleRate));
        const sound = new Audio.Sound();
        release.current = () => {
          turn.over = true;
          sound.setOnPlaybackStatusUpdate(null);
          void sound.unloadAsync().catch(() => undefined);
          URL.revokeObjectURL(uri);
        };
        sound.setOnPlaybackStatusUpdate((status) => {
          if (!status.isLoaded) return;
          const atS = startS + status.positionMillis / 1000;
          place.current = { startS, endS, atS, saidMs: performance.now(), running: status.isPlaying };
          if (status.didJustFinish) stop();
        });
        await sound.loadAsync({ uri }, { shouldPlay: true, progressUpdateIntervalMillis: 50 });
      } catch {
        if (turn.over) return;
        stop();
        setFailed(true);
      }
    },
    [pcm, sampleRate, stop],
  );
  const position = useCallback(() => {
    const { atS, endS, saidMs, running } = place.current;
    const since = running ? Math.min(longestGuessS, (performance.now() - saidMs) / 1000) : 0;
    return Math.min(endS, atS + since);
  }, []);
  return { playing, failed, play, stop, position };
}
