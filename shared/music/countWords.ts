const words = [
  "no",
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
  "thirteen",
  "fourteen",
  "fifteen",
  "sixteen",
  "seventeen",
  "eighteen",
  "nineteen",
  "twenty",
];

/**
 * How many, in a word where there is a short one.
 *
 * @param count whole, 0 or more
 * @param last the largest that is said in a word, at most 20
 * @returns such as "seven"; figures above `last`; "no" for none
 * @example countWord(7) // => "seven"
 * @example countWord(13) // => "13"
 */
export function countWord(count: number, last = 12): string {
  return (count <= last ? words[count] : undefined) ?? String(count);
}

/**
 * So many of something, in figures.
 *
 * @param count whole, 0 or more
 * @param one what one of them is called; more of them get an s
 * @returns such as "3 takes"
 * @example plural(1, "take") // => "1 take"
 */
export function plural(count: number, one: string): string {
  return `${count} ${one}${count === 1 ? "" : "s"}`;
}

/**
 * A sentence, or the beginning of one, with its first letter tall.
 *
 * @param sentence any text
 * @returns the same with a capital
 * @example capitalized("seven takes") // => "Seven takes"
 */
export function capitalized(sentence: string): string {
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}`;
}
