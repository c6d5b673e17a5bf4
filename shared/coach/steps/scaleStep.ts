import { keyWords } from "../../music/keyWords";
import { type KeyName, spellInKey, tonicPitchClass } from "../../music/keyName";
import { distanceWords } from "../../music/moveWords";
import { glyphs } from "../../music/pitch";
import { degreesOf, degreeWord, type Degree } from "../degrees";
import { picked, type Chance } from "../seeded";
import type { Verdict } from "../coachQuestion";
import type { WhyStep } from "../whyStep";
import { listWords } from "../../music/listWords";

const stepWords: Record<number, string> = { 1: "half", 2: "whole", 3: "one and a half" };

/**
 * The scale of the written key with its numbers.
 *
 * @param key the key the chart is written in
 * @param chance decides which degree is asked for
 * @returns the step
 */
export function scaleStep(key: KeyName, chance: Chance): WhyStep {
  const degrees = degreesOf(key);
  const name = glyphs(keyWords(key));
  const notes = degrees.map(({ note }) => glyphs(note));
  const gaps = degrees.map(({ semitones }, k) => (degrees[k + 1]?.semitones ?? 12) - semitones);
  const wanted = picked(degrees.slice(1), chance);
  return {
    kind: "scale",
    title: `The scale of ${name}`,
    words: [
      `Your chart is written in ${name}. Its seven notes are ${listWords(notes)}; the home note ${notes[0]} is number 1.`,
      `From each to the next: ${gaps.map((gap) => stepWords[gap] ?? String(gap)).join(", ")}. A half step is one semitone, a whole one two.`,
    ],
    picture: {
      kind: "scales",
      scales: [{ key, degrees, from: 0 }],
      chords: [],
      spoken: `${name}: ${degrees.map(({ number }, k) => `${number} ${notes[k]}`).join(", ")}`,
    },
    question: {
      kind: "keyboard",
      ask: `Which note is the ${degreeWord(wanted.number)} of ${name}?`,
      check: (pc) => checkDegree(pc, key, degrees, wanted),
    },
  };
}

function checkDegree(pc: number, key: KeyName, degrees: readonly Degree[], wanted: Degree): Verdict {
  const name = glyphs(keyWords(key));
  const at = (pc - tonicPitchClass(key.tonic) + 12) % 12;
  const note = glyphs(spellInKey(pc, key));
  if (at === wanted.semitones) return { right: true, words: `${note} is the ${degreeWord(wanted.number)} of ${name}.` };
  const hit = degrees.find(({ semitones }) => semitones === at);
  const off = wanted.semitones - at;
  const way = `The ${degreeWord(wanted.number)} lies ${distanceWords(off)} ${off > 0 ? "higher" : "lower"}.`;
  if (hit) return { right: false, words: `${note} is the ${degreeWord(hit.number)} of ${name}. ${way}` };
  const below = degrees.findLast(({ semitones }) => semitones < at);
  const above = degrees.find(({ semitones }) => semitones > at);
  const between = `between the ${degreeWord(below?.number ?? 1)} and ${above ? `the ${degreeWord(above.number)}` : "the home note above"}`;
  return { right: false, words: `${note} is no note of ${name}: it lies ${between}. ${way}` };
}
