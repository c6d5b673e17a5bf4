import { type Chord, chordPitchClasses } from "../music/chord";
import { type KeyName, keyFifths, type Mode, scaleSteps, spellTonic, tonicPitchClass } from "../music/keyName";
import { glyphs, pitchClass } from "../music/pitch";
import { type Chart, chartTokens } from "./chart";
import { chordEvidence, type Evidence } from "./chordEvidence";
import { melodyEvidence } from "./melodyEvidence";
import { type ModalReading, modalReadings } from "./modalEvidence";
import type { MelodyNote } from "./melody";

/** What is known of a song. */
export interface KeyEvidence {
  chart?: Chart;
  notes?: readonly MelodyNote[];
  /** the key somebody wrote down for it; it weighs much, but notes and chords that plainly speak against it win */
  stated?: KeyName;
}

/** A key with its score; only differences between scores mean something. */
export interface RankedKey {
  key: KeyName;
  score: number;
}

/** The likeliest key. */
export interface KeyFinding {
  key: KeyName;
  runnerUp: KeyName;
  /** 0 to 1: how much of the belief falls on this key of all that were weighed */
  confidence: number;
  /** score of the key minus score of the runner-up, 0 or more; below 0.05 say "could be" */
  margin: number;
  /** plain sentences with glyphs */
  reasons: string[];
}

/** Below this the two best keys cannot honestly be told apart. */
const closeMargin = 0.05;
/** Steepness of belief: with much to go by, a lead of this much makes a key e times as likely as the next. */
const temperature = 0.05;
/** What a written key is worth, on the scale of the scores. */
const statedWorth = 0.25;
/** With this many chords the belief is half as steep; a note tells a third of what a chord does. */
const fewChords = 8;
/** What each sign of a mode is worth: one alone makes it the runner-up, two put it in front, if only just. */
const cueWorth = 0.04;
const cuesNeeded = 1.5;
const modes = ["major", "minor"] as const;
const churchModes = ["dorian", "mixolydian"] as const;
/**
 * A tune must speak for a mode that much more clearly than for plain minor or major, which are far commoner; less so
 * where it never touches the plain note.
 */
const rareness = { touched: 0.04, pure: -0.02 };
/** What a mode loses where the song has chords, but none that only the mode would have. */
const unheardInChords = 0.02;

/**
 * Ranks all 24 major and minor keys.
 *
 * @param evidence a chart, the notes of a tune, or both; a chart counts a little more than a tune
 * @returns keys best first; empty if there is neither chord nor note
 */
export function rankKeys(evidence: KeyEvidence): RankedKey[] {
  return rankPlain(evidence, hear(evidence));
}

/** Chords and tune with what they say, weighed once. */
interface Heard {
  chords: readonly Chord[];
  notes: readonly MelodyNote[];
  ofChords: Evidence | null;
  ofTune: Evidence | null;
  /** how much the chords count beside the tune, 0 to 1 */
  chordShare: number;
  /** roots as the chart spells them, by pitch class */
  written: ReadonlyMap<number, string>;
}

function hear(evidence: KeyEvidence): Heard {
  const chords = chordsOf(evidence);
  const notes = evidence.notes ?? [];
  const [ofChords, ofTune] = [chordEvidence(chords), melodyEvidence(notes)];
  const written = new Map(chords.map((chord) => [tonicPitchClass(chord.root), chord.root]));
  return { chords, notes, ofChords, ofTune, chordShare: !ofTune ? 1 : ofChords ? 0.55 : 0, written };
}

function rankPlain(evidence: KeyEvidence, { ofChords, ofTune, chordShare, written }: Heard): RankedKey[] {
  if (!ofChords && !ofTune) return [];
  const ranked = everyTonic((tonic) =>
    modes.map((mode): RankedKey => {
      const score =
        chordShare * (ofChords?.score(tonic, mode) ?? 0) + (1 - chordShare) * (ofTune?.score(tonic, mode) ?? 0);
      const word = isStated(evidence, tonic, mode) ? statedWorth : 0;
      return { key: spelled(tonic, mode, written.get(tonic)), score: score + word };
    }),
  );
  return ranked.sort((a, b) => b.score - a.score);
}

/**
 * Finds the key of a song from its chords, its tune, or both: pitch-class profiles, first and last chord or note,
 * cadences, the chords on the first, fourth and fifth step, and the tune's range; dorian and mixolydian by what only they
 * have. Other modes are not found: a part of a plain tune looks like them.
 *
 * @param evidence a chart, the notes of a tune, or both
 * @returns the likeliest key with the runner-up, or null if there is neither chord nor note
 * @see J. Albrecht and D. Shanahan (2013); D. Temperley, Music and Probability (2007); keyProfiles.ts
 */
