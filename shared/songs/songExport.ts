import { type KeyName, parseKeyName } from "../music/keyName";
import { keySign } from "../music/keyWords";
import { parseChart } from "./chart";

/** What a song written as plain text holds. */
export interface TextSong {
  title: string;
  /** chords over lyrics */
  chart: string;
  writtenKey: KeyName | null;
  beatsPerBar: number | null;
  /** beats a minute */
  tempo: number | null;
}

const longestTitle = 200;

/**
 * Writes a song as plain text: a head of its title, key, beats and tempo, a blank line, and its chart as it stands.
 *
 * @param song any song
 * @returns the text, ending with a line break; readSongText gives the song back
 * @example songText({ title: "Gulls", chart: "D  A\nlow water", writtenKey: { tonic: "D", mode: "major" }, beatsPerBar: 3, tempo: null }) // => "Title: Gulls\nKey: D\nTime: 3\n\nD  A\nlow water\n"
 */
export function songText(song: TextSong): string {
  const head = [
    `Title: ${oneLine(song.title)}`,
    ...(song.writtenKey ? [`Key: ${keySign(song.writtenKey)}`] : []),
    ...(song.beatsPerBar === null ? [] : [`Time: ${song.beatsPerBar}`]),
    ...(song.tempo === null ? [] : [`Tempo: ${song.tempo}`]),
  ];
  return `${head.join("\n")}\n\n${song.chart.replace(/\r\n?/g, "\n")}\n`;
}

/**
 * Reads a song from plain text. A head as songText writes it is understood and taken off; without one, a first line
 * that stands alone is the title; without that, the file's name is.
 *
 * @param text the text of a file
 * @param fileName its name, with or without extension
 * @returns the song; every line that was not understood as its head stays in the chart
 * @example readSongText("Slack Water\n\nD  A\nlow tide", "x.txt").title // => "Slack Water"
 */
export function readSongText(text: string, fileName: string): TextSong {
  const lines = text
    .replace(/^\uFEFF/, "")
    .replace(/\r\n?/g, "\n")
    .split("\n");
  const first = lines.findIndex((line) => line.trim() !== "");
  const empty = { title: titleOfFile(fileName), writtenKey: null, beatsPerBar: null, tempo: null };
  if (first === -1) return { ...empty, chart: "" };
  const titled = /^\s*title\s*:\s*(\S.*)$/i.exec(lines[first]!);
  if (titled) return readHead(titled[1]!, lines.slice(first + 1));
  if (standsAlone(lines, first)) {
    const rest = lines.slice(first + 1);
    // Many underline their titles.
    if (/^\s*(?:=+|-+|~+|_+)\s*$/.test(rest[0] ?? "")) rest.shift();
    return { ...empty, title: cut(lines[first]!.trim()), chart: body(rest) };
  }
  return { ...empty, chart: body(lines.slice(first)) };
}

/**
 * A title from the name of a file: without its folder and extension, with blanks for low lines.
 *
 * @param fileName name of a file
 * @returns a title, never empty
 * @example titleOfFile("old_net-new_net.txt") // => "old net-new net"
 */
export function titleOfFile(fileName: string): string {
  const bare = fileName
    .replace(/^.*[\\/]/, "")
    .replace(/\.[A-Za-z0-9]{1,9}$/, "")
    .replace(/[_\s]+/g, " ")
    .trim();
  return bare === "" ? "A song without a name" : cut(bare);
}

function readHead(title: string, lines: readonly string[]): TextSong {
  const song: TextSong = { title: cut(title.trim()), chart: "", writtenKey: null, beatsPerBar: null, tempo: null };
  let at = 0;
  for (; at < lines.length; at += 1) {
    const field = /^\s*(key|time|tempo)\s*:\s*(\S.*?)\s*$/i.exec(lines[at]!);
    if (!field || !take(song, field[1]!.toLowerCase(), field[2]!)) break;
  }
  return { ...song, chart: body(lines.slice(at)) };
}

function take(song: TextSong, name: string, value: string): boolean {
  if (name === "key") {
    const key = parseKeyName(value);
    if (key) song.writtenKey = key;
    return key !== null;
  }
  const number = /^(\d+(?:\.\d+)?)(?:\s*\/\s*\d+)?$/.exec(value);
  const read = number ? Number(number[1]) : NaN;
  if (name === "time" && Number.isInteger(read) && read >= 1 && read <= 16) song.beatsPerBar = read;
  else if (name === "tempo" && !value.includes("/") && read >= 20 && read <= 400) song.tempo = read;
  else return false;
  return true;
}

/** Words in the first line, then nothing, an underline or the heading of a part: a title. */
function standsAlone(lines: readonly string[], first: number): boolean {
  const line = lines[first]!;
  if (line.trim().length > 100) return false;
  const rest = lines.slice(first + 1);
  if (rest.every((each) => each.trim() === "")) return false;
  const [opening] = parseChart(line).sections;
  if (opening?.heading !== null || opening.lines[0]?.kind !== "lyrics") return false;
  const next = rest[0] ?? "";
  return /^\s*(?:=+|-+|~+|_+)?\s*$/.test(next) || (parseChart(next).sections[0]?.heading ?? null) !== null;
}

/** Without the one blank line after the head and the line break at the end. */
function body(lines: readonly string[]): string {
  const from = lines[0]?.trim() === "" ? 1 : 0;
  const to = lines.length > from && lines.at(-1) === "" ? -1 : undefined;
  return lines.slice(from, to).join("\n");
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, " ").trim();
}

function cut(title: string): string {
  return [...title].slice(0, longestTitle).join("");
}
