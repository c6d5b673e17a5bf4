import { midiToHz } from "@/shared/music/pitch";

/** A plucked string's partials, falling off; small loudspeakers need the upper ones. */
const partials = [0, 1, 0.5, 0.3, 0.18, 0.1, 0.05];
const level = 0.2;
const riseS = 0.01;

export interface TapTone {
  /** Sounds a note now, or `inS` seconds from now, for so long. */
  play(midi: number, seconds?: number, inS?: number): void;
  stop(): void;
  close(): void;
}

/** Opened with a press, because browsers let a page sound only then. Silent where the browser has no Web Audio. */
export function createTapTone(): TapTone {
  const context = typeof AudioContext === "undefined" ? null : new AudioContext();
  const wave = context?.createPeriodicWave(new Float32Array(partials.length), Float32Array.from(partials));
  const sounding = new Set<OscillatorNode>();
  const stop = () => {
    for (const oscillator of sounding) oscillator.stop();
    sounding.clear();
  };
  return {
    play(midi, seconds = 0.7, inS = 0) {
      if (!context || !wave) return;
      if (context.state === "suspended") void context.resume().catch(() => undefined);
      const from = context.currentTime + 0.01 + inS;
      const oscillator = context.createOscillator();
      const envelope = context.createGain();
      oscillator.setPeriodicWave(wave);
      oscillator.frequency.value = midiToHz(midi);
      envelope.gain.setValueAtTime(0, from);
      envelope.gain.linearRampToValueAtTime(level, from + riseS);
      envelope.gain.exponentialRampToValueAtTime(0.001, from + Math.max(0.15, seconds));
      oscillator.connect(envelope).connect(context.destination);
      oscillator.onended = () => sounding.delete(oscillator);
      sounding.add(oscillator);
      oscillator.start(from);
      oscillator.stop(from + Math.max(0.15, seconds) + 0.02);
    },
    stop,
    close() {
      stop();
      if (context && context.state !== "closed") void context.close().catch(() => undefined);
    },
  };
}
