import { type KeyName, type Mode, scaleSteps } from "../../shared/music/keyName";
import { keySign } from "../../shared/music/keyWords";
import { type Chart, printChart, transposeChart } from "../../shared/songs/chart";
import { findKey, type KeyEvidence, rankKeys } from "../../shared/songs/findKey";
import type { Melody, MelodyNote } from "../../shared/songs/melody";
import { tessitura, tessituragram } from "../../shared/songs/tessituragram";
import { melodyFromRecording, type RecordedMelody } from "./recordedMelody";
import { chartFromFile, isMelodyFile, isRecording, melodyFromFile } from "./songFile";
import { BadInput, eachFile, type Verb } from "./verb";
import { readKey, readOptions, required } from "./verbOptions";

/** How far behind the best key another may lie to be what somebody means who names its mode. */
const likelyEnough = 0.15;

/** The notes of a tune, its home note and where it lives. */
export const melodyVerb: Verb = {
  usage: "melody FILE…   (.mid .musicxml .xml .mxl .abc, or a recording)",
  async *run(args) {
    const { rest: files } = readOptions(args, []);
    yield* eachFile(named(files, melodyVerb), async (file) => {
      const { notes, home, mode } = await melodyOf(file);
      const { mean, sd, q1, median, q3, lowMidi, highMidi } = tessitura(notes)!;
      return {
        file,
        notes: notes.map(({ start, duration, midi }) => ({ start, duration, midi })),
        home,
        mode,
        lowMidi,
        highMidi,
        tessituragram: tessituragram(notes),
        mean,
        sd,
        q1,
        median,
        q3,
      };
    });
  },
};

/** The key of charts and melody files. */
export const keyVerb: Verb = {
  usage: "key FILE…   (chart text, .mid .musicxml .xml .mxl .abc, or a recording)",
  async *run(args) {
    const { rest: files } = readOptions(args, []);
    yield* eachFile(named(files, keyVerb), async (file) => {
      const { key, confidence, runnerUp, reasons } = findKey(await evidenceOf(file))!;
      return { file, tonic: key.tonic, mode: key.mode, confidence, runnerUp, reasons };
    });
  },
};

/** "E" alone names a tonic, "E major" and "e" a mode as well. */
const bareTonic = /^[A-G](?:#|b|♯|♭|[-\s]?(?:sharp|flat))?$/;

/** The key asked for, and whether its mode was named. */
type Target = KeyName & { named: boolean };

/** A chart in another key. */
export const transposeVerb: Verb = {
  usage: "transpose FILE… --to KEY [--from KEY]   (chart text; KEY such as D, F#m or Bb)",
  async *run(args) {
    const { values, rest: files } = readOptions(args, ["to", "from"]);
    const asked = required(values["to"], "to");
    const target = { ...readKey(asked, "to"), named: !bareTonic.test(asked.trim()) };
    const source = values["from"] === undefined ? null : readKey(values["from"], "from");
    yield* eachFile(named(files, transposeVerb), async (file) => {
      const chart = await chartFromFile(file);
      const from = source ?? writtenKey(chart, target);
      const to = targetFor(from, target);
      if (!to) {
        const kind = thirdOf(from.mode);
        throw new BadInput(`${file}: A song in ${keySign(from)} stays ${kind} when it is moved; name a ${kind} key.`);
      }
      return { file, from: keySign(from), to: keySign(to), text: printChart(transposeChart(chart, from, to)) };
    });
  },
};

function named(files: string[], verb: Verb): string[] {
  if (files.length === 0) throw new BadInput(`Name a file: ${verb.usage}`);
  return files;
}

/** A mode by its third. */
function thirdOf(mode: Mode): "major" | "minor" {
  return scaleSteps(mode).includes(3) ? "minor" : "major";
}

/** A bare tonic keeps the mode of the song, a mode that is named must have the song's third; null where it has not. */
function targetFor(from: KeyName, { tonic, mode, named }: Target): KeyName | null {
  if (!named) return { tonic, mode: from.mode };
  return thirdOf(mode) === thirdOf(from.mode) ? { tonic, mode } : null;
}

async function evidenceOf(file: string): Promise<KeyEvidence> {
  if (isRecording(file)) return { notes: inTune(await melodyFromRecording(file)) };
  if (!isMelodyFile(file)) return { chart: await chartFromFile(file) };
  const { melody, stated } = await melodyFromFile(file);
  return { notes: melody.notes, ...(stated ? { stated } : {}) };
}

async function melodyOf(file: string): Promise<Melody> {
  if (!isRecording(file)) return (await melodyFromFile(file)).melody;
  const recorded = await melodyFromRecording(file);
  const key = findKey({ notes: inTune(recorded) })?.key;
  return { notes: recorded.notes, home: key?.tonic ?? null, mode: key?.mode ?? null };
}

/** A singer who is evenly flat still sings in a key: name it from where their notes lie, not from the piano. */
function inTune({ notes, tuningCents }: RecordedMelody): MelodyNote[] {
  return notes.map((note) => ({ ...note, midi: note.midi - tuningCents / 100 }));
}

/**
 * The key a chart is in; when the mode of the target is named, the likeliest one with such a third, if it is likely at
 * all, in that mode.
 */
function writtenKey(chart: Chart, target: Target): KeyName {
  const found = findKey({ chart })!.key;
  if (!target.named || found.mode === target.mode) return found;
  const third = thirdOf(target.mode);
  const [best, ...others] = rankKeys({ chart });
  const like = [best!, ...others].find(({ key }) => key.mode === third);
  return like !== undefined && like.score > best!.score - likelyEnough
    ? { tonic: like.key.tonic, mode: target.mode }
    : found;
}
