import type { KeyScore, SingingVoice } from "../keys/keyScore";
import { keyFifths, type KeyName } from "../music/keyName";
import { glyphs, noteName } from "../music/pitch";
import type { SheetTune } from "./sheet";
import { semitoneWords } from "../music/moveWords";

/**
 * Where the tune lies in the voice, for the sheet.
 *
 * @param score a key as it was judged
 * @param voice on whole semitones
 * @param key how notes are spelled
 * @returns bands, marks and words
 * @throws RangeError if the key's tonic is no note name
 * @example sheetTune(
 *   { marks: [{ midi: 62, share: 1, zone: "comfort", home: true }], reserves: { upper: 9, lower: 9, tessituraShift: 0 }, reason: "All of it sits well." },
 *   { range: { lowMidi: 53, highMidi: 74 }, comfort: { lowMidi: 57, highMidi: 71 } },
 *   { tonic: "D", mode: "major" },
 * ).words // => "All of it sits well. 9 semitones of room above."
 */
export function sheetTune(
  { marks, reserves, reason }: Pick<KeyScore, "marks" | "reserves" | "reason">,
  { range, comfort }: SingingVoice,
  key: KeyName,
): SheetTune {
  const spelling = keyFifths(key) < 0 ? "flats" : "sharps";
  const name = (midi: number) => glyphs(noteName(Math.round(midi), spelling));
  const room = Math.round(reserves.upper);
  const above = room < 1 ? "" : ` ${semitoneWords(room)} of room above.`;
  return {
    range: { lowMidi: range.lowMidi, highMidi: range.highMidi },
    comfort: { lowMidi: comfort.lowMidi, highMidi: comfort.highMidi },
    comfortNames: { low: name(comfort.lowMidi), high: name(comfort.highMidi) },
    marks: marks.map(({ midi, share }) => ({ midi, share })),
    words: `${reason}${above}`,
  };
}
