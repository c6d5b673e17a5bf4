import { keyFifths, type KeyName } from "@/shared/music/keyName";
import { keySign, movedKey } from "@/shared/music/keyWords";
import { glyphs, noteName } from "@/shared/music/pitch";
import { COARSE_WORDS } from "@/shared/keys/keyReason";
import type { SingingVoice } from "@/shared/keys/keyScore";
import type { SharedKey } from "@/shared/keys/sharedKey";
import type { SharedSinger } from "@/shared/keys/sharedSinger";
import type { Fit, GroupKey, GroupPart } from "./groupKey";
import { listWords } from "@/shared/music/listWords";
import { leadShift, octaveOff } from "./groupWords";
import { semitoneWords } from "@/shared/music/moveWords";

/** A singer that can be judged. */
export interface JudgedSinger {
  id: string;
  name: string;
  voice: SingingVoice;
}

/** What the engine says of the keys, joined with the singers; fairest first. */
export function groupKeys(
  shared: readonly SharedKey[],
  singers: readonly JudgedSinger[],
  written: KeyName,
): GroupKey[] {
  return shared.map((found, index) => {
    const lead = leadShift(found.singers.map(({ shift }) => shift));
    const key = movedKey(written, lead);
    const parts = found.singers.map((part, at) => partOf(part, singers[at]!, key, lead));
    const { worst: lowest, mean, beyond } = found;
    const sign = glyphs(keySign(key));
    const last = listWords(parts.filter(({ score }) => score === lowest).map(({ name }) => name));
    return {
      key,
      sign,
      place: index + 1,
      shift: lead,
      lowest,
      mean,
      beyond,
      reason: found.reason.replace(` ${COARSE_WORDS}`, ""),
      parts,
      spoken: `lowest score ${Math.round(lowest)}, ${last}; average ${Math.round(mean)}`,
    };
  });
}

function partOf(part: SharedSinger, { id, name, voice }: JudgedSinger, key: KeyName, lead: number): GroupPart {
  const { lowMidi, highMidi, marks, reserves } = part.key;
  const { above: over, below: under } = part.squeezed;
  const fit: Fit = part.beyond ? "beyond" : over > 0 || under > 0 ? "reach" : "comfort";
  const ends = { fit, over, under, above: Math.round(reserves.upper), below: Math.round(reserves.lower) };
  const spelling = keyFifths(key) < 0 ? "flats" : "sharps";
  return {
    id,
    name,
    voice,
    octaves: octaveOff(part.shift, lead),
    score: part.score,
    fit,
    over,
    under,
    lowMidi,
    highMidi,
    marks,
    words: squeezeWords(ends, glyphs(noteName(highMidi, spelling)), glyphs(noteName(lowMidi, spelling))),
    short: shortWords(ends),
  };
}

interface Ends {
  fit: Fit;
  over: number;
  under: number;
  /** what is left of the range; negative = beyond it */
  above: number;
  below: number;
}

function squeezeWords({ fit, over, under, above, below }: Ends, top: string, bottom: string): string {
  if (fit === "comfort") return `All of it in the comfort band, ${semitoneWords(above)} left above and ${below} below.`;
  const at = (past: number, left: number, note: string, where: "above" | "below", side: "over" | "under") => {
    if (past === 0) return [];
    if (left < 0) return [`${note} lies ${semitoneWords(-left)} ${where} the range`];
    const room = left === 0 ? "the last note of the range" : `${left} left ${where}`;
    return [`${note} lies ${semitoneWords(past)} ${side} the comfort band, ${room}`];
  };
  const said = [...at(over, above, top, "above", "over"), ...at(under, below, bottom, "below", "under")];
  return `${said.join("; ")}.`;
}

function shortWords({ fit, over, under, above, below }: Ends): string {
  if (fit === "comfort") return "comfortable";
  const at = (past: number, left: number, where: string, side: string) => {
    if (past === 0) return [];
    return [left < 0 ? `${-left} beyond ${where}` : `${past} ${side} comfort`];
  };
  return [...at(over, above, "above", "over"), ...at(under, below, "below", "under")].join(", ");
}

/** "fairest", "mean", or the id of a singer. */
export type GroupOrder = string;

/** The keys in the order asked for; of equal ones the fairer first. */
export function sortedKeys(keys: readonly GroupKey[], order: GroupOrder): GroupKey[] {
  const points = (key: GroupKey): number => {
    if (order === "mean") return key.mean;
    const part = key.parts.find(({ id }) => id === order);
    return part ? part.score : -key.place;
  };
  return [...keys].sort((a, b) => points(b) - points(a) || a.place - b.place);
}
