import { median } from "../signal/median";
import { hzToMidi } from "../music/pitch";
import type { SungNote, TakeReport } from "../voice/takeReport";
import { type Alignment, alignTake, type Singing, type WantedNote } from "./alignTake";
import { foldedSemitones } from "./alignTakePath";
import { phraseSentence, takeSummary } from "./measureTakeWords";
import type { Measures, PhraseMeasures, PitchMeasure, Shortfall, TakeMeasures } from "./takeMeasures";

/** What was to be sung: the notes and, by index, the words of their phrases. */
export interface WantedTune {
  notes: readonly WantedNote[];
  phrases: readonly { label: string | null }[];
}

/**
 * A take that fits a tune less than this is of something else. Without a backing a take can be bent to any tune, which
 * reaches 0.74 at most among the demonstration's songs; a true one reaches 0.98. With a backing the song is known.
 */
const leastFit = { alone: 0.75, backed: 0.45 };
/** A note is sung when a voice sounds for this share of it. */
const sungFrom = 0.3;
const leftOutBelow = 0.25;
const inTuneCents = 50;
/** Missed by this many semitones or more a note is not reached. */
const missedBy = 0.5;
/** A note this much softer than the singer's median did not carry, in dB. */
const weakDb = 9;
/** Low notes: within this many semitones of the tune's lowest. */
const lowReach = 4;
/** Notes shorter than this, in seconds, show nothing by themselves. */
const shortestS = 0.12;
const fewestHeld = 2;

/** A wanted note with what was sung for it. */
interface NoteSung {
  /** as wanted, in the singer's octave */
  midi: number;
  phrase: number;
  wantedS: number;
  span: { start: number; end: number } | null;
  sungS: number;
  /** semitones from what was wanted; null where it was not sung */
  off: number | null;
  levelDb: number | null;
}

/**
 * Holds a take against the tune in a key, phrase by phrase.
 *
 * Pitch is judged by the middle of each note, weighted by its time: nobody is judged by where notes begin and end.
 *
 * @param take a take that was listened to
 * @param tune the notes to be sung, in the key and in the singer's octave, and their phrases
 * @param singing when the backing began in the take, or null
 * @returns the measures; null where no singing was heard, too little of it, or another tune
 * @see facts on judging singers: people agree on notes' limits in about two of three, so frames are weighted by time
 */
export function measureTake(
  take: Pick<TakeReport, "verdict" | "f0" | "notes">,
  tune: WantedTune,
  singing: Singing,
): TakeMeasures | null {
  if (take.verdict !== "heard") return null;
  const alignment = alignTake(tune.notes, take.f0, singing);
  if (!alignment || alignment.fit < (singing.startS === null ? leastFit.alone : leastFit.backed)) return null;
  const moved = Math.round(alignment.offset) || 0;
  const notes = sungNotes(take, tune, alignment);
  const held = take.notes.filter(({ sustained }) => sustained);
  const own = held.length < 2 * fewestHeld ? null : median(held.map(({ steadinessCents }) => steadinessCents));
  const reach = {
    lowest: Math.min(...notes.map(({ midi }) => midi)),
    middle: weightedMedian(notes),
    levelDb: medianLevel(notes),
  };
  const indices = [...new Set(notes.map(({ phrase }) => phrase))];
  const phrases = indices.map((phrase) => {
    const here = notes.filter((note) => note.phrase === phrase);
    return measurePhrase(here, tune.phrases[phrase]?.label ?? null, held, own, reach);
  });
  const sungPhrases = new Set(phrases.filter(({ leftOut }) => !leftOut).map(({ phrase }) => phrase));
  const inSung = notes.filter(({ phrase }) => sungPhrases.has(phrase));
  const shortfalls = phrases.flatMap(({ fellShort }) => (fellShort ? [fellShort] : []));
  const lows = phrases.flatMap(({ ranOutOfLow }) => (ranOutOfLow ? [ranOutOfLow] : []));
  const measures: Omit<TakeMeasures, "summary"> = {
    ...pitchFigures(notes),
    fellShort: shortfalls.reduce<Shortfall | null>(worse, null),
    unsteady: null,
    ranOutOfLow: lows.reduce<Measures["ranOutOfLow"]>(
      (best, low) => (best && best.midi >= low.midi ? best : low),
      null,
    ),
    octaves: alignment.octaves,
    moved,
    tuningCents: Math.round(100 * (alignment.offset - moved)) || 0,
    phrases,
    pitches: pitchMeasures(inSung, reach.middle),
  };
  return { ...measures, summary: takeSummary(measures) };
}

