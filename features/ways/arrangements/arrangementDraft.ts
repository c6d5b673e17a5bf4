import type { Arrangement } from "@/shared/contract/arrangement";
import type { Song } from "@/shared/contract/song";
import { tensionChanges } from "@/shared/instruments/tension";
import type { Instrument } from "@/shared/instruments/instrument";
import { planBacking } from "@/shared/songs/backing/planBacking";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { type Metre, metreOf } from "@/shared/songs/backing/metre";
import { difficultyWord } from "@/features/ways/wayWords";
import type { ArrangedChord, ArrangementWeight } from "@/shared/ways/arrangements/arrangement";
import { playShapes } from "@/shared/ways/hand/playShapes";
import { commonPatterns, fitsMetre, type StrokePattern } from "@/shared/ways/hand/strokePattern";
import { travelWords } from "@/shared/ways/travelWords";
import type { Shape } from "@/shared/ways/way";

/** What somebody changes at an arrangement. */
export interface ArrangementDraft {
  name: string;
  chords: ArrangedChord[];
  pattern: StrokePattern;
}

/** Where an arrangement is played: all that stays while it is changed. */
export interface ArrangedFor {
  song: Song;
  tonic: string;
  shift: number;
  instrument: Instrument;
  way: Arrangement["way"];
}

/** A pattern that fits how the song is counted: the given one, else the first usual one. */
export function patternFor(song: Pick<Song, "beatsPerBar">, pattern: StrokePattern | null): StrokePattern {
  const metre = metreFor(song);
  return pattern && fitsMetre(pattern, metre) ? pattern : commonPatterns(metre)[0]!;
}

/** How the song is counted. */
export function metreFor({ beatsPerBar }: Pick<Song, "beatsPerBar">): Metre {
  return metreOf(beatsPerBar);
}

/** The same with another shape for one chord. */
export function withShape(draft: ArrangementDraft, written: string, shape: Shape): ArrangementDraft {
  const chords = draft.chords.map((chord) => (chord.written === written ? { ...chord, shape } : chord));
  return { ...draft, chords };
}

/** The draft as it is kept. */
export function arrangementOf(
  { name, chords, pattern }: ArrangementDraft,
  { song, tonic, shift, instrument, way }: ArrangedFor,
  id: string,
  createdAt: string,
): Arrangement {
  const plain = chords.map(({ written, sounding, played, shape }) => ({ written, sounding, played, shape }));
  const { retune, capo, shapeKey } = way;
  return {
    ...{ id, songId: song.id, name: name.trim(), tonic, shift, instrument: instrument.id, createdAt },
    way: { retune, capo, shapeKey },
    chords: plain,
    pattern,
  };
}

/** A kept arrangement as it is changed. */
export function draftOf({ name, chords, pattern }: Arrangement, song: Song): ArrangementDraft {
  return { name, chords, pattern: patternFor(song, pattern) };
}

/** Whether two drafts would be kept alike. */
export function sameDraft(a: ArrangementDraft, b: ArrangementDraft): boolean {
  const plain = ({ name, chords, pattern }: ArrangementDraft) =>
    JSON.stringify([
      name.trim(),
      chords.map(({ written, shape }) => [written, shape?.frets ?? null]),
      pattern.name,
      pattern.steps,
    ]);
  return plain(a) === plain(b);
}

/** The song played with these very shapes; null where it has neither chords nor words nor a tune. */
export function arrangementPlan(
  { chords, pattern }: Pick<ArrangementDraft, "chords" | "pattern">,
  { song, tonic, shift, instrument, way }: ArrangedFor,
): BackingPlan | null {
  const notes = song.tune?.kind === "melody" ? song.tune.notes : [];
  const hand = playShapes({ chords, instrument, setting: way, pattern: patternFor(song, pattern) });
  return planBacking({ ...song, notes }, { tonic, shift }, { hand });
}

/** Notes of the strings as they are tuned for it, ASCII with octaves. */
export function tunedStrings(instrument: Instrument, retune: number): string[] {
  return tensionChanges(instrument, retune).map(({ to }) => to);
}

/** Whether an arrangement's shapes are for this instrument as it is now. */
export function fitsInstrument({ chords }: Pick<Arrangement, "chords">, { strings }: Instrument): boolean {
  return chords.every(({ shape }) => shape === null || shape.frets.length === strings.length);
}

/** What it asks of the hand: "Easy. The hand travels 38 cm along the neck, the song through." */
export function effortWords({ ease, travelMm }: ArrangementWeight): string {
  const word = difficultyWord(1 - ease);
  return `${word[0]!.toUpperCase()}${word.slice(1)}. ${travelWords(travelMm)}`;
}
