import type { KeyName } from "../music/keyName";
import { glyphs } from "../music/pitch";
import { fretName } from "../instruments/frets";
import type { Instrument } from "../instruments/instrument";
import { tensionRatio } from "../instruments/tension";
import { insteadOf } from "./insteadOf";
import { leftOutWords } from "./leftOutTones";
import { missingShapes, missingWords } from "./missingShapes";
import type { Shape, StringChange, Way, WayChord } from "./way";
import { listWords } from "../music/listWords";
import { capitalized, countWord, plural } from "../music/countWords";

/** What the words about a way are made from. */
export interface WayFacts {
  kind: Way["kind"];
  retune: number;
  capo: number;
  shapeKey: KeyName;
  /** the fingers play the chords of the chart as it is written */
  asWritten: boolean;
  /** the player knows every shape by name */
  allKnown: boolean;
  chords: readonly WayChord[];
  /** chords whose bass the instrument cannot put lowest */
  withoutBass: readonly string[];
  difficulty: number;
  strings: readonly StringChange[];
  instrument: Instrument;
}

const kgPerLb = 0.45359237;

/**
 * What to do, in one sentence without a full stop.
 *
 * @param facts of the way
 * @returns such as "Capo 3, play shapes in A"
 */
export function wayTitle({ kind, retune, capo, shapeKey, allKnown }: WayFacts): string {
  const name = keyInWords(shapeKey);
  const shapes = allKnown ? `play the shapes you know in ${name}` : `play shapes in ${name}`;
  if (kind === "as-is") return `As tuned, ${shapes}`;
  if (kind === "capo") return `Capo ${capo}, ${shapes}`;
  const tuning = `Retune ${distanceInWords(retune)}`;
  return kind === "retune" ? `${tuning}, ${shapes}` : `${tuning}, capo ${capo}, ${shapes}`;
}

/**
 * The cost in words: kinds of shapes, strings to turn, frets left.
 *
 * @param facts of the way
 * @returns one to three short sentences
 */
export function wayCost({ retune, capo, chords, asWritten, instrument }: WayFacts): string {
  const missing = missingWords(chords);
  const sentences = [
    missing === null ? "" : `${capitalized(missing)}.`,
    shapeKinds(
      chords.flatMap(({ shape }) => (shape ? [shape] : [])),
      missing !== null,
    ),
  ];
  if (asWritten) sentences.push("The chart as written.");
  const strings = instrument.strings.length;
  if (retune !== 0)
    sentences.push(`${capitalized(countWord(strings))} strings to ${retune < 0 ? "let down" : "bring up"}.`);
  if (capo > 0) sentences.push(`${instrument.frets - capo} frets left.`);
  return sentences.filter(Boolean).join(" ");
}

/**
 * Why this way is easy or hard.
 *
 * @param facts of the way
 * @returns one or two sentences
 */
export function wayWhy({ kind, difficulty, chords, asWritten, instrument }: WayFacts): string {
  const shapes = chords.flatMap(({ shape }) => (shape ? [shape] : []));
  const missing = missingWords(chords);
  const word = missing !== null ? "Harder" : difficulty < 0.4 ? "Easy" : difficulty < 0.47 ? "Middling" : "Harder";
  const frets = shapes.flatMap(({ frets }) => frets.filter((fret) => fret !== null && fret > 0));
  const highest = Math.max(0, ...frets.map((fret) => fret ?? 0));
  const barres = chords.filter(({ shape }) => shape?.barre).map(({ played }) => glyphs(played));
  const within = highest === 0 ? "open strings alone" : withinFrets(highest, instrument);
  const barreWords =
    barres.length === 0 ? "no barre" : `${barres.length === 1 ? "a barre" : "barres"} for ${distinct(barres)}`;
  const effect: Record<Way["kind"], string> = {
    "as-is": "Nothing to clamp or retune.",
    capo: "Nothing retuned.",
    retune: asWritten ? "You read the chart as it stands." : "No capo on the neck.",
    "retune-capo": asWritten ? "You read the chart as it stands." : "Retune and capo meet half way.",
  };
  if (missing !== null && shapes.length === 0) return `${word}: ${missing}. ${effect[kind]}`;
  const lack = missing === null ? "" : `${missing}; the others `;
  return `${word}: ${lack}${missing === null ? within : within.replace(/^all /, "")}, ${barreWords}. ${effect[kind]}`;
}

function withinFrets(highest: number, instrument: Instrument): string {
  if (instrument.fretMap) return `all up to fret ${fretName(instrument, highest)}`;
  return `all within the first ${plural(highest, "fret")}`;
}

/**
 * What to beware of.
 *
 * @param facts of the way
 * @returns sentences, the weightiest first; may be empty
 */
