import type { Song } from "@/shared/contract/song";
import { tonicPitchClass, type KeyName } from "@/shared/music/keyName";
import { glyphs, noteName, parseNoteName } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";
import { moveToHomeNote } from "@/shared/songs/sungMelody";

/** A tune read from a file, as the form keeps it. */
export interface DraftMelody {
  /** file name, and the voice's name where there were several */
  source: string;
  notes: MelodyNote[];
}

/** What stands in the form: texts as typed, so that nothing typed is ever lost. */
export interface SongDraft {
  title: string;
  chart: string;
  /** chosen by hand; null = as found */
  key: KeyName | null;
  tune: "none" | "span" | "melody";
  low: string;
  high: string;
  /** home note of the tune; "" = that of the chart */
  home: string;
  melody: DraftMelody | null;
  beatsPerBar: string;
  tempo: string;
}

export type DraftErrors = Partial<Record<keyof SongDraft, string>>;

/** The parts of a song that no form field holds. */
export type SongOrigin = Pick<Song, "id" | "demo" | "tags" | "archivedAt" | "playedAt" | "createdAt" | "revision">;

/** The beginning of a song that was never kept. */
export function newOrigin(id: string, createdAt: string): SongOrigin {
  return { id, demo: null, tags: [], archivedAt: null, playedAt: null, createdAt, revision: 0 };
}

export const emptyDraft: SongDraft = {
  title: "",
  chart: "",
  key: null,
  tune: "none",
  low: "",
  high: "",
  home: "",
  melody: null,
  beatsPerBar: "4",
  tempo: "",
};

/** The form of a song that is on the shelf. */
export function draftOf(song: Song): SongDraft {
  const { tune } = song;
  return {
    title: song.title,
    chart: song.chart,
    key: song.writtenKey,
    tune: tune?.kind ?? "none",
    low: tune?.kind === "span" ? glyphs(noteName(tune.lowMidi, spellingOf(tune.home))) : "",
    high: tune?.kind === "span" ? glyphs(noteName(tune.highMidi, spellingOf(tune.home))) : "",
    home: tune?.home ?? "",
    melody: tune?.kind === "melody" ? { source: "the melody kept with this song", notes: tune.notes } : null,
    beatsPerBar: song.beatsPerBar === null ? "" : String(song.beatsPerBar),
    tempo: song.tempo === null ? "" : String(song.tempo),
  };
}

/** Which accidentals go with a tonic. */
function spellingOf(tonic: string): "sharps" | "flats" {
  return tonic.includes("b") || tonic === "F" ? "flats" : "sharps";
}

/** What the form says is wrong, field by field; an empty object when the song can be kept. */
export function draftErrors(draft: SongDraft, found: KeyName | null): DraftErrors {
  const errors: DraftErrors = {};
  if (draft.title.trim() === "") errors.title = "Give the song a title.";
  if (draft.title.trim().length > 200) errors.title = "A title may have at most 200 characters.";
  if (draft.chart.length > 100_000) errors.chart = "A chart may have at most 100,000 characters.";
  const beats = readNumber(draft.beatsPerBar);
  if (beats !== null && !(Number.isInteger(beats) && beats >= 1 && beats <= 16))
    errors.beatsPerBar = "Give 1 to 16 beats, or leave it empty.";
  const tempo = readNumber(draft.tempo);
  if (tempo !== null && !(tempo >= 20 && tempo <= 400))
    errors.tempo = "Give 20 to 400 beats a minute, or leave it empty.";
  if (draft.tune === "span") checkSpan(draft, errors);
  if (draft.tune === "melody" && draft.melody === null)
    errors.melody = "Choose a melody file, or set the lowest and highest note by hand.";
  if (draft.tune !== "none" && errors.melody === undefined && draft.home === "" && (draft.key ?? found) === null)
    errors.home = "Choose the home note of the tune.";
  return errors;
}

function checkSpan(draft: SongDraft, errors: DraftErrors): void {
  const low = readNote(draft.low);
  const high = readNote(draft.high);
  if (low === null) errors.low = "Write the lowest note with its octave, like G3.";
  if (high === null) errors.high = "Write the highest note with its octave, like A4.";
  if (low !== null && high !== null && low > high) errors.low = "The lowest note must not be above the highest.";
}

/**
 * The song that the form describes. A tune whose home note is not the chart's is moved to it, so that both sound in one key.
 * Throws RangeError for a draft that has errors.
 */
export function songFromDraft(draft: SongDraft, found: KeyName | null, origin: SongOrigin): Song {
  const [problem] = Object.values(draftErrors(draft, found));
  if (problem) throw new RangeError(problem);
  const writtenKey = draft.key ?? found;
  return {
    ...origin,
    title: draft.title.trim(),
    chart: draft.chart,
    writtenKey,
    tune: tuneFromDraft(draft, writtenKey),
    beatsPerBar: readNumber(draft.beatsPerBar),
    tempo: readNumber(draft.tempo),
  };
}

function tuneFromDraft(draft: SongDraft, key: KeyName | null): Song["tune"] {
  const given = draft.home || key?.tonic;
  if (draft.tune === "none" || given === undefined) return null;
  const home = key?.tonic ?? given;
  const move = moveToHomeNote(tonicPitchClass(given), tonicPitchClass(home));
  if (draft.tune === "melody")
    return {
      kind: "melody",
      home,
      notes: (draft.melody?.notes ?? []).map((note) => ({ ...note, midi: note.midi + move })),
    };
  return {
    kind: "span",
    home,
    lowMidi: (readNote(draft.low) ?? 0) + move,
    highMidi: (readNote(draft.high) ?? 0) + move,
  };
}

function readNote(text: string): number | null {
  const midi = parseNoteName(text);
  return midi !== null && midi >= 0 && midi <= 127 ? midi : null;
}

/** null for an empty field; a number that fits no field for anything unreadable. */
function readNumber(text: string): number | null {
  const trimmed = text.trim().replace(",", ".");
  if (trimmed === "") return null;
  return /^\d+(\.\d+)?$/.test(trimmed) ? Number(trimmed) : -1;
}
