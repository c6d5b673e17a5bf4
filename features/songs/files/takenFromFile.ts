import { emptyDraft, type SongDraft } from "../editor/songDraft";
import type { SongFile } from "./readSongFile";

/** What a file tells beside its melody, for fields in which nothing was typed yet. */
export function takenFromFile(
  draft: SongDraft,
  file: Extract<SongFile, { ok: true }>,
): { change: Partial<SongDraft>; words: string | null } {
  const change: Partial<SongDraft> = {};
  const words: string[] = [];
  if (file.title !== null && draft.title.trim() === "") {
    change.title = file.title.slice(0, 200);
    words.push("the title");
  }
  if (file.tempo !== null && draft.tempo.trim() === "") {
    change.tempo = String(Math.round(file.tempo));
    words.push(`${change.tempo} quarter notes a minute`);
  }
  if (file.beatsPerBar !== null && ["", emptyDraft.beatsPerBar].includes(draft.beatsPerBar.trim())) {
    change.beatsPerBar = String(file.beatsPerBar);
    words.push(`${file.beatsPerBar} beats in a bar`);
  }
  return { change, words: words.length === 0 ? null : `Also taken from the file: ${words.join(", ")}.` };
}
