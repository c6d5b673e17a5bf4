import { type KeyName, type Mode, keyOfFifths } from "../music/keyName";
import type { MelodyNote } from "./melody";
import type { WrittenFile, WrittenVoice } from "./melodyVoice";
import { type MeasureSigns, playingOrder } from "./repeats";
import { type XmlElement, child, childNumber, childrenOf, parseXml } from "./xmlTree";

const mostNotes = 100_000;
const mostParts = 64;
const mostMeasures = 20_000;
const letters: Record<string, number> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const modes: Record<string, Mode> = { ionian: "major", aeolian: "minor" };
for (const mode of ["major", "minor", "dorian", "phrygian", "lydian", "mixolydian", "locrian"] as const)
  modes[mode] = mode;

interface ScoreNote extends MelodyNote {
  voice: string;
  tieStop: boolean;
  syllable: string | null;
}
interface Measure {
  notes: ScoreNote[];
  length: number;
  signs: MeasureSigns;
}
interface Part {
  name: string;
  program: number | null;
  percussion: boolean;
  measures: Measure[];
  key: KeyName | null;
  signature: number | null;
}

/**
 * Reads a MusicXML score: ties joined, repeats, endings and jumps unrolled, grace and cue notes left out, transposing
 * parts as they sound. (A clef's octave sign needs nothing: MusicXML writes pitches as the clef makes them sound.)
 *
 * @param source the document's text
 * @returns a voice for each voice of each part, or why the document cannot be read
 * @see MusicXML 4.0, W3C Community Group Final Report (2021)
 */
export function readMusicXml(source: string): WrittenFile {
  if (/<!ENTITY/i.test(source))
    return { ok: false, reason: "This MusicXML file declares entities of its own, so it is not read." };
  if ((source.match(/<note[\s/>]/g)?.length ?? 0) > mostNotes)
    return { ok: false, reason: "This file holds too many notes." };
  const score = parseXml(source);
  if (!score) return { ok: false, reason: "This MusicXML file cannot be read; it is malformed." };
  if (score.name !== "score-partwise" && score.name !== "score-timewise") {
    return { ok: false, reason: "This XML file is no MusicXML score." };
  }
  const parts = partsOf(score).filter((part) => part.measures.some((measure) => measure.notes.length > 0));
  if (parts.length === 0) return { ok: false, reason: "There are no notes in this MusicXML file." };
  const length = parts.reduce((most, part) => Math.max(most, part.measures.length), 0);
  if (parts.length > mostParts || length > mostMeasures)
    return { ok: false, reason: "This score is far larger than a song." };
  const signs = Array.from({ length }, (_, index): MeasureSigns =>
    Object.assign({}, ...parts.map((part) => part.measures[index]?.signs ?? {})),
  );
  const order = playingOrder(signs);
  const lengths = signs.map((_, index) => Math.max(...parts.map((part) => part.measures[index]?.length ?? 0)));
  const sung = order?.reduce(
    (sum, index) => sum + Math.max(...parts.map((part) => part.measures[index]?.notes.length ?? 0)),
    0,
  );
  if (!order || sung === undefined || sung > mostNotes)
    return { ok: false, reason: "The repeats of this file make it too long." };
  const title = child(child(score, "work"), "work-title")?.text ?? child(score, "movement-title")?.text ?? "";
  return { ok: true, title: title.trim() || null, voices: parts.flatMap((part) => unroll(part, order, lengths)) };
}

function partsOf(score: XmlElement): Part[] {
  const listed = new Map(
    childrenOf(child(score, "part-list"), "score-part").map((part) => [part.attributes["id"] ?? "", part]),
  );
  const measures = new Map<string, XmlElement[]>();
  if (score.name === "score-partwise") {
    for (const part of childrenOf(score, "part"))
      measures.set(part.attributes["id"] ?? "", childrenOf(part, "measure"));
  } else {
    for (const measure of childrenOf(score, "measure")) {
      for (const part of childrenOf(measure, "part")) {
        const id = part.attributes["id"] ?? "";
        if (!measures.has(id)) measures.set(id, []);
        measures.get(id)!.push(part);
      }
    }
  }
  return [...measures].map(([id, written], index) => {
    const about = listed.get(id);
    const program = childNumber(child(about, "midi-instrument"), "midi-program");
    const name = child(about, "part-name")?.text.trim() || `Part ${index + 1}`;
    return { name, program: program === null ? null : program - 1, ...readPart(written) };
  });
}

