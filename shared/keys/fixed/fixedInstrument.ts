import { keyFifths, type KeyName, spellTonic, tonicPitchClass } from "../../music/keyName";
import { keySign } from "../../music/keyWords";
import { glyphs } from "../../music/pitch";
import { listWords } from "../../music/listWords";

/** An instrument that is made in one key and cannot be moved. */
export interface FixedInstrument {
  /** such as "harp-C" or "whistle-D" */
  id: string;
  kind: "harp" | "whistle";
  /** the key it is made in, ASCII */
  tonic: string;
}

/** How well a key suits such an instrument. */
export interface KeyFit {
  fits: boolean;
  /** how it is played there, or what keeps it out, such as "cross, a fifth over its own key" */
  how: string;
}

/** Keys in which they are sold. @see common practice: ten-hole harps in all twelve, whistles in these */
const madeIn: Record<FixedInstrument["kind"], readonly string[]> = {
  harp: ["C", "Db", "D", "Eb", "E", "F", "F#", "G", "Ab", "A", "Bb", "B"],
  whistle: ["D", "C", "Bb", "Eb", "F", "G", "A", "E"],
};

/** Every fixed instrument that can be chosen, by kind. */
export const fixedInstruments: readonly FixedInstrument[] = (["whistle", "harp"] as const).flatMap((kind) =>
  madeIn[kind].map((tonic) => ({ id: `${kind}-${tonic}`, kind, tonic })),
);

/**
 * Finds a fixed instrument.
 *
 * @param id such as "whistle-D"
 * @returns the instrument, or null if there is none of that id
 * @example findFixed("harp-Bb")?.tonic // => "Bb"
 */
export function findFixed(id: string): FixedInstrument | null {
  return fixedInstruments.find((instrument) => instrument.id === id) ?? null;
}

/**
 * What the instrument is called.
 *
 * @param instrument any
 * @returns with glyphs
 * @example fixedName({ id: "harp-Bb", kind: "harp", tonic: "Bb" }) // => "mouth harp in B♭"
 */
export function fixedName({ kind, tonic }: FixedInstrument): string {
  return `${kind === "harp" ? "mouth harp" : "whistle"} in ${glyphs(tonic)}`;
}

const positions = ["first", "second", "third", "fourth", "fifth", "sixth", "seventh"];

/**
 * Whether a key can be played on an instrument made in one key.
 *
 * A key with the instrument's own notes fits. A harp is also played "cross", in the major key a fifth above its own,
 * whose seventh is lowered unless it is bent, and in the minor key of its third position, whose sixth is raised. A
 * whistle also plays the keys with one flat more, by cross-fingering its lowered seventh.
 *
 * @param instrument harp or whistle
 * @param key the sounding key
 * @returns whether it fits, and how
 * @throws RangeError if the key's tonic is no note name
 * @see common practice of ten-hole diatonic harps (positions by fifths) and six-hole whistles
 */
export function keyFit({ kind, tonic }: FixedInstrument, key: KeyName): KeyFit {
  const own = keyFifths({ tonic, mode: "major" });
  const around = (distance: number) => ((distance % 12) + 12) % 12;
  const notes = around(keyFifths(key) - own);
  const position = around(keyFifths({ tonic: key.tonic, mode: "major" }) - own);
  if (kind === "whistle") {
    if (notes === 0) return { fits: true, how: position === 0 ? "its own key" : "with its own notes" };
    if (notes === 11) return { fits: true, how: "with its seventh lowered by cross-fingering" };
    return { fits: false, how: "needs notes that it does not have" };
  }
  if (notes === 0)
    return { fits: true, how: position === 0 ? "its own key" : `${positions[position] ?? "high"} position` };
  if (key.mode === "major" && position === 1)
    return { fits: true, how: "cross, second position; its seventh is lowered unless it is bent" };
  if (key.mode === "minor" && position === 2) return { fits: true, how: "third position; its sixth is raised" };
  return { fits: false, how: "needs notes that it does not have" };
}

/**
 * The keys in which an instrument of this kind would have to be made to suit a key.
 *
 * @param kind of instrument
 * @param key the sounding key
 * @returns instruments that fit, those in the key itself first
 * @example suited("harp", { tonic: "G", mode: "major" }).map(({ tonic }) => tonic) // => ["G", "C"]
 */
export function suited(kind: FixedInstrument["kind"], key: KeyName): FixedInstrument[] {
  const home = tonicPitchClass(key.tonic);
  const first = ({ tonic }: FixedInstrument) => (tonicPitchClass(tonic) === home ? 0 : 1);
  return fixedInstruments
    .filter((instrument) => instrument.kind === kind && keyFit(instrument, key).fits)
    .sort((a, b) => first(a) - first(b));
}

/**
 * The keys of a mode that an instrument plays.
 *
 * @param instrument harp or whistle
 * @param mode of the song
 * @returns keys, its own place on the circle of fifths first
 * @example playableKeys({ id: "whistle-D", kind: "whistle", tonic: "D" }, "major").map(({ tonic }) => tonic) // => ["D", "G"]
 */
export function playableKeys(instrument: FixedInstrument, mode: KeyName["mode"]): KeyName[] {
  const own = tonicPitchClass(instrument.tonic);
  return Array.from({ length: 12 }, (_, k): KeyName => ({ tonic: spellTonic((own + k) % 12, mode), mode })).filter(
    (key) => keyFit(instrument, key).fits,
  );
}

/**
 * What is said of a key where fixed instruments play along.
 *
 * @param key the sounding key
 * @param instruments in the line-up
 * @returns such as "Fits the whistle in D, not the mouth harp in C."; null without instruments
 * @example fitSentence({ tonic: "G", mode: "major" }, [{ id: "whistle-D", kind: "whistle", tonic: "D" }]) // => "Fits the whistle in D."
 */
export function fitSentence(key: KeyName, instruments: readonly FixedInstrument[]): string | null {
  if (instruments.length === 0) return null;
  const named = (fits: boolean) =>
    instruments.filter((each) => keyFit(each, key).fits === fits).map((each) => `the ${fixedName(each)}`);
  const [yes, no] = [named(true), named(false)];
  if (yes.length === 0) return `Does not fit ${listWords(no, "or")}.`;
  return `Fits ${listWords(yes, "and")}${no.length === 0 ? "" : `, not ${listWords(no, "or")}`}.`;
}

/**
 * Keys by name, for a sentence.
 *
 * @param keys at least one
 * @returns such as "D or G"
 * @example keyList([{ tonic: "D", mode: "major" }, { tonic: "G", mode: "major" }]) // => "D or G"
 */
export function keyList(keys: readonly KeyName[]): string {
  return listWords(
    keys.map((key) => glyphs(keySign(key))),
    "or",
  );
}
