import type { MelodyNote } from "@/shared/songs/melody";

/** From this much silence on, in quarter notes, the words go on in a new line. */
const breath = 1;
const longestLine = 48;

/** The words under a tune as lines of text: syllables joined, a new line where the singer breathes. */
export function melodyWords(notes: readonly MelodyNote[]): string {
  const lines: string[] = [];
  let line = "";
  let end = 0;
  for (const { start, duration, lyric } of notes) {
    const text = lyric?.trim() ?? "";
    const within = line.endsWith("-");
    if (line !== "" && !within && text !== "" && (start - end >= breath || line.length >= longestLine)) {
      lines.push(line);
      line = "";
    }
    if (text !== "") line = within ? line.slice(0, -1) + text : line === "" ? text : `${line} ${text}`;
    end = start + duration;
  }
  return [...lines, line.replace(/-$/, "")].filter((each) => each !== "").join("\n");
}
