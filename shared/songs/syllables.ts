/** Consonants that are written with several letters and sung as one. */
const single = /^(?:sch|ch|sh|th|ph|gh|ck|wh|qu|ng|nk|tch|dge|[bcdfgkpt][rl]|s[ptkl]|st[rl]?)$/;
const vowel = /[aeiouyäöüœæø]/;

/**
 * Places in a line of words where a syllable is likely to begin, by the rules of spelling alone: a consonant between
 * two vowels opens the next syllable, of several the last one does. Good enough to point at; words of scripts without
 * these vowels count as one syllable.
 *
 * @param words a line of words
 * @returns columns in ascending order, the start of each word among them
 * @example syllableStarts("Lantern on the slipway") // => [0, 3, 8, 11, 15, 19]
 */
export function syllableStarts(words: string): number[] {
  return [...words.matchAll(/\S+/g)].flatMap((match) => inWord(match[0]).map((start) => match.index + start));
}

function inWord(word: string): number[] {
  const letters = [...word].map((letter) => letter.normalize("NFD").charAt(0).toLowerCase());
  // A character outside the basic plane takes two places: such a word is left whole.
  if (letters.length !== word.length) return [0];
  const starts = [0];
  const groups = vowelGroups(letters);
  for (let index = 1; index < groups.length; index += 1) {
    const from = groups[index - 1]!.end;
    const to = groups[index]!.start;
    const between = letters.slice(from, to).join("");
    const broken = /[^\p{L}]/u.exec(between);
    if (broken) {
      const behind = /[^\p{L}](?=\p{L}*$)/u.exec(between)!.index + 1;
      starts.push(/['’]/.test(between[behind - 1]!) ? to : from + behind);
    } else if (between.length <= 1) starts.push(to - between.length);
    else {
      const opens = [3, 2].find((length) => single.test(between.slice(-length)) && between.length >= length) ?? 1;
      starts.push(to - (opens === between.length && /^(?:ck|ng|nk|x)$/.test(between) ? 0 : opens));
    }
  }
  return [...new Set(starts)].sort((a, b) => a - b);
}

/** Stretches of vowels that are sung; a silent e at the end is none. */
function vowelGroups(letters: readonly string[]): { start: number; end: number }[] {
  const groups: { start: number; end: number }[] = [];
  letters.forEach((letter, index) => {
    const last = groups.at(-1);
    const glide = letter === "y" && vowel.test(letters[index + 1] ?? "");
    const afterQ = letter === "u" && letters[index - 1] === "q";
    if (!vowel.test(letter) || glide || afterQ) return;
    if (last?.end === index) last.end = index + 1;
    else groups.push({ start: index, end: index + 1 });
  });
  if (groups.length < 2) return groups;
  const end = letters.join("").search(/[^\p{L}]*$/u);
  const final = groups.at(-1)!;
  const stem = letters.slice(0, end).join("");
  const silent =
    (final.start === end - 1 && letters[final.start] === "e" && !/[bcdfgkpt]le$/.test(stem)) ||
    (/(?:[^td]ed|[^csxzhg]es)$/.test(stem) &&
      final.start === end - 2 &&
      letters[final.start] === "e" &&
      final.end === end - 1);
  return silent ? groups.slice(0, -1) : groups;
}
