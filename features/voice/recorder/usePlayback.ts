import { useCallback, useEffect, useRef, useState } from "react";
import { takeSound } from "./takeSound";

export interface Playback {
  playing: boolean;
  /** true where this browser could not play it */
  failed: boolean;
  play(): Promise<void>;
  stop(): void;
}

// The player is loaded with the result that may be played, not with the page.
const loadPlayer = () => import("expo-av");

/** Plays a take from this device's memory; nothing is sent anywhere. */
export function usePlayback(pcm: Float32Array, sampleRate: number): Playback {
  const [playing, setPlaying] = useState(false);
  const [failed, setFailed] = useState(false);
  const release = useRef<(() => void) | null>(null);

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

  const play = useCallback(async () => {
    stop();
    setFailed(false);
    setPlaying(true);
    const turn = { over: false };
    release.current = () => {
      turn.over = true;
    };
    try {
      const { Audio } = await loadPlayer();
      if (turn.over) return;
      const uri = URL.createObjectURL(takeSound(pcm, sampleRate));
      const sound = new Audio.Sound();
      release.current = () => {
        turn.over = true;
        sound.setOnPlaybackStatusUpdate(null);
        void sound.unloadAsync().catch(() => undefined);
        URL.revokeObjectURL(uri);
      };
      sound.setOnPlaybackStatusUpdate((status) => {
        if (status.isLoaded && status.didJustFinish) stop();
      });
      await sound.loadAsync({ uri }, { shouldPlay: true });
    } catch {
      if (turn.over) return;
      stop();
      setFailed(true);
    }
  }, [pcm, sampleRate, stop]);
  return { playing, failed, play, stop };
}
