import { listenToTake } from "../../shared/voice/listenToTake";
import { readRecording } from "./recordingFile";
import type { TakeReport, Verdict } from "../../shared/voice/takeReport";
import { BadInput, eachFile, type Verb } from "./verb";
import type { Recording } from "./wavPcm";
import { readOptions } from "./verbOptions";

/** `take FILE…`: what was sung in each recording. */
export const takeVerb: Verb = {
  usage: "take FILE… [--frames] [--hold]   (wav; flac, mp3, m4a, ogg, webm where ffmpeg is installed)",
  async *run(args) {
    const { rest, flags } = readOptions(args, [], ["frames", "hold"]);
    if (rest.length === 0) throw new BadInput("Name at least one recording.");
    yield* eachFile(rest, async (file) => {
      const recording = await readRecording(file);
      const report = listenToTake(recording.pcm, recording.sampleRate, { hold: flags.has("hold") });
      const reasons = [...cutOffWords(recording), ...(inFile[report.verdict] ?? report.reasons)];
      return lineFor(file, { ...report, reasons }, flags.has("frames"));
    });
  },
};

/** Of a finished file one says what it holds, not how to stand before the microphone. */
const inFile: Partial<Record<Verdict, string[]>> = {
  "too-quiet": ["The recording holds hardly any sound."],
  "too-noisy": ["The recording is too noisy to hear a voice apart from it."],
  clipped: ["The recording is overdriven: its loud parts are cut flat."],
};

function cutOffWords({ pcm, sampleRate, promisedS }: Recording): string[] {
  if (promisedS === null) return [];
  const seconds = (s: number) => Math.round(s * 10) / 10;
  return [`The file is cut off: ${seconds(pcm.length / sampleRate)} of ${seconds(promisedS)} s are there.`];
}

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