export function findKey(evidence: KeyEvidence): KeyFinding | null {
  const all = hear(evidence);
  // Chords that go to and fro between two homes are read from the first; a tune may tell better.
  const readings = modalReadings(all.chords).slice(0, all.notes.length > 0 ? 2 : 1);
  const ranked = [...rankPlain(evidence, all), ...rankModes(evidence, all, readings)];
  const [best, next, ...others] = ranked.sort((a, b) => b.score - a.score);
  if (!best || !next) return null;
  const margin = best.score - next.score;
  const much = all.chords.length + all.notes.length / 3;
  const spread = temperature * (1 + fewChords / much);
  const beliefs = [best, next, ...others].map(({ score }) => Math.exp((score - best.score) / spread));
  const confidence = 1 / beliefs.reduce((sum, belief) => sum + belief, 0);
  const reasons = reasonsFor(evidence, all, best.key, readings);
  if (margin < closeMargin) reasons.push(`It could be ${next.key.tonic} ${next.key.mode}: the two are close.`);
  return { key: best.key, runnerUp: next.key, confidence, margin, reasons: [...new Set(reasons)].map(glyphs) };
}

function chordsOf({ chart }: KeyEvidence): Chord[] {
  return chart ? chartTokens(chart).flatMap((token) => (token.chord ? [token.chord] : [])) : [];
}

/** Dorian and mixolydian, as far as chords or tune speak for them. */
function rankModes(evidence: KeyEvidence, heard: Heard, readings: readonly ModalReading[]): RankedKey[] {
  const { chords, notes, ofChords, ofTune, chordShare, written } = heard;
  const plainest = ofChords ? Math.max(...everyTonic((tonic) => modes.map((mode) => ofChords.score(tonic, mode)))) : 0;
  const sounding = new Set(chords.flatMap(chordPitchClasses));
  return everyTonic((tonic) =>
    churchModes.flatMap((mode): RankedKey[] => {
      const reading = readings.find((each) => each.tonic === tonic && each.mode === mode);
      const stated = isExactly(evidence, tonic, mode);
      const mark = markOf(notes, tonic, mode);
      if (!stated && !reading && (mark === null || sounding.has((tonic + modeMarks[mode].plain) % 12))) return [];
      const like = scaleSteps(mode).includes(3) ? "minor" : "major";
      const inChords = reading
        ? plainest + cueWorth * (reading.cues - cuesNeeded)
        : (ofChords?.score(tonic, like) ?? 0) - unheardInChords;
      const inTune = (ofTune?.score(tonic, mode) ?? 0) - rareness[mark ?? "touched"];
      const word = stated
        ? statedWorth + rareness.touched
        : isStated(evidence, tonic, like)
          ? statedWorth - cueWorth
          : 0;
      const score = chordShare * inChords + (1 - chordShare) * inTune + word;
      return [{ key: spelled(tonic, mode, written.get(tonic)), score }];
    }),
  );
}

function everyTonic<T>(of: (tonic: number) => readonly T[]): T[] {
  return Array.from({ length: 12 }, (_, tonic) => of(tonic)).flat();
}

/** The degree that only the mode has, the plain one in its place. */
const modeMarks = { dorian: { own: 9, plain: 8 }, mixolydian: { own: 10, plain: 11 } };

/** How a tune shows the mode: it has the mode's note and hardly the plain one; null if it does not. */
function markOf(
  notes: readonly MelodyNote[],
  tonic: number,
  mode: keyof typeof modeMarks,
): keyof typeof rareness | null {
  const { own, plain } = modeMarks[mode];
  const time = (degree: number) =>
    notes.reduce((sum, { midi, duration }) => (pitchClass(midi - tonic) === degree ? sum + duration : sum), 0);
  // The raised sixth of melodic minor comes with the raised seventh.
  if (time(own) === 0 || time(plain) >= 0.25 * time(own) || time(11) > time(10)) return null;
  return time(plain) === 0 && time(11) === 0 ? "pure" : "touched";
}

function reasonsFor(
  evidence: KeyEvidence,
  { ofChords, ofTune }: Heard,
  key: KeyName,
  readings: readonly ModalReading[],
): string[] {
  const pc = tonicPitchClass(key.tonic);
  const reading = readings.find(({ tonic, mode }) => tonic === pc && mode === key.mode);
  return [
    ...(isStated(evidence, pc, key.mode) ? [`It is written down as ${key.tonic} ${evidence.stated?.mode}.`] : []),
    ...(reading?.reasons(key) ?? ofChords?.reasons(pc, key.mode, key) ?? []),
    ...(ofTune?.reasons(pc, key.mode, key) ?? []),
  ];
}

function isExactly({ stated }: KeyEvidence, tonic: number, mode: Mode): boolean {
  return stated?.mode === mode && tonicPitchClass(stated.tonic) === tonic;
}

/** A mode counts as major or minor by its third. */
function isStated({ stated }: KeyEvidence, tonic: number, mode: Mode): boolean {
  if (!stated || tonicPitchClass(stated.tonic) !== tonic) return false;
  return scaleSteps(stated.mode).includes(scaleSteps(mode).includes(3) ? 3 : 4);
}

/** As the chart writes it where that is a key people use, else with the fewest accidentals. */
function spelled(tonic: number, mode: Mode, written: string | undefined): KeyName {
  if (written !== undefined && Math.abs(keyFifths({ tonic: written, mode })) <= 7) return { tonic: written, mode };
  return { tonic: spellTonic(tonic, mode), mode };
}
