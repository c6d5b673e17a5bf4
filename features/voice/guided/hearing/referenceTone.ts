import { midiToHz } from "@/shared/music/pitch";

/** Strength of the partials: small loudspeakers give no fundamental of a low note, so its overtones carry it. */
const partials = [0, 1, 0.55, 0.35, 0.2, 0.12, 0.07, 0.04];
const level = 0.22;
const riseS = 0.06;
const usualS = 1.1;
const fallS = 0.22;

export interface ReferenceTone {
  /** Sounds the note once, softly rising and falling; fulfilled when it has died away. */
  play(midi: number): Promise<void>;
  stop(): void;
  close(): void;
}

/** Opened with a press, because browsers let a page sound only then. Silent where the browser has no Web Audio. */
export function createReferenceTone(soundS = usualS): ReferenceTone {
  const context = typeof AudioContext === "undefined" ? null : new AudioContext();
  let sounding: { stop(): void } | null = null;
  const stop = () => {
    sounding?.stop();
    sounding = null;
  };
  return {
    async play(midi) {
      stop();
      if (!context) return;
      if (context.state === "suspended") await context.resume().catch(() => undefined);
      const oscillator = context.createOscillator();
      oscillator.setPeriodicWave(
        context.createPeriodicWave(new Float32Array(partials.length), Float32Array.from(partials)),
      );
      oscillator.frequency.value = midiToHz(midi);
      const envelope = context.createGain();
      const from = context.currentTime + 0.02;
      envelope.gain.setValueAtTime(0, from);
      envelope.gain.linearRampToValueAtTime(level, from + riseS);
      envelope.gain.setValueAtTime(level, from + soundS);
      envelope.gain.linearRampToValueAtTime(0, from + soundS + fallS);
      oscillator.connect(envelope).connect(context.destination);
      await new Promise<void>((resolve) => {
        oscillator.onended = () => resolve();
        sounding = oscillator;
        oscillator.start(from);
        oscillator.stop(from + soundS + fallS);
      });
    },
    stop,
    close() {
      stop();
      if (context && context.state !== "closed") void context.close().catch(() => undefined);
    },
  };
}
