import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { renderChoir } from "../sound/choir";
import { singPhrase } from "../sound/singer";
import { writeWav } from "../sound/wavFile";

/** Chromium's fake microphone loses what comes before the page listens and repeats the last moment for ever. */
const padS = 1;

/** The tune that the journeys sing, as steps above its lowest note: up, around and down again, with held ends. */
const tune = [0, 4, 7, 9, 12, 14, 12, 9, 7, 5, 4, 2, 0].map((step) => ({
  step,
  durationS: step === 0 || step === 14 ? 0.9 : 0.55,
}));

/** A file of singing, and what was truly sung. */
interface SungTune {
  wav: string;
  lowestMidi: number;
  highestMidi: number;
}

/** A folder of wav files for one test file's browsers; `remove` takes it away. */
export function makeMicrophones() {
  const folder = mkdtempSync(join(tmpdir(), "microphone-"));
  const keep = (name: string, pcm: Float32Array, sampleRate: number) => {
    const wav = join(folder, `${name}.wav`);
    writeWav(wav, pcm, sampleRate);
    return wav;
  };
  const voices = new Map<number, SungTune>();
  return {
    /** A source-filter voice singing the tune from the given lowest note; rendered once. */
    voice(lowestMidi: number): SungTune {
      const rendered = voices.get(lowestMidi);
      if (rendered) return rendered;
      const notes = tune.map(({ step, durationS }) => ({ midi: lowestMidi + step, durationS }));
      const { pcm, truth, sampleRate } = singPhrase({
        notes,
        seed: 7,
        sampleRate: 48_000,
        padS,
        vibrato: { rateHz: 5.6, extentCents: 35 },
        tract: lowestMidi < 55 ? 1 : 1.15,
      });
      const sung = {
        wav: keep(`voice-${lowestMidi}`, pcm, sampleRate),
        lowestMidi: truth.lowestMidi,
        highestMidi: truth.highestMidi,
      };
      voices.set(lowestMidi, sung);
      return sung;
    },
    /** The same voice singing the tune over and over, longer than a take may be. */
    longVoice(lowestMidi: number) {
      const notes = [...tune, ...tune, ...tune].map(({ step, durationS }) => ({ midi: lowestMidi + step, durationS }));
      const { pcm, truth, sampleRate } = singPhrase({ notes, seed: 7, sampleRate: 48_000, padS, tract: 1.05 });
      return { wav: keep(`long-${lowestMidi}`, pcm, sampleRate), ...truth };
    },
    /** Debian's sampled choir singing the same; null where FluidSynth or its sound font is not installed. */
    choir(lowestMidi: number) {
      const rendered = renderChoir(
        tune.map(({ step, durationS }) => ({ midi: lowestMidi + step, durationS })),
        { sampleRate: 48_000, padS },
      );
      if (!rendered) return null;
      const padded = new Float32Array(rendered.pcm.length + padS * rendered.sampleRate);
      padded.set(rendered.pcm);
      return { wav: keep("choir", padded, rendered.sampleRate), lowestMidi, highestMidi: lowestMidi + 14 };
    },
    /**
     * Any mono sound; given the first and last second that the fake microphone needs, unless it fills the room. The fake
     * microphone runs at 44.1 kHz: what must arrive unchanged, such as cut-off peaks, comes at that rate.
     */
    sound(name: string, pcm: Float32Array, sampleRate: number, padded = true) {
      const around = padded ? padS * sampleRate : 0;
      const whole = new Float32Array(pcm.length + 2 * around);
      whole.set(pcm, around);
      return keep(name, whole, sampleRate);
    },
    /** Ten seconds of a switched-off room. */
    silence() {
      return keep("silence", new Float32Array(10 * 48_000), 48_000);
    },
    folder,
    remove: () => rmSync(folder, { recursive: true, force: true }),
  };
}
