import type { Page } from "playwright-core";
import { singPhrase } from "../sound/singer";

/** A note of a tune in quarter notes from its beginning. */
export interface TuneNote {
  start: number;
  duration: number;
  midi: number;
}

const sampleRate = 24_000;

/** A voice-like rendering of a tune at a tempo, in a voice that reaches up to `top`: notes above it are sung on it. */
export function singTune(notes: readonly TuneNote[], tempo: number, top: number): Float32Array {
  const ends = notes.map(({ start }, k) => notes[k + 1]?.start ?? start + (notes[k]?.duration ?? 1));
  return singPhrase({
    notes: notes.map(({ start, midi }, k) => ({
      midi: Math.min(midi, top),
      durationS: ((ends[k]! - start) * 60) / tempo,
    })),
    seed: 11,
    sampleRate,
    padS: 0,
    consonants: 0.2,
  }).pcm;
}

/**
 * Puts a singer in the place of the microphone who listens to the count-in: the singing begins one bar after the first
 * click that the page sounds, to the millisecond of the sound's own clock.
 */
export async function singWhenCounted(page: Page): Promise<void> {
  await page.addInitScript((rate) => {
    let into: { context: AudioContext; out: MediaStreamAudioDestinationNode } | null = null;
    let next: { pcm: Float32Array<ArrayBuffer>; barS: number } | null = null;
    let started = false;
    const openContext = window.AudioContext;
    const start = AudioScheduledSourceNode.prototype.start;
    navigator.mediaDevices.getUserMedia = async () => {
      const context = new openContext();
      await context.resume();
      const out = context.createMediaStreamDestination();
      // A stream with nothing in it at all may stay away from the page.
      const hum = new ConstantSourceNode(context, { offset: 1e-6 });
      hum.connect(out);
      start.call(hum);
      into = { context, out };
      started = false;
      return out.stream;
    };
    OscillatorNode.prototype.start = function (when = 0) {
      const click = this.frequency.value > 1000;
      if (click && into && next && !started) {
        started = true;
        const { context, out } = into;
        const buffer = context.createBuffer(1, next.pcm.length, rate);
        buffer.copyToChannel(next.pcm, 0);
        const voice = new AudioBufferSourceNode(context, { buffer });
        voice.connect(out);
        const wait = Math.max(0, when - this.context.currentTime) + next.barS;
        start.call(voice, context.currentTime + wait);
      }
      start.call(this, when);
    };
    Object.assign(window, {
      willSing(base64: string, barS: number) {
        const bytes = Uint8Array.from(atob(base64), (sign) => sign.charCodeAt(0));
        next = { pcm: new Float32Array(bytes.buffer), barS };
      },
    });
  }, sampleRate);
}

/** What the singer will sing when counted in. */
export async function willSing(page: Page, pcm: Float32Array, barS: number): Promise<void> {
  const base64 = Buffer.from(pcm.buffer, pcm.byteOffset, pcm.byteLength).toString("base64");
  await page.evaluate(
    ([sound, bar]) => (window as unknown as { willSing(sound: string, bar: number): void }).willSing(sound, bar),
    [base64, barS] as [string, number],
  );
}
