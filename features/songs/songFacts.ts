import type { Song } from "@/shared/contract/song";
import { keySign, keyWords } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";

/** What a list says of a song besides its title. */
export interface SongFacts {
  /** written key, short; null where none is known */
  sign: string | null;
  line: string;
}

export function songFacts(song: Song): SongFacts {
  const sign = song.writtenKey && glyphs(keySign(song.writtenKey));
  const key = sign === null ? "No key yet" : `Written in ${sign}`;
  const parts = [
    key,
    song.demo === null ? null : "a song to try Larkspan with",
    song.tune === null ? "no melody yet" : null,
  ];
  return { sign, line: `${parts.filter((part) => part !== null).join(", ")}.` };
}

/** Beat and tempo as the head of a chart says them: "4 beats, 84". */
export function beatWords(song: Pick<Song, "beatsPerBar" | "tempo">): string | null {
  const beats = song.beatsPerBar === null ? null : `${song.beatsPerBar} ${song.beatsPerBar === 1 ? "beat" : "beats"}`;
  const parts = [beats, song.tempo === null ? null : String(song.tempo)].filter((part) => part !== null);
  return parts.length === 0 ? null : parts.join(", ");
}

/** The line of facts under the title on a wide screen; `mine` is the decided key as one says it. */
export function headWords(song: Song, mine: string | null): string {
  const written = song.writtenKey && glyphs(keyWords(song.writtenKey));
  const key =
    written === null
      ? "No key yet"
      : mine === null
        ? `Written in ${written}`
        : `Your key ${mine}, written in ${written}`;
  const beats =
    song.beatsPerBar === null ? null : `${song.beatsPerBar} ${song.beatsPerBar === 1 ? "beat" : "beats"} in a bar`;
  const tempo = song.tempo === null ? null : `${song.tempo} a minute`;
  const beat = [beats, tempo].filter((part) => part !== null).join(", ");
  return beat === "" ? key : `${key} · ${beat}`;
}

/** Songs whose title or words hold every word searched for; titles first. */
export function songsNamed(songs: readonly Song[], search: string): Song[] {
  const words = plain(search)
    .split(/\s+/)
    .filter((word) => word !== "");
  const holds = (text: string) => words.every((word) => plain(text).includes(word));
  const titled = songs.filter((song) => holds(song.title));
  return [...titled, ...songs.filter((song) => !titled.includes(song) && holds(`${song.title}\n${song.chart}`))];
}

function plain(text: string): string {
  return text.normalize("NFD").replace(/\p{M}/gu, "").toLowerCase();
}