export function wayCautions({ retune, capo, chords, withoutBass, strings, instrument }: WayFacts): string[] {
  const cautions: string[] = [];
  const { names } = missingShapes(chords);
  if (names.length > 0) {
    cautions.push(`This instrument has no playable shape for ${distinct(names.map(glyphs))}.`);
    for (const name of new Set(names)) cautions.push(`For ${glyphs(name)}, ${insteadOf(name, instrument, capo)}.`);
  }
  const fresh = chords
    .filter(({ known, shape }) => known === false && shape !== null)
    .map(({ played }) => glyphs(played));
  if (fresh.length > 0 && fresh.length <= 2 && fresh.length < chords.length)
    cautions.push(
      fresh.length === 1
        ? `${fresh[0]} is the new shape: three minutes with it first.`
        : `${distinct(fresh)} are the new shapes: a few minutes with them first.`,
    );
  const partial = chords.map(({ played, shape }) => (shape ? leftOutWords(played, shape, instrument) : null));
  cautions.push(...new Set(partial.filter((words) => words !== null)));
  if (retune !== 0) cautions.push(...tensionCautions(retune, strings, instrument));
  const short = instrument.strings.findIndex(({ startsAtFret }) => startsAtFret !== undefined);
  if (short >= 0) {
    const { note, startsAtFret = 0 } = instrument.strings[short]!;
    const name = glyphs(note.replace(/-?\d+$/, ""));
    if (capo > 0)
      cautions.push(
        `The short ${name} string needs its own stop ${plural(capo, "fret")} up, at fret ${startsAtFret + capo}.`,
      );
    const silent = chords
      .filter(({ shape }) => shape && shape.frets[short] === null)
      .map(({ played }) => glyphs(played));
    if (silent.length > 0) cautions.push(`Leave the short ${name} string silent on ${distinct(silent)}.`);
  }
  if (withoutBass.length > 0)
    cautions.push(`The bass behind the slash cannot lie lowest here: ${distinct(withoutBass.map(glyphs))}.`);
  if (capo > 0) cautions.push("Check the tuning after clamping.");
  if (capo > 5) cautions.push("So high up the sound is thin and the frets are narrow.");
  return cautions;
}

function tensionCautions(retune: number, strings: readonly StringChange[], instrument: Instrument): string[] {
  const change = Math.round(Math.abs(tensionRatio(retune) - 1) * 100);
  const known = strings.find(({ beforeLb, afterLb }) => beforeLb !== null && afterLb !== null);
  const sample = known
    ? ` (${glyphs(known.from.replace(/-?\d+$/, ""))} string ${kg(known.beforeLb!)} to ${kg(known.afterLb!)} kg)`
    : "";
  const opening = `Tension ${retune < 0 ? "falls" : "rises"} by ${change} %${sample}.`;
  const slack = strings.some(({ verdict }) => verdict === "slack");
  const down = slack
    ? "Below the slack limit of these strings: they buzz and fret sharp unless you put on a heavier set."
    : "Above the slack limit for this set; press lightly or notes go sharp.";
  const up = "A string can snap: eyes away, bring it up slowly, and check the maker's limits.";
  const cautions = [`${opening} ${retune < 0 ? down : up}`];
  if (instrument.strings.some(({ gaugeIn }) => gaugeIn === null))
    cautions.push("Not every gauge is known, so the limits are judged by semitones alone.");
  cautions.push("Retune before the evening, not on stage.");
  return cautions;
}

/**
 * A retune in words.
 *
 * @param semitones not 0; negative for down
 * @returns distance and direction
 */
function distanceInWords(semitones: number): string {
  const size = Math.abs(semitones);
  const words = ["no distance", "a semitone", "a whole tone", "three semitones", "two whole tones"];
  return `${words[size] ?? `${size} semitones`} ${semitones < 0 ? "down" : "up"}`;
}

function shapeKinds(shapes: readonly Shape[], partly: boolean): string {
  const barre = shapes.filter((shape) => shape.barre).length;
  const open = shapes.filter((shape) => !shape.barre && shape.frets.includes(0)).length;
  const closed = shapes.length - barre - open;
  if (shapes.length === 0) return "";
  if (barre === 0 && closed === 0)
    return partly ? "The others are open shapes, no barre." : "Open shapes only, no barre.";
  const kinds = [
    ...(open > 0 ? [`${countWord(open)} open`] : []),
    ...(closed > 0 ? [`${countWord(closed)} closed`] : []),
  ];
  const last = closed > 0 ? closed : open;
  const named = kinds.length > 0 ? `${kinds.join(" and ")} shape${last === 1 ? "" : "s"}` : "";
  const barres = barre === 0 ? "no barre" : barre === 1 ? "one barre" : `${countWord(barre)} barres`;
  const sentence = named === "" ? barres : `${named}, ${barres}`;
  return `${capitalized(sentence)}.`;
}

function keyInWords(key: KeyName): string {
  const tonic = glyphs(key.tonic);
  if (key.mode === "major") return tonic;
  return `${tonic} ${key.mode}`;
}

function kg(lb: number): string {
  return (lb * kgPerLb).toFixed(1);
}

function distinct(names: readonly string[]): string {
  return listWords([...new Set(names)]);
}
