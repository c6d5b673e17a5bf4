import type { Instrument } from "../../instruments/instrument";
import { stringMidi } from "../../instruments/tension";
import { keySign } from "../../music/keyWords";
import { type KeyName, spellInKey } from "../../music/keyName";
import { distanceWords } from "../../music/moveWords";
import { glyphs, pitchClass } from "../../music/pitch";
import type { Way } from "../../ways/way";
import type { Verdict } from "../coachQuestion";
import { picked, type Chance } from "../seeded";
import { retuned, stringLetters } from "../tunedNeck";
import type { LeftOut, WhyStep } from "../whyStep";
import { listWords } from "../../music/listWords";

/**
 * Why a retune keeps the shapes: every string moves alike, so every interval stays.
 *
 * @param to the key it shall sound in
 * @param instrument as it is tuned before
 * @param way for its retune and shapes
 * @param chance decides which string is asked for
 * @returns the step; left out where nothing is retuned
 * @throws RangeError if a string's note cannot be read
 */
export function retuneStep(
  to: KeyName,
  instrument: Instrument,
  way: Pick<Way, "retune" | "capo" | "shapeKey">,
  chance: Chance,
): WhyStep | LeftOut {
  const title = "Why the retune keeps the shapes";
  if (way.retune === 0) return { title, why: "Nothing is retuned in this way." };
  const tuned = retuned(instrument, way.retune, to);
  const [before, after] = [stringLetters(instrument.strings), stringLetters(tuned.strings)];
  const strings = before.map((name, k) => ({ from: name, to: after[k]! }));
  const midis = instrument.strings.map(stringMidi);
  const gaps = midis.slice(1).map((midi, k) => midi - midis[k]!);
  const direction = way.retune < 0 ? "down" : "up";
  const size = distanceWords(way.retune);
  const shapes = glyphs(keySign({ tonic: way.shapeKey, mode: to.mode }));
  const asked = picked([...midis.keys()], chance);
  const sounds =
    way.capo === 0
      ? `${shapes} shapes sound ${size} ${way.retune < 0 ? "lower" : "higher"}: in ${glyphs(keySign(to))}.`
      : `${shapes} shapes sound ${size} ${way.retune < 0 ? "lower" : "higher"}, before the capo raises them.`;
  return {
    kind: "retune",
    title,
    words: [
      `Every string goes ${direction} by ${size}: ${listWords(strings.map((string) => `${string.from} to ${string.to}`))}.`,
      ...(gaps.length === 0
        ? []
        : [
            `Between neighbours nothing changes: ${listWords(gaps.map((gap) => `${Math.abs(gap)}`))} semitones before, the same after. Your fingers find the same distances, so every shape stays what it was.`,
          ]),
      `Only the sound moves: ${sounds}`,
    ],
    picture: {
      kind: "strings",
      strings,
      gaps,
      spoken: `Strings before and after: ${strings.map((string) => `${string.from} to ${string.to}`).join(", ")}`,
    },
    question: {
      kind: "keyboard",
      ask: `The ${before[asked]} string goes ${direction} by ${size}. Which note is it then?`,
      check: (pc) => checkString(pc, midis[asked]!, way.retune, before[asked]!, to),
    },
  };
}

function checkString(pc: number, midi: number, retune: number, before: string, key: KeyName): Verdict {
  const was = pitchClass(midi);
  const right = pitchClass(midi + retune);
  const note = glyphs(spellInKey(pc, key));
  const size = distanceWords(retune);
  const direction = retune < 0 ? "down" : "up";
  if (pc === right)
    return { right: true, words: `${before} ${direction} by ${size} is ${note}, as for every other string.` };
  if (pc === was)
    return { right: false, words: `${note} is where it stood before. Go ${direction} by ${size} from there.` };
  const up = (pc - was + 12) % 12;
  const off = up > 6 ? up - 12 : up;
  return {
    right: false,
    words: `${note} lies ${distanceWords(off)} ${off < 0 ? "under" : "over"} ${before}. The retune goes ${direction} by ${size}.`,
  };
}
