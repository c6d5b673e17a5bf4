import { keyFifths, type Mode } from "../music/keyName";
import { keySign } from "../music/keyWords";
import { glyphs, noteName } from "../music/pitch";
import { percent } from "./keyReason";
import type { KeyScore } from "./keyScore";

/** What is needed of a key to say what it leaves out. */
export type LeavingKey = Pick<KeyScore, "tonic" | "marks" | "reserves" | "coarse" | "beyond">;

/**
 * Where no key holds the whole tune: the key that stands first, what it leaves out, and what an octave would mend.
 *
 * @param keys all keys, best first
 * @param mode of the song; decides the names of key and notes
 * @returns two plain sentences with glyphs; null where at least one key holds the tune
 * @throws RangeError if a tonic is no note name
 */
export function noKeyFits(keys: readonly LeavingKey[], mode: Mode = "major"): string | null {
  const [first] = keys;
  if (!first || keys.some(({ beyond }) => !beyond)) return null;
  const leastLeft = keys.every((key) => leftOut(first) <= leftOut(key) + 1e-9);
  const name = glyphs(keySign({ tonic: first.tonic, mode }));
  const spelling = keyFifths({ tonic: first.tonic, mode }) < 0 ? "flats" : "sharps";
  const low = first.marks[0]!.midi - first.reserves.lower;
  const high = first.marks[first.marks.length - 1]!.midi + first.reserves.upper;
  const above = first.marks.flatMap(({ midi }) => (midi > high ? [midi] : []));
  const below = first.marks.flatMap(({ midi }) => (midi < low ? [midi] : []));
  const notes = (midis: readonly number[]) => {
    const names = midis.map((midi) => glyphs(noteName(midi, spelling)));
    return names.length <= 2 ? names.join(" and ") : `${names[0]} to ${names[names.length - 1]}`;
  };
  const places = [
    ...(above.length > 0 ? [`${notes(above)} above your voice`] : []),
    ...(below.length > 0 ? [`${notes(below)} below ${above.length > 0 ? "it" : "your voice"}`] : []),
  ].join(", ");
  const share = first.coarse ? "" : `, ${percent(leftOut(first)).toLowerCase()} of the tune`;
  const opening = `No key holds the whole tune; ${name} ${leastLeft ? "leaves out least" : "comes nearest"}: ${places}${share}.`;
  return `${opening} ${octaveAdvice(above, below, low, high)}`;
}

function octaveAdvice(above: readonly number[], below: readonly number[], low: number, high: number): string {
  const moved = (midis: readonly number[], by: number) => midis.every((midi) => midi + by >= low && midi + by <= high);
  const down = above.length > 0 && moved(above, -12);
  const up = below.length > 0 && moved(below, 12);
  const them = above.length + below.length === 1 ? "that note" : "those notes";
  if (above.length > 0 && below.length > 0) {
    if (down && up) return "Sing the high ones an octave lower and the low ones an octave higher.";
    if (down) return "Sing the high ones an octave lower, and leave the low ones out.";
    if (up) return "Sing the low ones an octave higher, and leave the high ones out.";
  } else if (down || up) {
    return `Sing ${them} an octave ${down ? "lower" : "higher"}, or leave ${above.length + below.length === 1 ? "it" : "them"} out.`;
  }
  return "An octave higher or lower they do not fit either; let a second voice take them.";
}

function leftOut({ marks }: Pick<LeavingKey, "marks">): number {
  return marks.reduce((sum, { zone, share }) => (zone === "beyond" ? sum + share : sum), 0);
}