function readPart(written: readonly XmlElement[]): Pick<Part, "measures" | "key" | "signature" | "percussion"> {
  let divisions = 1;
  let transposition = 0;
  let key: KeyName | null = null;
  let signature: number | null = null;
  let percussion = false;
  const measures = written.map((measure): Measure => {
    const notes: ScoreNote[] = [];
    const signs: MeasureSigns = {};
    let now = 0;
    let onset = 0;
    let length = 0;
    for (const element of measure.children) {
      if (element.name === "attributes") {
        divisions = Math.max(childNumber(element, "divisions") ?? divisions, 1e-6);
        const transpose = child(element, "transpose");
        if (transpose)
          transposition =
            (childNumber(transpose, "chromatic") ?? 0) + 12 * (childNumber(transpose, "octave-change") ?? 0);
        signature ??= signatureOf(child(element, "key"), transposition);
        key ??= keyOf(child(element, "key"), signature);
        if (childrenOf(element, "clef").some((clef) => child(clef, "sign")?.text.trim() === "percussion"))
          percussion = true;
      } else if (element.name === "note") {
        const duration = (childNumber(element, "duration") ?? 0) / divisions;
        if (child(element, "grace") || child(element, "cue") || duration <= 0) continue;
        if (!child(element, "chord")) {
          onset = now;
          now += duration;
        }
        const midi = pitchOf(child(element, "pitch"), transposition);
        if (midi !== null) notes.push({ ...noteSigns(element), start: onset, duration, midi });
      } else if (element.name === "backup")
        now = Math.max(0, now - (childNumber(element, "duration") ?? 0) / divisions);
      else if (element.name === "forward") now += (childNumber(element, "duration") ?? 0) / divisions;
      else if (element.name === "barline") readBarline(element, signs);
      else if (element.name === "sound") readJumps(element, signs);
      else if (element.name === "direction") for (const sound of childrenOf(element, "sound")) readJumps(sound, signs);
      length = Math.max(length, now);
    }
    return { notes, length, signs };
  });
  return { measures, key, signature, percussion };
}

function noteSigns(element: XmlElement): Pick<ScoreNote, "voice" | "tieStop" | "syllable"> {
  const staff = child(element, "staff")?.text.trim();
  const voice = child(element, "voice")?.text.trim() || "1";
  return {
    voice: staff === undefined || staff === "1" ? voice : `${voice} of staff ${staff}`,
    tieStop: childrenOf(element, "tie").some((tie) => tie.attributes["type"] === "stop"),
    syllable: child(child(element, "lyric"), "text")?.text.trim() || null,
  };
}

function pitchOf(pitch: XmlElement | undefined, transposition: number): number | null {
  const step = letters[child(pitch, "step")?.text.trim() ?? ""];
  const octave = childNumber(pitch, "octave");
  if (step === undefined || octave === null) return null;
  const midi = 12 * (octave + 1) + step + (childNumber(pitch, "alter") ?? 0) + transposition;
  return midi >= 0 && midi <= 127 ? midi : null;
}

function signatureOf(written: XmlElement | undefined, transposition: number): number | null {
  const fifths = childNumber(written, "fifths");
  if (fifths === null || !Number.isInteger(fifths) || Math.abs(fifths) > 7) return null;
  if (transposition === 0) return fifths;
  // A part's key is written for its transposition: a semitone is seven fifths, counted round the circle.
  const sounding = (((fifths + 7 * transposition) % 12) + 12) % 12;
  return sounding > 6 ? sounding - 12 : sounding;
}

function keyOf(written: XmlElement | undefined, signature: number | null): KeyName | null {
  const mode = modes[child(written, "mode")?.text.trim() ?? ""];
  return signature === null || !mode ? null : keyOfFifths(signature, mode);
}

function readBarline(barline: XmlElement, signs: MeasureSigns): void {
  const repeat = child(barline, "repeat");
  if (repeat?.attributes["direction"] === "forward") signs.repeatStart = true;
  if (repeat?.attributes["direction"] === "backward") {
    const times = Number(repeat.attributes["times"] ?? 2);
    signs.repeatEnd = Number.isInteger(times) && times >= 1 && times <= 20 ? times : 2;
  }
  const ending = child(barline, "ending");
  const numbers = (ending?.attributes["number"] ?? "").match(/\d{1,2}/g)?.map(Number);
  if (ending?.attributes["type"] === "start" && numbers) signs.endingStart = numbers;
  if (ending && ending.attributes["type"] !== "start") signs.endingEnd = true;
  if (child(barline, "segno")) signs.segno = true;
  if (child(barline, "coda")) signs.coda = true;
}

function readJumps(sound: XmlElement, signs: MeasureSigns): void {
  if (sound.attributes["dacapo"] === "yes") signs.jump = "da capo";
  if ("dalsegno" in sound.attributes) signs.jump = "dal segno";
  if ("segno" in sound.attributes) signs.segno = true;
  if ("coda" in sound.attributes) signs.coda = true;
  if ("tocoda" in sound.attributes) signs.toCoda = true;
  if ("fine" in sound.attributes) signs.fine = true;
}

function unroll(part: Part, order: readonly number[], lengths: readonly number[]): WrittenVoice[] {
  const names = [...new Set(part.measures.flatMap((measure) => measure.notes.map((note) => note.voice)))];
  const voices = new Map<string, WrittenVoice>();
  for (const name of names) {
    const { program, percussion, key, signature } = part;
    const label = names.length > 1 ? `${part.name}, voice ${name}` : part.name;
    voices.set(name, { name: label, notes: [], lyrics: [], key, signature, program, percussion });
  }
  let begin = 0;
  const sounding = new Map<string, MelodyNote>();
  for (const index of order) {
    for (const note of part.measures[index]?.notes ?? []) {
      const voice = voices.get(note.voice)!;
      const start = begin + note.start;
      const tied = note.tieStop ? sounding.get(`${note.voice}/${note.midi}`) : undefined;
      if (tied && Math.abs(tied.start + tied.duration - start) < 1e-6) {
        tied.duration = start + note.duration - tied.start;
        continue;
      }
      const sung: MelodyNote = { start, duration: note.duration, midi: note.midi };
      voice.notes.push(sung);
      sounding.set(`${note.voice}/${note.midi}`, sung);
      if (note.syllable !== null) voice.lyrics.push({ start, text: note.syllable });
    }
    begin += lengths[index]!;
  }
  return [...voices.values()];
}
