import { keyWords } from "@/shared/music/keyWords";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { ContentName, SongContent } from "./mergeSongs";

export const fieldWords: Record<ContentName, string> = {
  title: "Title",
  chart: "Chart",
  writtenKey: "Written key",
  tune: "Melody",
  beatsPerBar: "Beats in a bar",
  tempo: "Beats a minute",
};

/** What stands in a field of a song, in words. */
export function valueWords(name: ContentName, song: SongContent): string {
  switch (name) {
    case "title":
      return song.title;
    case "chart":
      return song.chart;
    case "writtenKey":
      return song.writtenKey ? glyphs(keyWords(song.writtenKey)) : "not known";
    case "beatsPerBar":
      return song.beatsPerBar === null ? "empty" : String(song.beatsPerBar);
    case "tempo":
      return song.tempo === null ? "empty" : String(song.tempo);
    case "tune":
      return tuneWords(song.tune);
  }
}

function tuneWords(tune: SongContent["tune"]): string {
  if (tune === null) return "none";
  const home = `home note ${glyphs(tune.home)}`;
  if (tune.kind === "span") return `${glyphs(noteName(tune.lowMidi))} to ${glyphs(noteName(tune.highMidi))}, ${home}`;
  return `${tune.notes.length} ${tune.notes.length === 1 ? "note" : "notes"}, ${home}`;
}
