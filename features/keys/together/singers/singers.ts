import type { SingingVoice } from "@/shared/keys/keyScore";
import type { VoiceType } from "@/shared/keys/voiceTypes";
import { glyphs, noteName } from "@/shared/music/pitch";
import { wholeVoice } from "../../keyRows";

/** One of those who sing together, as it is remembered: where its notes come from, and how it is called here. */
export type Singer =
  /** a kept voice; `name` null = as the voice is called */
  | { id: string; kind: "voice"; voiceId: string; name: string | null }
  /** a plain voice that nobody has sung for */
  | { id: string; kind: "type"; type: string; name: string }
  | { id: string; kind: "hand"; name: string; notes: SingingVoice };

/** A kept voice; `singing` is null where nothing was sung with it yet. */
export interface OwnVoice {
  id: string;
  name: string;
  singing: SingingVoice | null;
}

/** A singer with its notes, as the page shows it. */
export interface KnownSinger {
  id: string;
  name: string;
  /** on whole semitones; null where it cannot be judged */
  voice: SingingVoice | null;
  /** where the notes come from, or why there are none */
  origin: string;
  /** what keeps it from being judged */
  lacks: "notes" | "voice" | null;
}

/** A class fits; the table stays one that can be read. */
export const mostSingers = 24;
export const longestName = 40;

/** Each singer with name and notes, in the order in which they were chosen. */
export function knownSingers(
  singers: readonly Singer[],
  own: readonly OwnVoice[],
  types: readonly VoiceType[],
): KnownSinger[] {
  return singers.map((singer) => {
    if (singer.kind === "hand") return known(singer.id, singer.name, singer.notes, "Typed");
    if (singer.kind === "type") {
      const type = types.find(({ id }) => id === singer.type);
      if (type) return known(singer.id, singer.name, type.voice, type.kind === "group" ? "Plain band" : "Table figure");
      return {
        id: singer.id,
        name: singer.name,
        voice: null,
        origin: "This figure is no longer offered",
        lacks: "voice",
      };
    }
    const kept = own.find(({ id }) => id === singer.voiceId);
    const name = singer.name ?? kept?.name ?? "A voice";
    if (!kept) return { id: singer.id, name, voice: null, origin: "This voice is no longer kept here", lacks: "voice" };
    if (!kept.singing) return { id: singer.id, name, voice: null, origin: "Nothing sung yet", lacks: "notes" };
    return known(singer.id, name, kept.singing, kept.singing.heard ? "Sung, reach estimated" : "Kept voice");
  });
}

function known(id: string, name: string, singing: SingingVoice, from: string): KnownSinger {
  const voice = wholeVoice(singing);
  return { id, name, voice, origin: `${from}, ${bandWords(voice.range)}`, lacks: null };
}

/** "E♭3 to D5" */
export function bandWords({ lowMidi, highMidi }: SingingVoice["range"]): string {
  return glyphs(`${noteName(lowMidi)} to ${noteName(highMidi)}`);
}

/** A name that nobody else has: "Soprano", then "Soprano 2". */
export function freeName(wanted: string, taken: readonly string[]): string {
  const base = wanted.trim().slice(0, longestName - 3);
  const isTaken = (name: string) => taken.some((other) => other.toLowerCase() === name.toLowerCase());
  if (!isTaken(base)) return base;
  let count = 2;
  while (isTaken(`${base} ${count}`)) count += 1;
  return `${base} ${count}`;
}

/** The singers kept on this device; what cannot be read is left out. */
export function readSingers(text: string | null): Singer[] {
  let kept: unknown;
  try {
    kept = JSON.parse(text ?? "[]");
  } catch {
    return [];
  }
  if (!Array.isArray(kept)) return [];
  const singers = kept.flatMap((each) => readSinger(each) ?? []);
  return singers.filter(({ id }, at) => singers.findIndex((other) => other.id === id) === at).slice(0, mostSingers);
}

function readSinger(kept: unknown): Singer | null {
  if (typeof kept !== "object" || kept === null) return null;
  const { id, kind, name, voiceId, type, notes } = kept as Record<string, unknown>;
  const named = typeof name === "string" && name.trim() !== "" ? name.slice(0, longestName) : null;
  if (typeof id !== "string" || id === "") return null;
  if (kind === "voice" && typeof voiceId === "string") return { id, kind, voiceId, name: named };
  if (named === null) return null;
  if (kind === "type" && typeof type === "string") return { id, kind, type, name: named };
  const read = kind === "hand" ? readNotes(notes) : null;
  return read && { id, kind: "hand", name: named, notes: read };
}

function readNotes(kept: unknown): SingingVoice | null {
  if (typeof kept !== "object" || kept === null) return null;
  const { range, comfort } = kept as Record<string, unknown>;
  const outer = readBand(range);
  const inner = readBand(comfort);
  if (!outer || !inner || inner.lowMidi < outer.lowMidi || inner.highMidi > outer.highMidi) return null;
  return { range: outer, comfort: inner };
}

function readBand(kept: unknown): SingingVoice["range"] | null {
  if (typeof kept !== "object" || kept === null) return null;
  const { lowMidi, highMidi } = kept as Record<string, unknown>;
  const isNote = (midi: unknown): midi is number => typeof midi === "number" && midi >= 12 && midi <= 108;
  return isNote(lowMidi) && isNote(highMidi) && lowMidi <= highMidi ? { lowMidi, highMidi } : null;
}

/** How a plain voice is called among the singers, so that sentences can speak of it as of one. */
export function calledAs({ name, kind }: Pick<VoiceType, "name" | "kind">): string {
  return kind === "group" ? name.replace(/ in unison$/, "’s unison") : name;
}

/** Where plain voices come from, a line for each source: "Soprano to Bass. Range: …" */
export function sourceLines(types: readonly VoiceType[]): string[] {
  return [...new Set(types.map(({ source }) => source))].map((source) => {
    const names = types.filter((type) => type.source === source).map(({ name }) => name);
    const who = names.length > 2 ? `${names[0]} to ${names[names.length - 1]}` : names.join(", ");
    return `${who}. ${source.charAt(0).toUpperCase()}${source.slice(1)}.`;
  });
}
