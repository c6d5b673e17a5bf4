import { sungIn, type SungSpan } from "@/features/span/sungSpan";
import type { SongListing } from "@/shared/contract/songListing";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { type KeyName, tonicPitchClass } from "@/shared/music/keyName";
import { keySign } from "@/shared/music/keyWords";
import { glyphs, noteName } from "@/shared/music/pitch";

/** What the shelf shows of the key that was decided for a song. */
export interface ShelfKey {
  key: KeyName;
  /** semitones from the tune as written */
  shift: number;
  /** such as "My key since 3 March, a whole tone under the chart" */
  words: string;
  /** decided with another voice than the present one: the span is shown as written */
  elsewhere: boolean;
}

/** The key a list shows first: the one decided, else the written one, else the tune's home note. */
export function shownKey(song: SongListing, mine: ShelfKey | null): KeyName | null {
  if (mine) return mine.key;
  return song.writtenKey ?? (song.span ? { tonic: song.span.home, mode: "major" } : null);
}

/** Where the tune lies: in the key decided with this voice, else as written. */
export function sungSpan(song: SongListing, mine: ShelfKey | null, voice: SingingVoice): SungSpan | null {
  if (!song.span) return null;
  const shift = mine && !mine.elsewhere ? mine.shift : 0;
  const low = Math.round(song.span.lowMidi) + shift;
  const high = Math.round(song.span.highMidi) + shift;
  return sungIn(low, high, voice);
}

/** The picture in words. */
export function spanWords(span: SungSpan, key: KeyName | null): string {
  const spelling = key && (key.tonic.includes("b") || key.tonic === "F") ? "flats" : "common";
  const name = (midi: number) => glyphs(noteName(midi, spelling));
  const ends = `${name(span.low)} to ${name(span.high)}`;
  if (span.below && span.above) return `${ends}, leaves your range at both ends`;
  if (span.above) return `${ends}, goes above your range`;
  if (span.below) return `${ends}, goes below your range`;
  return span.comfortable ? `${ends}, all of it comfortable` : `${ends}, within your reach`;
}

/** What a row says under its title besides the decided key; with one it is no longer only there to be tried. */
export function listingWords(song: SongListing, mine: ShelfKey | null = null): string {
  const sign = song.writtenKey ? glyphs(keySign(song.writtenKey)) : null;
  const key = sign !== null ? `Written in ${sign}` : song.span ? `Home note ${glyphs(song.span.home)}` : "No key yet";
  const parts = [
    key,
    song.demo === null || mine ? null : "a song to try Larkspan with",
    song.span === null ? "no melody yet" : null,
  ];
  return `${parts.filter((part) => part !== null).join(", ")}.`;
}

/** A day as one says it of something that was played: today, yesterday, or its date. */
export function playedWords(playedAt: string | null, now: Date): string {
  if (playedAt === null) return "";
  const then = new Date(playedAt);
  const midnight = (date: Date) => new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime();
  const days = Math.round((midnight(now) - midnight(then)) / 86_400_000);
  if (days <= 0) return "today";
  if (days === 1) return "yesterday";
  const year = then.getFullYear() === now.getFullYear() ? null : ({ year: "numeric" } as const);
  return new Intl.DateTimeFormat("en-GB", { day: "numeric", month: "short", ...year }).format(then);
}

/** By key: from A upwards, major before other modes; songs without a key stand last. Songs that are equal keep their order. */
export function inKeyOrder(songs: readonly SongListing[], keyOf: (song: SongListing) => KeyName | null): SongListing[] {
  const place = (song: SongListing) => {
    const key = keyOf(song);
    if (!key) return 1000;
    return ((tonicPitchClass(key.tonic) + 3) % 12) * 10 + modeOrder.indexOf(key.mode);
  };
  return sortedBy(songs, place);
}

const modeOrder: readonly KeyName["mode"][] = [
  "major",
  "minor",
  "dorian",
  "phrygian",
  "lydian",
  "mixolydian",
  "locrian",
];

/** The best fit first; songs without a tune stand last. */
export function inFitOrder(songs: readonly SongListing[], fitOf: (song: SongListing) => number | null): SongListing[] {
  return sortedBy(songs, (song) => -(fitOf(song) ?? -1));
}

function sortedBy(songs: readonly SongListing[], place: (song: SongListing) => number): SongListing[] {
  return songs
    .map((song, index) => ({ song, index, place: place(song) }))
    .sort((a, b) => a.place - b.place || a.index - b.index)
    .map(({ song }) => song);
}
