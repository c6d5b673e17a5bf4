import type { Instrument } from "../../instruments/instrument";
import { stringMidi } from "../../instruments/tension";
import { chordThird, parseChord, transposeChord } from "../../music/chord";
import { type KeyName, scaleSteps, spellInKey, tonicPitchClass } from "../../music/keyName";
import { distanceWords } from "../../music/moveWords";
import { glyphs, pitchClass } from "../../music/pitch";
import type { Way } from "../../ways/way";
import type { NeckAnswer, Verdict } from "../coachQuestion";
import { movableShapes, rootFrets, type MovableShape } from "../movableShapes";
import type { NumberedChord } from "../numberedChords";
import { picked, shuffled, type Chance } from "../seeded";
import { soundAt } from "../../instruments/soundAt";
import { retuned, stringLetters } from "../tunedNeck";
import type { LeftOut, NeckDot, WhyStep } from "../whyStep";
import { listWords } from "../../music/listWords";
import { capitalized } from "../../music/countWords";

const mostShapes = 3;
/** Frets that are offered for an answer. */
const shownFrets = 7;

/**
 * The movable shapes of the home chord along this neck, with their roots.
 *
 * @param chords of the song, for what a shape is moved to
 * @param to the key it shall sound in
 * @param instrument as it is tuned before
 * @param way for its retune
 * @param chance decides which shape is moved where
 * @returns the step; left out where nothing can be moved
 * @throws RangeError if a string's note cannot be read
 */
export function neckStep(
  chords: readonly NumberedChord[],
  to: KeyName,
  instrument: Instrument,
  way: Pick<Way, "retune">,
  chance: Chance,
): WhyStep | LeftOut {
  const title = "Movable shapes along your neck";
  if (instrument.fretMap) return { title, why: "On diatonic frets a shape becomes another chord when it is moved." };
  const tuned = retuned(instrument, way.retune, to);
  const home = parseChord(to.tonic + (scaleSteps(to.mode).includes(3) ? "m" : ""))!;
  const shapes = movableShapes(home, tuned, mostShapes);
  const letters = stringLetters(tuned.strings);
  const asked = shapes.length > 0 ? questionOf(shapes, home.text, chords, to, tuned, chance) : null;
  if (!asked) return { title, why: `No shape without open strings plays ${glyphs(home.text)} on this neck.` };
  const { movable, target, right } = asked;
  const first = Math.max(1, Math.min(right[0]! - Math.floor(chance() * shownFrets), tuned.frets - shownFrets + 1));
  return {
    kind: "neck",
    title,
    words: [
      `A shape without open strings can be pushed along the neck: one fret further is one semitone higher. Its root names the chord.`,
      `${glyphs(home.text)} lies here with its root on the ${listWords(unique(shapes.map(({ rootString }) => letters[rootString]!)))} string${unique(shapes.map(({ rootString }) => letters[rootString]!)).length > 1 ? "s" : ""}. With these you play in every key without a capo${way.retune === 0 ? "" : "; the strings are as this way tunes them"}.`,
    ],
    picture: {
      kind: "neck",
      instrument: tuned,
      capo: 0,
      frets: Math.min(
        tuned.frets,
        Math.max(12, ...shapes.flatMap(({ shape }) => shape.frets.map((fret) => fret ?? 0))),
      ),
      dots: dotsOf(shapes, tuned, to),
      shapes: shapes.map(({ shape }) => ({ name: home.text, shape })),
      spoken: shapes
        .map(
          ({ rootString, rootFret }) =>
            `${glyphs(home.text)} with its root on the ${letters[rootString]} string, fret ${rootFret}`,
        )
        .join("; "),
    },
    question: {
      kind: "neck",
      ask: `The ${glyphs(home.text)} shape with its root on the ${letters[movable.rootString]} string, fret ${movable.rootFret}: where does this root go to make it ${glyphs(target)}?`,
      firstFret: first,
      frets: Math.min(shownFrets, tuned.frets),
      whole: false,
      check: (place) => checkPlace(place, asked, letters, tuned, to),
    },
  };
}

interface Asked {
  movable: MovableShape;
  /** chord to move to, ASCII */
  target: string;
  /** its root, ASCII */
  root: string;
  /** frets on the root's string */
  right: number[];
}

/** A shape and one of the song's chords of its kind; another chord of the kind where the song has none. */
function questionOf(
  shapes: readonly MovableShape[],
  home: string,
  chords: readonly NumberedChord[],
  to: KeyName,
  tuned: Instrument,
  chance: Chance,
): Asked | null {
  const chord = parseChord(home)!;
  const minor = chordThird(chord) === "minor";
  const own = chords
    .filter(({ third }) => third === (minor ? "minor" : "major"))
    .flatMap(({ sounding }) => {
      const root = parseChord(sounding)?.root;
      return root === undefined ? [] : [root + (minor ? "m" : "")];
    });
  const others = shuffled([2, 5, 7, 9, 3, 10], chance).map((semitones) => transposeChord(chord, semitones, to, to));
  const movable = picked(shapes, chance);
  const open = stringMidi(tuned.strings[movable.rootString]!);
  for (const target of [...shuffled(own, chance), ...others]) {
    const root = parseChord(target)?.root;
    if (root === undefined || tonicPitchClass(root) === tonicPitchClass(chord.root)) continue;
    const right = rootFrets(movable, root, tuned, open);
    if (right.length > 0) return { movable, target, root, right };
  }
  return null;
}

function checkPlace(
  { string, fret }: NeckAnswer,
  { movable, target, root, right }: Asked,
  letters: readonly string[],
  tuned: Instrument,
  key: KeyName,
): Verdict {
  const own = letters[movable.rootString]!;
  const midi = soundAt(tuned, string, fret);
  if (midi === null) return { right: false, words: "There is no fret under this string." };
  const note = glyphs(spellInKey(pitchClass(midi), key));
  const name = glyphs(target);
  const at = fret === 0 ? `the open ${letters[string]} string` : `fret ${fret} of the ${letters[string]} string`;
  if (string === movable.rootString && right.includes(fret))
    return { right: true, words: `${capitalized(at)} is ${glyphs(root)}, and there the shape plays ${name}.` };
  if (string !== movable.rootString) {
    const there =
      pitchClass(midi) === tonicPitchClass(root)
        ? `${capitalized(at)} is ${note}, but this`
        : `${capitalized(at)} is ${note}. This`;
    return { right: false, words: `${there} shape has its root on the ${own} string. Look for ${glyphs(root)} there.` };
  }
  const nearest = right.reduce((a, b) => (Math.abs(b - fret) < Math.abs(a - fret) ? b : a));
  const off = nearest - fret;
  if (pitchClass(midi) === tonicPitchClass(root))
    return {
      right: false,
      words: `${capitalized(at)} is ${note}, but the shape would reach past the neck. Find ${note} once more.`,
    };
  return {
    right: false,
    words: `${capitalized(at)} is ${note}. ${glyphs(root)} lies ${distanceWords(off)} ${off > 0 ? "further up" : "nearer to the nut"}.`,
  };
}

function dotsOf(shapes: readonly MovableShape[], tuned: Instrument, key: KeyName): NeckDot[] {
  return shapes.flatMap(({ shape }) =>
    shape.frets.flatMap((fret, string) => {
      const midi = fret === null ? null : soundAt(tuned, string, fret);
      if (fret === null || midi === null) return [];
      return [{ string, fret, label: glyphs(spellInKey(pitchClass(midi), key)), root: shape.roots.includes(string) }];
    }),
  );
}

function unique(items: readonly string[]): string[] {
  return [...new Set(items)];
}
