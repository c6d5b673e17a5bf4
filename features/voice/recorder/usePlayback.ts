import { Audio } from "expo-av";
import { useCallback, useEffect, useRef, useState } from "react";
import { takeSound } from "./takeSound";

export interface Playback {
  playing: boolean;
  /** true where this browser could not play it */
  failed: boolean;
  play(): Promise<void>;
  stop(): void;
}

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

  const play = useCallback(async () => {
    stop();
    const uri = URL.createObjectURL(takeSound(pcm, sampleRate));
    const sound = new Audio.Sound();
    release.current = () => {
      sound.setOnPlaybackStatusUpdate(null);
      void sound.unloadAsync().catch(() => undefined);
      URL.revokeObjectURL(uri);
    };
    setFailed(false);
    setPlaying(true);
    try {
      sound.setOnPlaybackStatusUpdate((status) => {
        if (status.isLoaded && status.didJustFinish) stop();
      });
      await sound.loadAsync({ uri }, { shouldPlay: true });
    } catch {
      stop();
      setFailed(true);
    }
  }, [pcm, sampleRate, stop]);
  return { playing, failed, play, stop };
}
