import { fretName, fretSemitones } from "../../instruments/frets";
import type { Instrument } from "../../instruments/instrument";
import { keySign, keyWords, movedKey } from "../../music/keyWords";
import { type KeyName, spellInKey } from "../../music/keyName";
import { glyphs, pitchClass } from "../../music/pitch";
import type { Way } from "../../ways/way";
import type { Verdict } from "../coachQuestion";
import { semitonesUp } from "../numberedChords";
import { picked, type Chance } from "../seeded";
import { soundAt } from "../../instruments/soundAt";
import { retuned, stringLetters } from "../tunedNeck";
import type { LeftOut, NeckDot, WhyStep } from "../whyStep";
import { listWords } from "../../music/listWords";
import { semitoneWords } from "../../music/moveWords";

/** What a capo step speaks of. */
interface CapoFacts {
  from: KeyName;
  to: KeyName;
  instrument: Instrument;
  way: Pick<Way, "retune" | "capo" | "shapeKey">;
}

/** Frets that are offered for an answer. */
const shownFrets = 9;

/**
 * What the capo of this way moves, or what one could do, and why it can only raise.
 *
 * @param facts keys, instrument and way
 * @param chance decides which fret is asked for
 * @returns the step; left out where no capo is used on the instrument, or nothing moves
 * @throws RangeError if a string's note cannot be read
 * @see common practice: a capo at fret c raises every string by c semitones; shapes + capo = what sounds
 */
export function capoStep({ from, to, instrument, way }: CapoFacts, chance: Chance): WhyStep | LeftOut {
  const title = way.capo > 0 ? `What the capo at fret ${fretName(instrument, way.capo)} moves` : "What a capo could do";
  const frets = usefulFrets(instrument);
  if (frets.length === 0) return { title: "The capo", why: "No capo is used on this instrument." };
  if (way.capo === 0 && way.retune === 0 && semitonesUp(from, to) === 0)
    return { title: "The capo", why: "Nothing has to be raised: the song sounds where it is written." };
  const shapes: KeyName = { tonic: way.shapeKey, mode: to.mode };
  const bare = movedKey(shapes, way.retune);
  const tuned = retuned(instrument, way.retune, to);
  const asked = picked(
    frets.filter((fret) => fret !== way.capo || frets.length === 1),
    chance,
  );
  const target = movedKey(bare, semitonesAt(instrument, asked));
  const dots = capoDots(tuned, way.capo, to);
  return {
    kind: "capo",
    title,
    words:
      way.capo > 0 ? withCapo({ from, to, instrument, way }, tuned, bare) : withoutCapo({ from, to, instrument, way }),
    picture: {
      kind: "neck",
      instrument: tuned,
      capo: way.capo,
      frets: Math.min(instrument.frets, Math.max(7, way.capo + 2)),
      dots,
      shapes: [],
      spoken:
        way.capo > 0
          ? `The neck with a capo at fret ${fretName(instrument, way.capo)}. Behind it the strings sound ${listWords(dots.filter(({ fret }) => fret === way.capo).map(({ label }) => label))}.`
          : `The neck without a capo. The open strings are ${listWords(dots.map(({ label }) => label))}.`,
    },
    question: {
      kind: "neck",
      ask: `As the strings are tuned now, ${sign(shapes)} shapes sound in ${sign(bare)} without a capo. Where does the capo go to make them sound in ${sign(target)}?`,
      firstFret: 1,
      frets: Math.min(shownFrets, instrument.capoTo),
      whole: true,
      check: ({ fret }) => checkFret(fret, asked, bare, target, instrument),
    },
  };
}