interface Reach {
  lowest: number;
  middle: number;
  levelDb: number | null;
}

function measurePhrase(
  notes: readonly NoteSung[],
  label: string | null,
  held: readonly SungNote[],
  ownSteadiness: number | null,
  reach: Reach,
): PhraseMeasures {
  const figures = pitchFigures(notes);
  const leftOut = figures.sungShare < leftOutBelow;
  const sung = notes.filter(({ off }) => off !== null);
  const start = leftOut || sung.length === 0 ? null : Math.min(...sung.map(({ span }) => span!.start));
  const end = leftOut || sung.length === 0 ? null : Math.max(...sung.map(({ span }) => span!.end));
  const inside = held.filter((note) => start !== null && middleOf(note) >= start && middleOf(note) < end!);
  const steadiness = inside.length < fewestHeld ? null : median(inside.map(({ steadinessCents }) => steadinessCents));
  const measures = {
    ...figures,
    ...(leftOut ? { offCents: null, inTune: null } : {}),
    fellShort: leftOut ? null : shortfall(notes, reach.middle),
    unsteady: steadiness === null || !ownSteadiness ? null : Math.round((100 * steadiness) / ownSteadiness) / 100,
    ranOutOfLow: leftOut ? null : lowLost(notes, reach),
    phrase: notes[0]!.phrase,
    label,
    lowMidi: Math.min(...notes.map(({ midi }) => midi)),
    highMidi: Math.max(...notes.map(({ midi }) => midi)),
    leftOut,
    start,
    end,
  };
  return { ...measures, sentence: phraseSentence(measures) };
}

function sungNotes(take: Pick<TakeReport, "f0" | "notes">, tune: WantedTune, alignment: Alignment): NoteSung[] {
  const { spans, octaves, offset } = alignment;
  const own = offset - Math.round(offset);
  return tune.notes.map((note, k): NoteSung => {
    const midi = note.midi + 12 * octaves + Math.round(offset);
    const base = { midi, phrase: note.phrase, wantedS: note.duration };
    const span = spans[k] ?? null;
    if (!span) return { ...base, span, sungS: 0, off: null, levelDb: null };
    const pitches = voicedIn(take.f0, span);
    const spanS = span.end - span.start;
    // What was sung slower or faster than written counts as the share of its note.
    const sungS = (pitches.length / 100 / Math.max(spanS, 0.01)) * note.duration;
    if (pitches.length < 3 || pitches.length / 100 < sungFrom * spanS) {
      return { ...base, span, sungS: 0, off: null, levelDb: null };
    }
    // Glides from and to the neighbours are at the ends of a note.
    const edge = Math.floor(pitches.length / 5);
    const off = foldedSemitones(median(pitches.slice(edge, pitches.length - edge)) - midi - own);
    return { ...base, span, sungS: Math.min(note.duration, sungS), off, levelDb: levelIn(take.notes, span) };
  });
}

function voicedIn(f0: TakeReport["f0"], { start, end }: { start: number; end: number }): number[] {
  return f0
    .slice(Math.round(start * 100), Math.round(end * 100))
    .flatMap((hz) => (hz !== null && hz > 0 ? [hzToMidi(hz)] : []));
}

/** Level of the note that was heard for most of a stretch. */
function levelIn(notes: readonly SungNote[], { start, end }: { start: number; end: number }): number | null {
  const shared = (note: SungNote) => Math.min(end, note.end) - Math.max(start, note.start);
  const most = notes.reduce<SungNote | null>((best, note) => {
    return shared(note) > 0 && (!best || shared(note) > shared(best)) ? note : best;
  }, null);
  return most?.levelDb ?? null;
}

function pitchFigures(notes: readonly NoteSung[]): Pick<Measures, "sungShare" | "offCents" | "inTune"> {
  const sungS = notes.reduce((sum, note) => sum + note.sungS, 0);
  const wantedS = notes.reduce((sum, note) => sum + note.wantedS, 0);
  const sungShare = wantedS > 0 ? sungS / wantedS : 0;
  if (sungS < 2 * shortestS) return { sungShare, offCents: null, inTune: null };
  const off = notes.reduce((sum, note) => sum + note.sungS * Math.abs(note.off ?? 0), 0) / sungS;
  const good = notes.reduce((sum, note) => {
    return sum + (note.off !== null && Math.abs(note.off) * 100 <= inTuneCents ? note.sungS : 0);
  }, 0);
  return { sungShare, offCents: Math.round(100 * off), inTune: good / sungS };
}

