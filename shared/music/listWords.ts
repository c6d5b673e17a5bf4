const formats = {
  and: new Intl.ListFormat("en-GB", { type: "conjunction" }),
  or: new Intl.ListFormat("en-GB", { type: "disjunction" }),
};

/**
 * Several things in a sentence.
 *
 * @param items as they are to be read
 * @param word between the last two
 * @returns such as "D, G and A"; the only item by itself; "" where there is none
 * @example listWords(["D", "G", "A"]) // => "D, G and A"
 */
export function listWords(items: readonly string[], word: keyof typeof formats = "and"): string {
  return formats[word].format(items);
}
