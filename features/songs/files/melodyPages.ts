import { glyphs, noteName } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";

/** Notes of one page of the picture, with their places in the tune. */
export interface MelodyPage {
  /** quarter notes from the beginning */
  from: number;
  to: number;
  notes: { note: MelodyNote; index: number }[];
}

/** A tune cut into pages of equal time, so that a long one stays readable and quick to draw. */
export function melodyPages(notes: readonly MelodyNote[], beats: number): MelodyPage[] {
  const pages: MelodyPage[] = [];
  const end = notes.reduce((latest, note) => Math.max(latest, note.start + note.duration), 0);
  for (let from = 0; from < end; from += beats) pages.push({ from, to: from + beats, notes: [] });
  notes.forEach((note, index) => pages[Math.floor((note.start + 1e-6) / beats)]?.notes.push({ note, index }));
  return pages.filter((page) => page.notes.length > 0);
}

/** The syllables of a page in up to two rows, left out where there is no room for them. */
export function placedWords(
  page: MelodyPage,
  x: (beat: number) => number,
  letter: number,
): { x: number; row: 0 | 1; text: string }[] {
  const ends: [number, number] = [-Infinity, -Infinity];
  return page.notes.flatMap(({ note }) => {
    if (note.lyric === undefined) return [];
    const at = x(note.start);
    const row = at >= ends[0] ? 0 : at >= ends[1] ? 1 : null;
    if (row === null) return [];
    ends[row] = at + note.lyric.length * letter + 5;
    return [{ x: at, row, text: note.lyric }];
  });
}

/** What the picture shows, in words: each note with its syllable. */
export function pageWords(page: MelodyPage, number: number, of: number): string {
  const notes = page.notes.map(({ note }) => {
    const name = glyphs(noteName(Math.round(note.midi)));
    return note.lyric === undefined ? name : `${name} ${note.lyric}`;
  });
  const place = of > 1 ? `Part ${number} of ${of} of the tune` : "The tune";
  return `${place}, ${notes.length} ${notes.length === 1 ? "note" : "notes"}: ${notes.join(", ")}.`;
}
