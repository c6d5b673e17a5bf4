import { emptyDraft, type SongDraft } from "../editor/songDraft";
import type { SongFile } from "./readSongFile";

/** What a file fills in beside the melody. */
export type Filled = Partial<Pick<SongDraft, "title" | "tempo" | "beatsPerBar">>;

/**
 * What a file tells beside its melody, for fields in which nobody typed: they are empty, or hold what the file before it
 * had filled in.
 */
export function takenFromFile(
  draft: SongDraft,
  file: Extract<SongFile, { ok: true }>,
  before: Filled = {},
): { change: Filled; words: string | null } {
  const told: Filled = {
    ...(file.title === null ? null : { title: file.title.slice(0, 200) }),
    ...(file.tempo === null ? null : { tempo: String(Math.round(file.tempo)) }),
    ...(file.beatsPerBar === null ? null : { beatsPerBar: String(file.beatsPerBar) }),
  };
  const change: Filled = {};
  for (const field of ["title", "tempo", "beatsPerBar"] as const) {
    const free = ["", emptyDraft[field], before[field]].includes(draft[field].trim());
    const value = told[field] ?? (before[field] === undefined ? undefined : emptyDraft[field]);
    if (free && value !== undefined) change[field] = value;
  }
  const words = [
    ...(told.title !== undefined && change.title !== undefined ? ["the title"] : []),
    ...(told.tempo !== undefined && change.tempo !== undefined ? [`${told.tempo} quarter notes a minute`] : []),
    ...(told.beatsPerBar !== undefined && change.beatsPerBar !== undefined
      ? [`${told.beatsPerBar} beats in a bar`]
      : []),
  ];
  return { change, words: words.length === 0 ? null : `Also taken from the file: ${words.join(", ")}.` };
}
