import { type KeyName, type Mode, keyFifths } from "../music/keyName";

/** What a K: or V: field of ABC notation says about how notes sound. */
export interface AbcKey {
  /** null where the field names no key */
  key: KeyName | null;
  /** semitones that the signature adds to each letter, C to B by letter; null where the field leaves it as it was */
  signature: Record<string, number> | null;
  clef: AbcClef;
}

/** How a clef and its modifiers move what is written; undefined where the field is silent. */
export interface AbcClef {
  octaves?: number;
  /** octaves of the little 8 at the clef */
  clefOctaves?: number;
  semitones?: number;
  percussion?: boolean;
  name?: string;
}

const sharps = "FCGDAEB";
const modes: [RegExp, Mode][] = [
  [/^(?:maj|ion)/i, "major"],
  [/^(?:min|aeo|m(?![a-z]))/i, "minor"],
  [/^mix/i, "mixolydian"],
  [/^dor/i, "dorian"],
  [/^phr/i, "phrygian"],
  [/^lyd/i, "lydian"],
  [/^loc/i, "locrian"],
];
const clefs = /(?:^|[\s=])(treble|alto|tenor|bass|baritone|soprano|mezzo|perc|none|[GCFP])\d?([+^_-]8)?(?=\s|$)/i;
const accidentals: Record<string, number> = { "^^": 2, "^": 1, "=": 0, _: -1, __: -2 };

/**
 * Reads a key field: tonic and mode, or bagpipe key, explicit accidentals, clef, octave and transposition.
 *
 * @param text what stands behind K:
 * @returns the key, the signature's accidentals by letter, and what the clef changes
 * @see ABC music standard 2.1, sections 3.1.14 and 4.6
 * @example readAbcKey("D phr ^F").signature // => { F: 1, E: -1, B: -1 }
 */
export function readAbcKey(text: string): AbcKey {
  const clef = readAbcClef(text);
  const plain = text.replace(
    /\b(?:clef|octave|transpose|middle|m|t|stafflines|name|nm|stem)\s*=\s*(?:"[^"]*"|\S+)/gi,
    " ",
  );
  if (/^\s*(?:HP|Hp)\b/.test(plain))
    return { key: { tonic: "A", mode: "mixolydian" }, signature: { F: 1, C: 1 }, clef };
  const tonic = /^\s*([A-G])([#b]?)\s*(.*)$/.exec(plain);
  const none = /^\s*(?:none\b|$)/i.test(text);
  if (!tonic && !none && !/[\^_=]{1,2}[A-Ga-g]|\bexp\b/.test(plain)) return { key: null, signature: null, clef };
  const mode = modes.find(([sign]) => sign.test(tonic?.[3] ?? ""))?.[1] ?? "major";
  const key = tonic ? { tonic: `${tonic[1]!}${tonic[2]!}`, mode } : null;
  const signature: Record<string, number> = {};
  if (key && !/\bexp\b/.test(plain)) {
    const fifths = keyFifths(key);
    for (let place = 0; place < Math.min(7, Math.abs(fifths)); place += 1)
      signature[fifths > 0 ? sharps[place]! : sharps[6 - place]!] = Math.sign(fifths);
  }
  let own = false;
  for (const [, sign, letter] of plain.matchAll(/(\^\^|\^|__|_|=)([A-Ga-g])/g)) {
    signature[letter!.toUpperCase()] = accidentals[sign!]!;
    own = true;
  }
  return { key: own && key && /\bexp\b/.test(plain) ? null : key, signature, clef };
}

/**
 * Reads what a K: or V: field says about the clef.
 *
 * @param text what stands behind K:, or behind the name of the voice
 * @returns octaves and semitones that the written notes are moved by, as far as the field says so
 * @see ABC music standard 2.1, section 4.6
 * @example readAbcClef("treble-8 octave=1").clefOctaves // => -1
 */
export function readAbcClef(text: string): AbcClef {
  const clef: AbcClef = {};
  const name = /\b(?:name|nm)\s*=\s*(?:"([^"]*)"|(\S+))/i.exec(text);
  if (name) clef.name = (name[1] ?? name[2] ?? "").replace(/\\n/g, " ").trim();
  const plain = text.replace(/"[^"]*"/g, " ");
  const octave = /\boctave\s*=\s*([+-]?\d)\b/i.exec(plain);
  if (octave) clef.octaves = Number(octave[1]);
  const moved = /\b(?:transpose|t)\s*=\s*([+-]?\d{1,2})\b/i.exec(plain);
  if (moved) clef.semitones = Number(moved[1]);
  const sign = clefs.exec(
    plain.replace(/\b(?:middle|m|stem|name|nm|staffscale)\s*=\s*\S+/gi, " ").replace(/^\s*[A-G][#b]?(?=\s|$|m)/, " "),
  );
  if (sign) {
    clef.clefOctaves = sign[2] === undefined ? 0 : /[+^]/.test(sign[2]) ? 1 : -1;
    clef.percussion = /^p/i.test(sign[1]!);
  }
  return clef;
}
