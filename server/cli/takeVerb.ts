import { listenToTake } from "../../shared/voice/listenToTake";
import type { TakeReport } from "../../shared/voice/takeReport";
import { readRecording } from "./recordingFile";
import { BadInput, type Verb } from "./verb";
import { readOptions } from "./verbOptions";

/** `take FILE…`: what was sung in each recording. */
export const takeVerb: Verb = {
  usage: "take FILE… [--frames] [--hold]   (wav; flac, mp3, m4a, ogg, webm where ffmpeg is installed)",
  async run(args) {
    const { rest, flags } = readOptions(args, [], ["frames", "hold"]);
    if (rest.length === 0) throw new BadInput("Name at least one recording.");
    const out: object[] = [];
    for (const file of rest) {
      const { pcm, sampleRate } = await readRecording(file);
      out.push(lineFor(file, listenToTake(pcm, sampleRate, { hold: flags.has("hold") }), flags.has("frames")));
    }
    return out;
  },
};

function lineFor(file: string, report: TakeReport, frames: boolean): object {
  const { verdict, range, comfort, certainty, reasons, notes, f0 } = report;
  return {
    file,
    verdict,
    lowMidi: rounded(range?.lowMidi, 1000),
    highMidi: rounded(range?.highMidi, 1000),
    comfortLowMidi: rounded(comfort?.lowMidi, 1000),
    comfortHighMidi: rounded(comfort?.highMidi, 1000),
    certainty: rounded(certainty, 1000),
    reasons,
    notes: notes.map(({ start, end, midi }) => ({ start, end, midi: rounded(midi, 1000) })),
    ...(frames ? { f0: f0.map((hz, k) => ({ t: k / 100, hz: rounded(hz, 100) })) } : {}),
  };
}

function rounded(value: number | null | undefined, steps: number): number | null {
  return value === null || value === undefined ? null : Math.round(value * steps) / steps;
}
