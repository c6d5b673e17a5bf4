import type { Song } from "@/shared/contract/song";
import { keyWords } from "@/shared/music/keyWords";
import { distanceWords, moveWords } from "@/shared/music/moveWords";
import { glyphs } from "@/shared/music/pitch";
import { chartChords, parseChart } from "@/shared/songs/chart";

function homeWords({ tune }: Pick<Song, "tune">): string {
  return tune ? `Home note ${glyphs(tune.home)}` : "No key yet";
}

/** Whether the song has chords that another key would change. */
export function hasChords({ chart }: Pick<Song, "chart">): boolean {
  return chartChords(parseChart(chart)).length > 0;
}

/** Where a key lies from the song as it is written; without a chart there is only its tune to go by. */
export function songMoveWords(song: Pick<Song, "chart">, semitones: number): string {
  if (song.chart.trim() !== "") return moveWords(semitones);
  return semitones === 0
    ? "as you gave the tune"
    : `${distanceWords(semitones)} ${semitones < 0 ? "under" : "over"} the tune as you gave it`;
}

/** Beat and tempo as the head of a chart says them: "4 beats, 84 a minute". */
export function beatWords(song: Pick<Song, "beatsPerBar" | "tempo">): string | null {
  const beats = song.beatsPerBar === null ? null : `${song.beatsPerBar} ${song.beatsPerBar === 1 ? "beat" : "beats"}`;
  const parts = [beats, song.tempo === null ? null : `${song.tempo} a minute`].filter((part) => part !== null);
  return parts.length === 0 ? null : parts.join(", ");
}

/** The line of facts under the title on a wide screen; `mine` is the decided key as one says it. */
export function headWords(song: Song, mine: string | null): string {
  const written = song.writtenKey && glyphs(keyWords(song.writtenKey));
  const key =
    written === null
      ? homeWords(song)
      : mine === null
        ? `Written in ${written}`
        : `Your key ${mine}, written in ${written}`;
  const beats =
    song.beatsPerBar === null ? null : `${song.beatsPerBar} ${song.beatsPerBar === 1 ? "beat" : "beats"} in a bar`;
  const tempo = song.tempo === null ? null : `${song.tempo} a minute`;
  const beat = [beats, tempo].filter((part) => part !== null).join(", ");
  return beat === "" ? key : `${key} · ${beat}`;
}
