import type { PhraseNote, PhraseOptions } from "../sound/singer";
import { createRandom } from "../sound/random";

/** Five kinds of singers: lowest and highest note they are given, vocal tract against a man's, brightness of the source. */
export const singers = {
  bass: { low: 40, high: 57, tract: 1, tiltHz: 2000 },
  tenor: { low: 48, high: 69, tract: 1.02, tiltHz: 2800 },
  alto: { low: 54, high: 74, tract: 1.15, tiltHz: 2500 },
  soprano: { low: 60, high: 84, tract: 1.18, tiltHz: 2500 },
  child: { low: 60, high: 77, tract: 1.32, tiltHz: 2200 },
} as const;
export type SingerName = keyof typeof singers;

/** A phrase of 14 notes between two ends inside the singer's band; both ends are held. Off the grid by up to 40 cents; at 16 kHz, for speed. */
export function phraseFor(name: SingerName, seed: number): PhraseOptions {
  const { low, high, tract, tiltHz } = singers[name];
  const random = createRandom(seed * 101 + low);
  const bottom = low + Math.floor(random.between(0, (high - low) * 0.3));
  const top = high - Math.floor(random.between(0, (high - low) * 0.3));
  const offset = random.between(-0.4, 0.4);
  let midi = Math.round((bottom + top) / 2);
  const notes: PhraseNote[] = Array.from({ length: 14 }, (_, k) => {
    midi = Math.max(bottom, Math.min(top, midi + Math.round(random.normal() * 3.2)));
    const end = k === 4 ? bottom : k === 9 ? top : midi;
    return {
      midi: end + offset,
      durationS: k === 4 || k === 9 ? 0.45 : random.between(0.28, 0.7),
      levelDb: random.between(-6, 0),
    };
  });
  return { notes, tract, tiltHz, seed, sampleRate: 16000 };
}
