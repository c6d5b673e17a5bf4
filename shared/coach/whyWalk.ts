import type { Instrument } from "../instruments/instrument";
import type { KeyName } from "../music/keyName";
import { keyWords } from "../music/keyWords";
import { glyphs } from "../music/pitch";
import type { Chart } from "../songs/chart";
import type { Way } from "../ways/way";
import { numberedChords } from "./numberedChords";
import { seeded } from "./seeded";
import { capoStep } from "./steps/capoStep";
import { neckStep } from "./steps/neckStep";
import { newKeyStep } from "./steps/newKeyStep";
import { numbersStep } from "./steps/numbersStep";
import { retuneStep } from "./steps/retuneStep";
import { scaleStep } from "./steps/scaleStep";
import type { LeftOut, WhyStep } from "./whyStep";

/** What is to be explained: a song, the key it shall sound in, and how that is reached on an instrument. */
export interface WhyQuestion {
  chart: Chart;
  /** the key the chart is written in */
  from: KeyName;
  /** the key it shall sound in */
  to: KeyName;
  instrument: Instrument;
  /** retune, capo and shapes of this very way */
  way: Pick<Way, "retune" | "capo" | "shapeKey">;
  /** decides what the questions ask */
  seed: number;
}

/** The walk: its steps in order, and what does not apply to this way, with the reason. */
export interface WhyWalk {
  steps: WhyStep[];
  leftOut: LeftOut[];
}

/**
 * Why a song sounds in its new key when it is played in this way: scale, numbers, the new key, capo, retune, neck.
 *
 * Each step ends in a question that its own data answer. A step that says nothing about this way is left out with the
 * reason.
 *
 * @param question song, keys, instrument and way
 * @returns at least one step
 * @throws RangeError if a tonic or a string's note cannot be read
 * @see common practice: numbers of chords, capo and retuning (heard = shapes + retune + capo)
 */
export function whyWalk(question: WhyQuestion): WhyWalk {
  const { from, to, instrument, way, seed } = question;
  const chords = numberedChords(question.chart, from, to);
  // Each step has its own source, so that leaving one out changes no other.
  const chance = (step: number) => seeded(seed * 8 + step);
  const all: (WhyStep | LeftOut)[] = [
    scaleStep(from, chance(1)),
    numbersStep(chords, from, chance(2)),
    newKeyStep(chords, from, to, chance(3)),
    capoStep({ from, to, instrument, way }, chance(4)),
    retuneStep(to, instrument, way, chance(5)),
    neckStep(chords, to, instrument, way, chance(6)),
  ];
  return {
    steps: all.filter((step): step is WhyStep => "question" in step),
    leftOut: all.filter((step): step is LeftOut => "why" in step),
  };
}

/**
 * The walk's title.
 *
 * @param to the key it leads to
 * @returns such as "Why it sounds in C major"
 * @example whyTitle({ tonic: "Bb", mode: "major" }) // => "Why it sounds in B♭ major"
 */
export function whyTitle(to: KeyName): string {
  return `Why it sounds in ${glyphs(keyWords(to))}`;
}