function withCapo({ to, instrument, way }: CapoFacts, tuned: Instrument, bare: KeyName): string[] {
  const up = semitonesAt(instrument, way.capo);
  const before = stringLetters(tuned.strings);
  const after = stringLetters(retuned(tuned, up, to).strings);
  const moves = before.map((name, k) => `${name} to ${after[k]}`);
  const shapes = sign({ tonic: way.shapeKey, mode: to.mode });
  return [
    `The capo is a new nut. At fret ${fretName(instrument, way.capo)} every string sounds ${semitoneWords(up)} higher, one for each semitone of the neck: ${listWords(moves)}.`,
    way.retune === 0
      ? `So ${shapes} shapes sound in ${sign(to)}: ${shapes} and ${semitoneWords(up)}.`
      : `The strings were moved by ${signed(way.retune)} first, so ${shapes} shapes sound in ${sign(bare)}, and with the capo's ${signed(up)} in ${sign(to)}.`,
    "A capo shortens the strings, and a shorter string sounds higher. So it can only raise. To come down, let the strings down or play other shapes.",
    `${instrument.frets - way.capo} of ${instrument.frets} frets are left.`,
  ];
}

function withoutCapo({ from, to, instrument, way }: CapoFacts): string[] {
  const only = "A capo shortens the strings, and a shorter string sounds higher. So it can only raise.";
  const needed = semitonesUp(from, to);
  if (needed === 0) return [only, "This way needs none."];
  const down = 12 - needed;
  const fret = usefulFrets(instrument).find((each) => semitonesAt(instrument, each) === needed);
  const lower = `${glyphs(keyWords(to))} lies ${semitoneWords(needed)} over ${glyphs(keyWords(from))}, or ${semitoneWords(down)} under it.`;
  const instead =
    way.retune < 0
      ? "This way comes down by letting the strings down instead."
      : way.retune > 0
        ? "This way brings the strings up instead."
        : "This way changes nothing on the instrument and plays other shapes.";
  return [
    only,
    fret === undefined
      ? `${lower} With the chart's own shapes a capo would have to raise all ${needed}, higher than one is of use here.`
      : `${lower} With the chart's own shapes a capo would have to go up to fret ${fretName(instrument, fret)}.`,
    instead,
  ];
}

function checkFret(fret: number, asked: number, bare: KeyName, target: KeyName, instrument: Instrument): Verdict {
  const up = semitonesAt(instrument, fret);
  const wanted = semitonesAt(instrument, asked);
  const name = fretName(instrument, fret);
  if (fret === asked)
    return {
      right: true,
      words: `Fret ${name} raises by ${semitoneWords(up)}, from ${sign(bare)} to ${sign(target)}.`,
    };
  if (fret === 0)
    return {
      right: false,
      words: `That is the nut: without a capo they sound in ${sign(bare)}. Count the semitones up to ${sign(target)}.`,
    };
  const off = wanted - up;
  return {
    right: false,
    words: `At fret ${name} they would sound in ${sign(movedKey(bare, up))}. ${sign(target)} lies ${semitoneWords(Math.abs(off))} ${off > 0 ? "higher" : "lower"}.`,
  };
}

/** Where strings begin: at the nut, and behind the capo. */
function capoDots(tuned: Instrument, capo: number, key: KeyName): NeckDot[] {
  return tuned.strings.flatMap((_, string) =>
    (capo === 0 ? [0] : [0, capo]).flatMap((fret) => {
      const midi = soundAt(tuned, string, fret);
      if (midi === null) return [];
      const note = spellInKey(pitchClass(midi), key);
      return [{ string, fret, label: glyphs(note), root: note === key.tonic }];
    }),
  );
}

function usefulFrets(instrument: Instrument): number[] {
  const most = Math.min(instrument.capoTo, shownFrets);
  return Array.from({ length: most }, (_, k) => k + 1).filter((fret) => fretSemitones(instrument, fret) !== null);
}

function semitonesAt(instrument: Instrument, fret: number): number {
  return fretSemitones(instrument, fret) ?? 0;
}

function sign(key: KeyName): string {
  return glyphs(keySign(key));
}

function signed(semitones: number): string {
  return `${semitones < 0 ? "−" : "+"}${Math.abs(semitones)}`;
}
