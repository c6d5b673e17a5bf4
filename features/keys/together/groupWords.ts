import type { Song } from "@/shared/contract/song";
import { keyFifths } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { listWords } from "@/shared/music/listWords";
import { glyphs, noteName } from "@/shared/music/pitch";
import { writtenKeyOf } from "../songKeys";
import type { GroupKey, GroupPart } from "./groupKey";

/** The octave that the others are told from: of the moves in use the one with nobody far off, then the one nearest to the chart. */
export function leadShift(shifts: readonly number[]): number {
  const furthest = (from: number) => Math.max(...shifts.map((shift) => Math.abs(shift - from)));
  const rank = (a: number, b: number) => furthest(a) - furthest(b) || Math.abs(a) - Math.abs(b) || b - a;
  return [...shifts].sort(rank)[0] ?? 0;
}

export function octaveOff(shift: number, lead: number): number {
  return Math.round((shift - lead) / 12);
}

/** What one singer does with the octave, to stand beside the name; null where it sings with the others. */
export function octaveNote(octaves: number): string | null {
  if (octaves === 0) return null;
  const size = Math.abs(octaves) === 1 ? "an octave" : `${Math.abs(octaves)} octaves`;
  return `${size} ${octaves < 0 ? "lower" : "higher"}`;
}

/** Up to this many singers are called by name. */
const namedUpTo = 4;

/** Who sings it in another octave: "Ben sings it an octave lower." Empty where all sing in one. */
export function octaveWords(parts: readonly Pick<GroupPart, "name" | "octaves">[]): string {
  const octaves = [...new Set(parts.map((part) => part.octaves))].filter((each) => each !== 0).sort((a, b) => b - a);
  return octaves
    .map((each) => {
      const who = parts.filter((part) => part.octaves === each).map(({ name }) => name);
      const subject = who.length <= namedUpTo ? listWords(who) : `${who.length} singers`;
      return `${subject} ${who.length === 1 ? "sings" : "sing"} it ${octaveNote(each)}.`;
    })
    .join(" ");
}

const ordinals = ["", "first", "second", "third", "fourth", "fifth", "sixth", "seventh", "eighth", "ninth", "tenth"];

/** How a key that was picked stands beside the fairest. */
export function placeWords(key: GroupKey, fairest: GroupKey): string {
  if (key.place === fairest.place) return "fairest key";
  return `${ordinals[key.place] ?? `${key.place}th`} of twelve; ${fairest.sign} is the fairest`;
}

/** What is said where no key holds the whole tune for everybody, with what to do; null where one does. */
export function noKeyForAll(keys: readonly GroupKey[]): string | null {
  const [first] = keys;
  if (!first || keys.some(({ beyond }) => !beyond)) return null;
  const out = first.parts.filter(({ fit }) => fit === "beyond");
  const names = out.length <= namedUpTo ? listWords(out.map(({ name }) => name)) : `${out.length} singers`;
  if (keys.every(({ parts }) => parts.every(({ fit }) => fit === "beyond")))
    return `In every key the tune leaves everybody’s range somewhere; ${first.sign} is the least unfair. Share the tune out: let each sing the lines that lie well, or choose another song.`;
  const one = out.length === 1;
  return `No key holds the whole tune for everybody. In ${first.sign}, the fairest, it leaves the range of ${names}: let ${one ? "that singer" : "them"} leave those notes out or take a second part.`;
}

const longestReason = 300;

/** The reason that goes with a decision: to whom it is fair, and who sings it in another octave. */
export function decisionReason(key: GroupKey): string {
  const names = key.parts.map(({ name }) => name);
  const who = names.length <= namedUpTo ? listWords(names) : `${names.length} singers`;
  const last = key.parts.filter(({ score }) => score === key.lowest).map(({ name }) => name);
  const lowest = `the lowest score is ${Math.round(key.lowest)} (${last.length <= 2 ? listWords(last) : `${last.length} singers`}), the average ${Math.round(key.mean)}`;
  const start = key.place === 1 ? `The fairest key for ${who}` : `Chosen for ${who}`;
  const reason = `${start}: ${lowest}. ${octaveWords(key.parts)}`.trim();
  return reason.length > longestReason ? `${reason.slice(0, longestReason - 1)}…` : reason;
}

/** The tune that all of them sing: "Written in G, tune D4 to E5" */
export function tuneWords(song: Pick<Song, "writtenKey" | "tune">): string {
  const written = writtenKeyOf(song);
  if (!written) return "No key yet";
  const key = `Written in ${glyphs(keySign(written))}`;
  if (!song.tune) return key;
  const { tune } = song;
  const midis = tune.kind === "span" ? [tune.lowMidi, tune.highMidi] : tune.notes.map(({ midi }) => midi);
  const name = (midi: number) => glyphs(noteName(midi, keyFifths(written) < 0 ? "flats" : "sharps"));
  const end = (of: (a: number, b: number) => number) => name(midis.reduce((a, b) => of(a, b)));
  return `${key}, tune ${end(Math.min)} to ${end(Math.max)}`;
}
