import type { MelodySyllable } from "./melodyVoice";

/** From this much silence between starts on, in quarter notes, the words go on in a new line, if the file tells no lines. */
const breath = 3;
const longest = 56;

/**
 * The words of a voice as lines of text: syllables joined to words, lines as the file tells them, else where the singer
 * breathes.
 *
 * @param syllables the voice's syllables in order
 * @returns lines without hyphens of syllables
 * @example lyricLines([{ start: 0, text: "har-" }, { start: 1, text: "bour" }, { start: 2, text: "light" }]) // => ["harbour light"]
 */
export function lyricLines(syllables: readonly MelodySyllable[]): string[] {
  const told = syllables.some((syllable, index) => index > 0 && syllable.newLine);
  const lines: string[] = [];
  let line = "";
  let open = false;
  let before = 0;
  for (const { start, text, newLine } of syllables) {
    const turn = told ? newLine === true : (start - before >= breath && line.length > 12) || line.length > longest;
    if (line !== "" && turn && !open) {
      lines.push(line);
      line = "";
    }
    line += open || line === "" ? text : ` ${text}`;
    open = line.endsWith("-");
    if (open) line = line.slice(0, -1);
    before = start;
  }
  return line === "" ? lines : [...lines, line];
}
