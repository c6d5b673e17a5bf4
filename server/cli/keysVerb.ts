import { basename } from "node:path";
import type { SingingVoice, Tune } from "../../shared/keys/keyScore";
import { scoreKeys } from "../../shared/keys/scoreKeys";
import type { Mode } from "../../shared/music/keyName";
import { findKey } from "../../shared/songs/findKey";
import type { Melody } from "../../shared/songs/melody";
import { readMelodyFile } from "../../shared/songs/melodyFile";
import { readInput, songSize } from "./inputFile";
import { melodyFromRecording } from "./recordedMelody";
import { isRecording } from "./songFile";
import { BadInput, type Verb } from "./verb";
import { readBand, readKey, readOptions, required } from "./verbOptions";

/** Semitones kept inside the range where no comfort band is given; defaults of practice, not measurements. */
const reserve = { above: 2, below: 1 };

/** Nine octaves: no wider tune can be moved to every key among the notes that have names. */
const widestTune = 108;

export const keysVerb: Verb = {
  usage:
    "keys --melody FILE --voice E2-E4 [--comfort A2-C4] [--home D] | keys --span C4-C5 --home C --voice E2-E4 [--comfort A2-C4]\n" +
    "Without --comfort the band keeps 2 semitones inside the top of the voice and 1 inside its bottom.",
  async run(args) {
    const { values, rest } = readOptions(args, ["melody", "span", "home", "voice", "comfort"]);
    if (rest.length > 0) throw new BadInput(`keys takes no argument "${rest[0]}"; name the file with --melody.`);
    const voice = readVoice(required(values.voice, "voice"), values.comfort);
    const { tune, mode } = await readTune(values);
    if (spanOf(tune) > widestTune) throw new BadInput(`The tune spans more than ${widestTune} semitones.`);
    return scoreKeys(tune, voice, { mode }).map(
      ({ tonic, octave, lowMidi, highMidi, score, parts, beyond, reason }) => {
        return { tonic, octave, lowMidi, highMidi, score, parts, beyond, reason };
      },
    );
  },
};

function spanOf(tune: Tune): number {
  if (tune.kind === "span") return tune.highMidi - tune.lowMidi;
  const midis = tune.notes.map(({ midi }) => midi).sort((a, b) => a - b);
  return midis[midis.length - 1]! - midis[0]!;
}

function readVoice(voiceText: string, comfortText: string | undefined): SingingVoice {
  const range = readBand(voiceText, "voice");
  if (comfortText !== undefined) {
    const comfort = readBand(comfortText, "comfort");
    if (comfort.lowMidi < range.lowMidi || comfort.highMidi > range.highMidi)
      throw new BadInput(`--comfort ${comfortText} does not lie inside --voice ${voiceText}.`);
    return { range, comfort };
  }
  const lowMidi = Math.min(range.lowMidi + reserve.below, range.highMidi);
  return { range, comfort: { lowMidi, highMidi: Math.max(range.highMidi - reserve.above, lowMidi) } };
}

async function readTune(values: Record<string, string | undefined>): Promise<{ tune: Tune; mode: Mode }> {
  const home = values.home === undefined ? null : readKey(values.home, "home");
  if (values.span !== undefined) {
    if (values.melody !== undefined) throw new BadInput("Give either --melody or --span, not both.");
    const { tonic, mode } = home ?? readKey(required(values.home, "home"), "home");
    return { tune: { kind: "span", ...readBand(values.span, "span"), home: tonic }, mode };
  }
  const path = values.melody;
  if (path === undefined || path === "")
    throw new BadInput("Give the tune: --melody FILE, or --span LOW-HIGH --home NOTE.");
  const melody = await readMelody(path);
  if (melody.notes.length === 0) throw new BadInput(`${basename(path)} holds no melody.`);
  const found = melody.home === null ? (findKey({ notes: melody.notes })?.key ?? null) : null;
  const tonic = home?.tonic ?? melody.home ?? found?.tonic;
  if (tonic === undefined) throw new BadInput(`${basename(path)} does not tell its home note; add --home.`);
  const mode = home?.mode ?? melody.mode ?? found?.mode ?? "major";
  return { tune: { kind: "melody", notes: melody.notes, home: tonic }, mode };
}

/** A recording is taken in the singer's own tuning; its lengths are seconds. */
async function readMelody(path: string): Promise<Melody> {
  if (isRecording(path)) {
    const { notes, tuningCents } = await melodyFromRecording(path);
    return { notes: notes.map((note) => ({ ...note, midi: note.midi - tuningCents / 100 })), home: null, mode: null };
  }
  const file = readMelodyFile(basename(path), await readInput(path, songSize));
  if (!file.ok) throw new BadInput(`${basename(path)}: ${file.reason}`);
  return file.voices[file.proposed]!.melody;
}
