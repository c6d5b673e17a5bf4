import { parseChord, transposeChord } from "../../music/chord";
import type { KeyName } from "../../music/keyName";
import { keyWords } from "../../music/keyWords";
import { distanceWords } from "../../music/moveWords";
import { glyphs } from "../../music/pitch";
import { chordNumber } from "../../songs/chordNumbers";
import { degreesOf, degreeWord, numberGlyphs } from "../degrees";
import { semitonesUp, type NumberedChord } from "../numberedChords";
import { picked, shuffled, type Chance } from "../seeded";
import type { LeftOut, WhyStep } from "../whyStep";
import { listWords } from "../../music/listWords";

const offered = 4;
const named = 5;

/**
 * The same numbers in the new key.
 *
 * @param chords of the song
 * @param from the key the chart is written in
 * @param to the new key
 * @param chance decides which chord is asked for
 * @returns the step; left out where the song stays in its key or has no chords
 */
export function newKeyStep(
  chords: readonly NumberedChord[],
  from: KeyName,
  to: KeyName,
  chance: Chance,
): WhyStep | LeftOut {
  const [old, now] = [glyphs(keyWords(from)), glyphs(keyWords(to))];
  const title = `The same numbers in ${now}`;
  const move = semitonesUp(from, to);
  if (move === 0) return { title: "The same numbers in a new key", why: `The song stays in ${old}.` };
  if (chords.length === 0) return { title, why: "The chart has no chords yet." };
  const near = move > 6 ? move - 12 : move;
  const wanted = picked(chords, chance);
  const number = numberGlyphs(wanted.roman);
  const right = glyphs(wanted.sounding);
  const moves = [0, (12 - move) % 12, ...shuffled([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11], chance)];
  const wrong = new Map<string, string>();
  for (const semitones of moves) {
    if (semitones === move || wrong.size === offered - 1) continue;
    const name = semitones === 0 ? wanted.written : transposeChord(wanted.chord, semitones, to, from);
    const chord = parseChord(name);
    if (glyphs(name) !== right && chord) wrong.set(glyphs(name), numberGlyphs(chordNumber(chord, to).roman));
  }
  const root = `${number} stands on the ${wanted.accidental === "" ? "" : wanted.accidental === "b" ? "lowered " : "raised "}${degreeWord(wanted.degree)} note of ${now}`;
  const newNotes = degreesOf(to);
  return {
    kind: "new-key",
    title,
    words: [
      `${now} lies ${distanceWords(near)} ${near < 0 ? "under" : "over"} ${old}, or ${distanceWords(12 - Math.abs(near))} ${near < 0 ? "over" : "under"} it. Numbers stay, names change: ${listWords(
        chords.slice(0, named).map(({ roman, sounding }) => `${numberGlyphs(roman)} is now ${glyphs(sounding)}`),
      )}.`,
      "Every chord moves by the same distance, so the song is the same song, only lower or higher.",
    ],
    picture: {
      kind: "scales",
      scales: [
        { key: from, degrees: degreesOf(from), from: Math.max(0, -near) },
        { key: to, degrees: newNotes, from: Math.max(0, near) },
      ],
      chords,
      spoken: chords
        .map(({ roman, written, sounding }) => `${numberGlyphs(roman)}: ${glyphs(written)} becomes ${glyphs(sounding)}`)
        .join(", "),
    },
    question: {
      kind: "choices",
      ask: `${glyphs(wanted.written)} is ${number} in ${old}. Which chord is ${number} in ${now}?`,
      options: shuffled([right, ...wrong.keys()], chance),
      check: (option) => {
        if (option === right) return { right: true, words: `${root}, and that gives ${right}.` };
        const as = wrong.get(option);
        const unmoved = option === glyphs(wanted.written) ? `${option} is how the chart is written. ` : "";
        const there = as === undefined ? "" : `In ${now}, ${option} is ${as}. `;
        return {
          right: false,
          words: `${unmoved}${there}${number} counts up from ${glyphs(newNotes[0]!.note)}: ${newNotes
            .slice(0, Math.max(2, wanted.degree))
            .map(({ note }) => glyphs(note))
            .join(
              ", ",
            )}${wanted.accidental === "" ? "" : wanted.accidental === "b" ? ", then a semitone back" : ", then a semitone more"}.`,
        };
      },
    },
  };
}
