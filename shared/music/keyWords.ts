import { type KeyName, spellTonic, tonicPitchClass } from "./keyName";

/**
 * A key in words.
 *
 * @param key tonic in ASCII, and mode
 * @returns such as "D major" or "F# minor", accidentals in ASCII
 * @example keyWords({ tonic: "F#", mode: "minor" }) // => "F# minor"
 */
export function keyWords(key: KeyName): string {
  return `${key.tonic} ${key.mode}`;
}

/**
 * A key as short as players say it: a major key by its tonic alone, a minor one like its chord.
 *
 * @param key tonic in ASCII, and mode
 * @returns such as "D", "F#m" or "A dorian", accidentals in ASCII
 * @example keySign({ tonic: "F#", mode: "minor" }) // => "F#m"
 */
export function keySign(key: KeyName): string {
  if (key.mode === "major") return key.tonic;
  return key.mode === "minor" ? `${key.tonic}m` : keyWords(key);
}

const shortModes: Record<KeyName["mode"], string> = {
  major: "",
  minor: "",
  dorian: "dor.",
  phrygian: "phr.",
  lydian: "lyd.",
  mixolydian: "mixo.",
  locrian: "loc.",
};

/**
 * A key's sign in two parts, for places that set the tonic large: modes other than major and minor get a short form.
 *
 * @param key tonic in ASCII, and mode
 * @returns the large part, accidentals in ASCII, and the mode's short form; "" where the large part says it all
 * @see common practice: short forms as chart writers put them
 * @example keySignParts({ tonic: "Eb", mode: "mixolydian" }) // => { large: "Eb", mode: "mixo." }
 */
export function keySignParts(key: KeyName): { large: string; mode: string } {
  return { large: key.mode === "minor" ? `${key.tonic}m` : key.tonic, mode: shortModes[key.mode] };
}

/**
 * The key some semitones away, in the same mode.
 *
 * @param key where to start
 * @param semitones whole semitones, negative = down
 * @returns the key with its plainest name; the key itself for whole octaves
 * @throws RangeError if semitones is not a whole number or the tonic is no note name
 * @example movedKey({ tonic: "D", mode: "major" }, -1) // => { tonic: "Db", mode: "major" }
 */
export function movedKey(key: KeyName, semitones: number): KeyName {
  if (!Number.isInteger(semitones)) throw new RangeError("a key moves by whole semitones");
  if (semitones % 12 === 0) return key;
  const pc = (((tonicPitchClass(key.tonic) + semitones) % 12) + 12) % 12;
  return { tonic: spellTonic(pc, key.mode), mode: key.mode };
}
