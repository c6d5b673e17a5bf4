import { parseChart } from "./chart";

const alone: Readonly<Record<string, string>> = {
  ß: "ss",
  æ: "ae",
  œ: "oe",
  ø: "o",
  ł: "l",
  đ: "d",
  ð: "d",
  þ: "th",
  ı: "i",
};

/**
 * Brings text into the form in which it is searched and sorted: small letters without accents, no apostrophes,
 * a blank for every other sign.
 *
 * @param text any text
 * @returns words of letters and digits, one blank between them
 * @see https://unicode.org/reports/tr15/ for compatibility decomposition
 * @example foldText("L’Étoile, half-past Nine") // => "letoile half past nine"
 */
export function foldText(text: string): string {
  return text
    .normalize("NFKD")
    .toLowerCase()
    .replace(/[\p{M}'’‘ʼ`´]/gu, "")
    .replace(/[ßæœøłđðþı]/g, (letter) => alone[letter] ?? letter)
    .replace(/[^\p{L}\p{N}]+/gu, " ")
    .trim();
}

/**
 * The words of a search.
 *
 * @param query as typed
 * @returns each word once, folded
 * @example searchWords("Étoile  du étoile") // => ["etoile", "du"]
 */
export function searchWords(query: string): string[] {
  return [...new Set(foldText(query).split(" "))].filter((word) => word !== "");
}

/**
 * All of a song that a search looks through, folded: title, tags and the words of its chart.
 *
 * @param song any song
 * @returns one text; a word of a search is looked for anywhere in it
 * @example searchText({ title: "Gulls", tags: ["Waltz"], chart: "D  A\nlow water" }) // => "gulls\nwaltz\nlow water"
 */
export function searchText(song: { title: string; tags: readonly string[]; chart: string }): string {
  return [foldText(song.title), ...song.tags.map(foldText), foldText(lyricLines(song.chart).join("\n"))].join("\n");
}

/**
 * How the words of a chart begin.
 *
 * @param chart chords over words
 * @returns its first sung line, one blank between words, at most 80 characters; "" without words
 * @example firstWords("Verse\nD  A\nlow   water") // => "low water"
 */
export function firstWords(chart: string): string {
  const line = lyricLines(chart)[0]?.trim().replace(/\s+/gu, " ") ?? "";
  if (line.length <= 80) return line;
  const cut = line.slice(0, 79);
  const end = cut.lastIndexOf(" ");
  // Never half of a character that takes two units.
  return `${(end > 40 ? cut.slice(0, end) : cut).replace(/[\uD800-\uDBFF]$/, "")}…`;
}

function lyricLines(chart: string): string[] {
  return parseChart(chart)
    .sections.flatMap((section) => section.lines)
    .flatMap((line) => ("lyrics" in line ? [line.lyrics] : []))
    .filter((line) => /[\p{L}\p{N}]/u.test(line));
}
