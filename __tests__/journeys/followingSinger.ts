import type { Page } from "playwright-core";

export interface FollowingSinger {
  /** the notes this voice can hold */
  lowest: number;
  highest: number;
  /** the note it hums when nothing was sounded before */
  hum: number;
}

/**
 * Puts a singer in the place of the microphone who listens to the page's reference tones and sings them back, with a
 * little vibrato, for two seconds. Notes outside its voice slide away and are not held.
 */
export async function followTones(page: Page, voice: FollowingSinger): Promise<void> {
  await page.addInitScript((limits) => {
    let voiceOf: { oscillator: OscillatorNode; loud: GainNode; context: AudioContext } | null = null;
    const sway = [
      [5.5, 18],
      [1.3, 7],
      [3.1, 5],
      [9.7, 4],
      [14.3, 3],
    ] as const;
    const hz = (midi: number) => 440 * 2 ** ((midi - 69) / 12);
    const sing = (midi: number, waitS: number) => {
      if (!voiceOf) return;
      const { oscillator, loud, context } = voiceOf;
      const from = context.currentTime + waitS;
      const can = midi >= limits.lowest && midi <= limits.highest;
      oscillator.frequency.cancelScheduledValues(0);
      oscillator.frequency.setValueAtTime(hz(midi), from);
      if (!can) oscillator.frequency.linearRampToValueAtTime(hz(midi + 9), from + 1.2);
      loud.gain.cancelScheduledValues(0);
      loud.gain.setValueAtTime(0, from);
      loud.gain.linearRampToValueAtTime(0.25, from + 0.08);
      loud.gain.setValueAtTime(0.25, from + (can ? 1.9 : 1.1));
      loud.gain.linearRampToValueAtTime(0, from + (can ? 2 : 1.2));
    };
    navigator.mediaDevices.getUserMedia = async () => {
      const context = new AudioContext();
      await context.resume();
      const partials = Float32Array.from([0, 1, 0.7, 0.5, 0.35, 0.25, 0.15, 0.1]);
      const oscillator = new OscillatorNode(context, { frequency: 220 });
      oscillator.setPeriodicWave(context.createPeriodicWave(new Float32Array(partials.length), partials));
      // Vibrato, and the drift and flutter without which no throat sings, in cents.
      for (const [frequency, gain] of sway) {
        const wave = new OscillatorNode(context, { frequency });
        wave.connect(new GainNode(context, { gain })).connect(oscillator.detune);
        wave.start();
      }
      const loud = new GainNode(context, { gain: 0 });
      const out = context.createMediaStreamDestination();
      oscillator.connect(loud).connect(out);
      oscillator.start();
      voiceOf = { oscillator, loud, context };
      return out.stream;
    };
    const create = BaseAudioContext.prototype.createOscillator;
    BaseAudioContext.prototype.createOscillator = function () {
      const tone = create.call(this);
      tone.addEventListener("ended", () => sing(Math.round(69 + 12 * Math.log2(tone.frequency.value / 440)), 0.5));
      return tone;
    };
    Object.assign(window, { hum: () => sing(limits.hum, 0.2) });
  }, voice);
}

/** Hums the singer's comfortable note. */
export function hum(page: Page): Promise<void> {
  return page.evaluate(() => (window as unknown as { hum(): void }).hum());
}