/** The pitch of a phrase that was missed by most, towards the middle of the tune, for most of its time. */
function shortfall(notes: readonly NoteSung[], middle: number): Shortfall | null {
  return byPitch(notes)
    .flatMap(({ midi, of }): Shortfall[] => {
      const side = midi > middle ? "above" : "below";
      const time = of.reduce((sum, { wantedS }) => sum + wantedS, 0);
      if (time < shortestS) return [];
      const missed = of.filter((note) => isMissed(note, side));
      if (missed.reduce((sum, { wantedS }) => sum + wantedS, 0) < time / 2) return [];
      const sung = missed.filter(({ off }) => off !== null);
      if (sung.length > 0) return [{ midi, side, semitones: round(median(sung.map(({ off }) => Math.abs(off!)))) }];
      // A note left out low is told as such by itself; one left out in the middle is a breath.
      return side === "above" && midi >= highest(notes) - 2 ? [{ midi, side, semitones: null }] : [];
    })
    .reduce<Shortfall | null>(worse, null);
}

function isMissed({ off, wantedS }: NoteSung, side: "above" | "below"): boolean {
  if (off === null) return wantedS >= 2 * shortestS;
  return side === "above" ? off <= -missedBy : off >= missedBy;
}

/** The larger miss; of equal ones the one further out. A note not sung counts as missed by a semitone. */
function worse(best: Shortfall | null, next: Shortfall): Shortfall {
  if (!best) return next;
  const by = ({ semitones }: Shortfall) => semitones ?? 1;
  return by(next) > by(best) + 1e-9 ? next : best;
}

/** The highest of a phrase's lowest notes that was left out or hardly heard. */
function lowLost(notes: readonly NoteSung[], { lowest, middle, levelDb }: Reach): Measures["ranOutOfLow"] {
  const lost = byPitch(notes).flatMap(({ midi, of }): NonNullable<Measures["ranOutOfLow"]>[] => {
    const long = of.filter(({ wantedS }) => wantedS >= shortestS);
    if (midi > lowest + lowReach || midi >= middle || long.length === 0) return [];
    if (long.every(({ off }) => off === null)) return [{ midi, why: "left out" }];
    const levels = long.flatMap((note) => (note.levelDb === null ? [] : [note.levelDb]));
    return levelDb !== null && levels.length > 0 && median(levels) < levelDb - weakDb ? [{ midi, why: "weak" }] : [];
  });
  return lost.reduce<Measures["ranOutOfLow"]>((best, each) => (best && best.midi >= each.midi ? best : each), null);
}

function pitchMeasures(notes: readonly NoteSung[], middle: number): PitchMeasure[] {
  return byPitch(notes).map(({ midi, of }) => {
    const sum = (value: (note: NoteSung) => number) => of.reduce((all, note) => all + value(note), 0);
    const wantedS = sum((note) => note.wantedS);
    const sungS = sum((note) => note.sungS);
    const side = midi > middle ? "above" : "below";
    const missed = sum((note) => (isMissed(note, side) ? note.wantedS : 0)) >= wantedS / 2 && wantedS >= shortestS;
    const off = sungS > 0 ? Math.round((100 * sum((note) => note.sungS * Math.abs(note.off ?? 0))) / sungS) : null;
    return { midi, wantedS: round(wantedS), sungS: round(sungS), offCents: off, fellShort: missed ? side : null };
  });
}

function byPitch(notes: readonly NoteSung[]): { midi: number; of: NoteSung[] }[] {
  const pitches = [...new Set(notes.map(({ midi }) => midi))].sort((a, b) => a - b);
  return pitches.map((midi) => ({ midi, of: notes.filter((note) => note.midi === midi) }));
}

function weightedMedian(notes: readonly NoteSung[]): number {
  const sorted = [...notes].sort((a, b) => a.midi - b.midi);
  const half = sorted.reduce((sum, { wantedS }) => sum + wantedS, 0) / 2;
  let time = 0;
  return sorted.find(({ wantedS }) => (time += wantedS) >= half)?.midi ?? sorted[0]!.midi;
}

function medianLevel(notes: readonly NoteSung[]): number | null {
  const levels = notes.flatMap(({ levelDb }) => (levelDb === null ? [] : [levelDb]));
  return levels.length === 0 ? null : median(levels);
}

function highest(notes: readonly NoteSung[]): number {
  return Math.max(...notes.map(({ midi }) => midi));
}

function middleOf({ start, end }: SungNote): number {
  return (start + end) / 2;
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
