import { type KeyName, scaleSteps, spellInKey, tonicPitchClass } from "../music/keyName";
import { glyphs } from "../music/pitch";

/** A note of a scale. */
export interface Degree {
  /** 1 (home) to 7 */
  number: number;
  /** ASCII */
  note: string;
  /** above the home note, 0 to 11 */
  semitones: number;
}

/**
 * The seven notes of a key with their numbers.
 *
 * @param key tonic and mode
 * @returns from the home note up
 * @throws RangeError if the tonic is no note name
 * @example degreesOf({ tonic: "D", mode: "major" })[2].note // => "F#"
 */
export function degreesOf(key: KeyName): Degree[] {
  const home = tonicPitchClass(key.tonic);
  return scaleSteps(key.mode).map((semitones, k) => ({
    number: k + 1,
    note: spellInKey((home + semitones) % 12, key),
    semitones,
  }));
}

/**
 * A degree as one says it.
 *
 * @param number 1 to 7
 * @returns such as "4th"
 * @example degreeWord(2) // => "2nd"
 */
export function degreeWord(number: number): string {
  return `${number}${["th", "st", "nd", "rd"][number] ?? "th"}`;
}

/**
 * A roman or plain number with its signs as glyphs.
 *
 * @param number such as "bVII", "#iv°", "V7/ii"
 * @returns the same with ♭ and ♯
 * @example numberGlyphs("bVII/4") // => "♭VII/4"
 */
export function numberGlyphs(number: string): string {
  const signed = (sign: string) => sign.replaceAll("#", "♯").replaceAll("b", "♭");
  return glyphs(number).replace(
    /(^|\/)([#b]+)(?=[IViv\d])/g,
    (_, before: string, sign: string) => before + signed(sign),
  );
}
