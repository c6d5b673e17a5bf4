import type { MelodyNote } from "./melody";
import { type MelodySyllable, type WrittenFile, type WrittenVoice, laterChanges } from "./melodyVoice";
import { type PartText, type ScoreNote, readPart } from "./musicXmlPart";
import { type MeasureSigns, playingOrder } from "./repeats";
import { placeCodas } from "./scoreSigns";
import { type XmlElement, child, childNumber, childrenOf, parseXml } from "./xmlTree";

const mostNotes = 100_000;
const mostParts = 64;
const mostMeasures = 5_000;

interface Part extends PartText {
  name: string;
  program: number | null;
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
  if ((source.match(/<measure[\s/>]/g)?.length ?? 0) > 20 * mostMeasures)
    return { ok: false, reason: "This score is far larger than a song." };
  const score = parseXml(source);
  if (!score)
    return { ok: false, reason: "This MusicXML file cannot be read; it is malformed, or far larger than a song." };
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
  const order = playingOrder(placeCodas(signs));
  const lengths = signs.map((_, index) => Math.max(...parts.map((part) => part.measures[index]?.length ?? 0)));
  const sung = order?.reduce(
    (sum, index) => sum + Math.max(...parts.map((part) => part.measures[index]?.notes.length ?? 0)),
    0,
  );
  if (!order || sung === undefined || sung > mostNotes)
    return { ok: false, reason: "The repeats of this file make it too long." };
  const title = child(child(score, "work"), "work-title")?.text ?? child(score, "movement-title")?.text ?? "";
  return {
    ok: true,
    title: title.trim() || null,
    voices: parts.flatMap((part) => unroll(part, order, lengths, signs)),
    tempo: parts.find((part) => part.tempo !== null)?.tempo ?? null,
    beatsPerBar: parts.find((part) => part.beats !== null)?.beats ?? null,
    cautions: laterChanges({
      tempo: parts.some((part) => part.changes.tempo),
      metre: parts.some((part) => part.changes.metre),
    }),
  };
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
    const text = readPart(written);
    const drums = childNumber(child(about, "midi-instrument"), "midi-channel") === 10;
    return { name, program: program === null ? null : program - 1, ...text, percussion: text.percussion || drums };
  });
}

function unroll(
  part: Part,
  order: readonly number[],
  lengths: readonly number[],
  signs: readonly MeasureSigns[],
): WrittenVoice[] {
  const names = [...new Set(part.measures.flatMap((measure) => measure.notes.map((note) => note.voice)))];
  const voices = new Map<string, WrittenVoice>();
  for (const name of names) {
    const { program, percussion, key, signature } = part;
    const label = names.length > 1 ? `${part.name}, voice ${name}` : part.name;
    voices.set(name, { name: label, notes: [], lyrics: [], key, signature, program, percussion });
  }
  let begin = 0;
  const sounding = new Map<string, MelodyNote>();
  const lineEnded = new Set<string>();
  const plays = new Map<number, number>();
  let ending: number[] | null = null;
  for (const index of order) {
    const played = plays.get(index) ?? 0;
    plays.set(index, played + 1);
    ending = signs[index]?.endingStart ?? ending;
    const verse = (ending?.[played] ?? played + 1) - 1;
    if (signs[index]?.endingEnd) ending = null;
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
      const syllable = syllableOf(note, verse);
      if (!syllable) continue;
      const heard: MelodySyllable = { start, text: syllable.text };
      if (lineEnded.delete(note.voice)) heard.newLine = true;
      voice.lyrics.push(heard);
      if (syllable.endsLine) lineEnded.add(note.voice);
    }
    begin += lengths[index]!;
  }
  return [...voices.values()];
}

/** Each time a measure is played, its next verse is sung. */
function syllableOf({ verses }: ScoreNote, verse: number): ScoreNote["verses"][number] {
  return verses[verse < verses.length ? verse : 0] ?? null;
}
