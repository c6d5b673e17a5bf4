/** A place where a syllable may stand: a note or chord of a line of music, with the number of its bar. */
export interface WordPlace {
  bar: number;
  /** syllables of the verses in turn; null where a verse is silent or holds the syllable before */
  verses: (WordSyllable | null)[];
}
/** A syllable as it stands in a w: line. */
interface WordSyllable {
  text: string;
  newLine: boolean;
}

/** Where a w: line left off, so that the next may go on. */
export interface WordCursor {
  place: number;
  bar: number;
  begun: boolean;
}

const marks: Record<string, string> = {
  "`": "\u0300",
  "'": "\u0301",
  "^": "\u0302",
  "~": "\u0303",
  '"': "\u0308",
  ",": "\u0327",
};

/**
 * Lays the syllables of a w: line under notes.
 *
 * @param text what stands behind w:, without comment
 * @param places the notes of the line of music above
 * @param verse which verse this is, 0 for the first
 * @param cursor where to begin; is moved on
 * @see ABC music standard 2.1, section 5
 */
export function layWords(text: string, places: readonly WordPlace[], verse: number, cursor: WordCursor): void {
  const token = /(\s+)|([|*_])|(-)|((?:\\-|\\(?!-)|[^\s|*_\\-])+)(-?)/gy;
  const put = (syllable: WordSyllable | null) => {
    const place = places[cursor.place];
    if (!place) return;
    while (place.verses.length < verse) place.verses.push(null);
    place.verses[verse] = syllable;
    cursor.place += 1;
    cursor.bar = place.bar;
  };
  for (const [, space, sign, hyphen, word, joined] of text.matchAll(token)) {
    if (space !== undefined) continue;
    if (sign === "|") {
      cursor.bar += 1;
      while (places[cursor.place] && places[cursor.place]!.bar < cursor.bar) cursor.place += 1;
    } else if (sign !== undefined || hyphen !== undefined) put(null);
    else {
      put({ text: `${plainWord(word!)}${joined!}`, newLine: !cursor.begun });
      cursor.begun = true;
    }
  }
}

/**
 * A word of ABC notation as it is read: spaces, hyphens and accented letters written out.
 *
 * @param word the word with its escapes
 * @returns plain text
 * @see ABC music standard 2.1, sections 5.1 and 8.2
 * @example plainWord("see~how") // => "see how"
 */
export function plainWord(word: string): string {
  return word
    .replace(/\\u([0-9a-fA-F]{4})/g, (_, code: string) => String.fromCharCode(parseInt(code, 16)))
    .replace(/\\([`'^~",])([A-Za-z])/g, (_, mark: string, letter: string) =>
      `${letter}${marks[mark]!}`.normalize("NFC"),
    )
    .replace(/\\-/g, "-")
    .replace(/~/g, " ")
    .trim();
}
