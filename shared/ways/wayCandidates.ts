import { parseChord, transposeChord, type Chord } from "../music/chord";
import { spellTonic, tonicPitchClass, type KeyName } from "../music/keyName";
import { fretSemitones } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { tensionChanges } from "../instruments/tension";
import { missingShapes } from "./missingShapes";
import { playedKey, type PlayedKey } from "./playedKey";
import { neckStock } from "./shapeLibrary";
import { songFlow, type SongFlow } from "./songFlow";
import type { WayMoves } from "./askedWay";
import type { StringChange, Way, WayPreferences } from "./way";

/** What is to be played, where it shall sound, and on what. */
export interface WaysQuestion {
  /** chord symbols as written, distinct, in order of first appearance */
  chords: readonly string[];
  /** the same chords as they are played, with repeats; the hand's way is measured along it. Default: each once */
  sequence?: readonly string[];
  /** the key the chart is written in */
  from: KeyName;
  /** the key it shall sound in */
  to: KeyName;
  instrument: Instrument;
  preferences?: WayPreferences;
  /** a way somebody has settled on: it is among the answers whatever the wishes are, unless a string is in danger */
  settled?: WayMoves | null;
}

/** Wishes of somebody who has not said any. */
export const defaultPreferences: WayPreferences = {
  barre: 0.2,
  capo: 0.2,
  retune: 0.1,
  knownShapes: [],
  highestCapo: 9,
};

const retunes = [0, -1, -2, -3, -4, 1];
const highestCapo = 9;

/** Cost of what is done to the instrument, on the scale of one shape's cost. */
const work = {
  capo: 0.1,
  capoFret: 0.06,
  capoFretBeyondFive: 0.3,
  retune: 0.4,
  retuneSemitone: 0.12,
  slack: 1.2,
  tight: 0.8,
};
/** What full dislike adds for each capo fret and each semitone of a retune. */
const dislike = { capoFret: 0.3, retuneSemitone: 3 };

/** One combination of retune, capo and shapes, weighed. */
export interface WayCandidate {
  kind: Way["kind"];
  retune: number;
  capo: number;
  shapeKey: KeyName;
  asWritten: boolean;
  played: PlayedKey;
  /** what is heard, per chord */
  sounding: readonly string[];
  written: readonly string[];
  /** how many chords the instrument has no shape for */
  missing: number;
  strings: StringChange[];
  total: number;
}

/**
 * Every combination of retune and capo that reaches the key, with the shapes that go with it; none with a string in
 * danger.
 *
 * @param question chords, keys, instrument and wishes
 * @returns candidates, not in order of worth
 * @throws RangeError if a tonic or a string's note cannot be read
 */
export function wayCandidates(question: WaysQuestion): WayCandidate[] {
  const { from, to, instrument } = question;
  const wishes = question.preferences ?? defaultPreferences;
  const home = tonicPitchClass(from.tonic);
  const target = tonicPitchClass(to.tonic);
  const written = question.chords.map((text) => ({ text, chord: parseChord(text) }));
  const flow = songFlow(question.chords, question.sequence);
  const sounding = written.map(({ text, chord }) => (chord ? transposeChord(chord, target - home, to, from) : text));
  const shapes = new ShapesByKey(written, from, to, instrument, flow, wishes);
  const topCapo = Math.max(0, Math.min(highestCapo, instrument.capoTo, wishes.highestCapo));
  const candidates: WayCandidate[] = [];
  const { settled } = question;
  for (const retune of retunes) {
    const strings = stringChanges(instrument, retune);
    if (strings.some(({ verdict }) => verdict === "unsafe")) continue;
    for (let capo = 0; capo <= Math.min(highestCapo, instrument.capoTo); capo++) {
      if (capo > topCapo && !(settled?.capo === capo && settled.retune === retune)) continue;
      const raised = fretSemitones(instrument, capo);
      if (raised === null) continue;
      const shapePc = (target - retune - raised + 60) % 12;
      const { key, played } = shapes.of(shapePc, capo);
      candidates.push({
        kind: retune === 0 ? (capo === 0 ? "as-is" : "capo") : capo === 0 ? "retune" : "retune-capo",
        retune,
        capo,
        shapeKey: key,
        asWritten: shapePc === home,
        played,
        sounding,
        written: question.chords,
        missing: missingShapes(played.chords.map(({ name, taken }) => ({ played: name, shape: taken }))).names.length,
        strings,
        total: played.total + workOf(retune, capo, strings) + wishedOf(retune, capo, wishes),
      });
    }
  }
  return candidates;
}

function workOf(retune: number, capo: number, strings: readonly StringChange[]): number {
  return (
    (capo === 0 ? 0 : work.capo) +
    work.capoFret * capo +
    work.capoFretBeyondFive * Math.max(0, capo - 5) +
    (retune === 0 ? 0 : work.retune + work.retuneSemitone * Math.abs(retune)) +
    (strings.some(({ verdict }) => verdict === "slack") ? work.slack : 0) +
    (strings.some(({ verdict }) => verdict === "tight") ? work.tight : 0)
  );
}

function wishedOf(retune: number, capo: number, wishes: WayPreferences): number {
  return wishes.capo * dislike.capoFret * capo + wishes.retune * dislike.retuneSemitone * Math.abs(retune);
}

function stringChanges(instrument: Instrument, retune: number): StringChange[] {
  return tensionChanges(instrument, retune).map(({ string, to, beforeLb, afterLb, verdict }) => {
    return { from: string, to, beforeLb, afterLb, verdict };
  });
}

/** The shapes of a song in each key that the fingers may play, worked out once each. */
class ShapesByKey {
  private readonly names = new Map<number, { key: KeyName; chords: { name: string; chord: Chord | null }[] }>();
  private readonly found = new Map<string, PlayedKey>();

  constructor(
    private readonly written: readonly { text: string; chord: Chord | null }[],
    private readonly from: KeyName,
    private readonly to: KeyName,
    private readonly instrument: Instrument,
    private readonly flow: SongFlow,
    private readonly wishes: WayPreferences,
  ) {}

  of(shapePc: number, capo: number): { key: KeyName; played: PlayedKey } {
    const { key, chords } = this.named(shapePc);
    const { instrument, flow, wishes } = this;
    const room = instrument.frets - capo;
    // On chromatic frets shapes hang on the capo only by its being there and by the frets it leaves.
    const id = `${shapePc} ${instrument.fretMap ? capo : capo > 0 ? "capo" : "bare"} ${Math.min(room, 12)}`;
    const known = this.found.get(id);
    if (known) return { key, played: known };
    const played = playedKey(chords, { instrument, capo, neck: neckStock(instrument, capo), flow, wishes });
    this.found.set(id, played);
    return { key, played };
  }

  private named(shapePc: number) {
    const known = this.names.get(shapePc);
    if (known) return known;
    const { from, to } = this;
    const home = tonicPitchClass(from.tonic);
    const tonic =
      shapePc === tonicPitchClass(to.tonic) ? to.tonic : shapePc === home ? from.tonic : spellTonic(shapePc, from.mode);
    const key: KeyName = { tonic, mode: from.mode };
    const chords = this.written.map(({ text, chord }) => {
      if (!chord) return { name: text, chord: null };
      const name = transposeChord(chord, shapePc - home, key, from);
      return { name, chord: parseChord(name) };
    });
    const fresh = { key, chords };
    this.names.set(shapePc, fresh);
    return fresh;
  }
}
