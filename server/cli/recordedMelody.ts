import type { MelodyNote } from "../../shared/songs/melody";
import { listenToTake } from "../../shared/voice/listenToTake";
import { readRecording } from "./recordingFile";
import { BadInput } from "./verb";

/** A tune as it was sung, times in seconds; what the singer's tuning is off is given in cents. */
export interface RecordedMelody {
  notes: MelodyNote[];
  tuningCents: number;
}

/** Listens to a recording of somebody singing alone. */
export async function melodyFromRecording(path: string): Promise<RecordedMelody> {
  const { pcm, sampleRate } = await readRecording(path);
  const { verdict, sentence, range, notes, tuningCents } = listenToTake(pcm, sampleRate);
  if (verdict !== "heard" || !range) throw new BadInput(`${path}: ${sentence}`);
  // A short slip outside the range heard is a scoop or a crack, no note of the tune.
  const inside = notes.filter(
    (note) => note.clear || (note.midi > range.lowMidi - 0.5 && note.midi < range.highMidi + 0.5),
  );
  return {
    notes: inside.map(({ start, end, midi }) => ({ start, duration: tidy(end - start), midi: tidy(midi) })),
    tuningCents,
  };
}

/** Thousandths: milliseconds, and a tenth of a cent. */
function tidy(value: number): number {
  return Math.round(value * 1000) / 1000;
}
