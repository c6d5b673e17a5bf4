import { readSongText, titleOfFile } from "@/shared/songs/songExport";
import type { SongDraft } from "./songDraft";

const untitled = titleOfFile("");

/**
 * What a whole song, pasted into an empty form, says about itself over its chart: its title, and key, beats and tempo
 * where a head names them. Null where there is none of that, or something stands in the form.
 */
export function pastedSong(draft: SongDraft, text: string): Partial<SongDraft> | null {
  const bare = draft.title.trim() === "" && draft.chart.trim() === "";
  // What is typed comes letter by letter; several lines at once are pasted.
  if (!bare || text.trim().split("\n").length < 3) return null;
  const { title, chart, writtenKey, beatsPerBar, tempo } = readSongText(text, "");
  if (title === untitled) return null;
  return {
    title,
    chart,
    ...(writtenKey ? { key: writtenKey } : null),
    ...(beatsPerBar === null ? null : { beatsPerBar: String(beatsPerBar) }),
    ...(tempo === null ? null : { tempo: String(tempo) }),
  };
}
