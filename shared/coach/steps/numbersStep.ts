import type { KeyName } from "../../music/keyName";
import { keyWords } from "../../music/keyWords";
import { glyphs } from "../../music/pitch";
import { chordNumber } from "../../songs/chordNumbers";
import { degreesOf, degreeWord, numberGlyphs } from "../degrees";
import { triadOn, type NumberedChord } from "../numberedChords";
import { picked, shuffled, type Chance } from "../seeded";
import type { LeftOut, WhyStep } from "../whyStep";
import { listWords } from "../../music/listWords";

/** How many chords are named in a sentence. */
const named = 5;
const offered = 4;

/**
 * The numbers under the song's chords.
 *
 * @param chords of the song
 * @param key the key the chart is written in
 * @param chance decides which chord is asked for
 * @returns the step; left out where the song has no chords
 */
export function numbersStep(chords: readonly NumberedChord[], key: KeyName, chance: Chance): WhyStep | LeftOut {
  const title = "Numbers under your chords";
  if (chords.length === 0) return { title, why: "The chart has no chords yet." };
  const name = glyphs(keyWords(key));
  const degrees = degreesOf(key);
  const byNumber = new Map<string, string>();
  for (const { roman, written } of chords) if (!byNumber.has(roman)) byNumber.set(roman, written);
  const wanted = picked(
    chords.filter(({ roman, written }) => byNumber.get(roman) === written),
    chance,
  );
  for (const at of degrees.keys()) {
    const triad = triadOn(degrees, at);
    const roman = triad && chordNumber(triad, key).roman;
    if (triad && roman && !byNumber.has(roman)) byNumber.set(roman, triad.text);
  }
  const others = shuffled(
    [...byNumber.keys()].filter((roman) => roman !== wanted.roman),
    chance,
  );
  const options = shuffled([wanted.roman, ...others.slice(0, offered - 1)], chance).map(numberGlyphs);
  const chordOf = new Map([...byNumber].map(([roman, chord]) => [numberGlyphs(roman), glyphs(chord)]));
  const right = numberGlyphs(wanted.roman);
  const place = wanted.accidental === "" ? "" : wanted.accidental === "b" ? "lowered " : "raised ";
  const reason = `${glyphs(wanted.written)} stands on the ${place}${degreeWord(wanted.degree)} note of ${name}`;
  return {
    kind: "numbers",
    title,
    words: [
      `A chord has the number of its root in the scale of ${name}: ${listWords(
        chords
          .slice(0, named)
          .map(({ written, roman, plain }) => `${glyphs(written)} is ${numberGlyphs(roman)} (${numberGlyphs(plain)})`),
      )}.`,
      ...(chords.some(({ third }) => third === "minor")
        ? ["Capital numerals are major chords, small ones minor."]
        : []),
      ...foreignWords(chords),
    ],
    picture: {
      kind: "lines",
      chords,
      spoken: chords.map(({ written, roman }) => `${glyphs(written)} ${numberGlyphs(roman)}`).join(", "),
    },
    question: {
      kind: "choices",
      ask: `Which number is ${glyphs(wanted.written)} in ${name}?`,
      options,
      check: (option) =>
        option === right
          ? { right: true, words: `${reason}, so it is ${right}.` }
          : { right: false, words: `${option} in ${name} is ${chordOf.get(option) ?? "another chord"}. ${reason}.` },
    },
  };
}

/** Chords from outside the scale, by what they do. */
function foreignWords(chords: readonly NumberedChord[]): string[] {
  const leading = chords.flatMap(({ written, leads }) =>
    leads ? [`${glyphs(written)} leads to ${glyphs(leads.to)}: it is ${numberGlyphs(leads.roman)}.`] : [],
  );
  const borrowed = chords
    .filter(({ accidental, leads }) => accidental !== "" && leads === null)
    .map(
      ({ written, accidental, degree, roman }) =>
        `${glyphs(written)} stands on the ${accidental === "b" ? "lowered" : "raised"} ${degreeWord(degree)}: ${numberGlyphs(roman)}.`,
    );
  return [...leading, ...borrowed].slice(0, 2);
}
