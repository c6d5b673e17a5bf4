/** Bar line of ABC notation, taken apart. */
export interface AbcBar {
  /** the passage that ends here is played so many times; 1 where nothing is repeated */
  timesBefore: number;
  repeatAfter: boolean;
  /** a double or final bar line: where a repeat without beginning starts */
  section: boolean;
}

const mostTimes = 20;

/**
 * Takes a bar line apart.
 *
 * @param sign the bar line's characters, such as ":|" or "|]"
 * @returns what it says to a player
 * @see ABC music standard 2.1, section 4.8
 * @example readAbcBar("::") // => { timesBefore: 2, repeatAfter: true, section: true }
 */
export function readAbcBar(sign: string): AbcBar {
  const plain = sign.replace(/[.[\]]/g, "");
  const colons = /^:+$/.test(plain) ? plain.length : null;
  const before = colons === null ? /^:*/.exec(plain)![0].length : Math.ceil(colons / 2);
  const after = colons === null ? (/:+$/.exec(plain)?.[0].length ?? 0) : Math.floor(colons / 2);
  return {
    timesBefore: Math.min(mostTimes, before + 1),
    repeatAfter: after > 0,
    section: before > 0 || after > 0 || /\|\||\[\||\|\]/.test(sign),
  };
}

/**
 * Length that digits and slashes behind a note give it.
 *
 * @param text such as "3/2", "/", "//" or ""
 * @returns multiple of the unit length; NaN never: a length that is none (over 9999, or divided by nothing) is null
 * @see ABC music standard 2.1, section 4.3
 * @example readAbcLength("3/2") // => 1.5
 */
export function readAbcLength(text: string): number | null {
  const [, over = "", slashes = "", under = ""] = /^(\d*)(\/*)(\d*)$/.exec(text) ?? [];
  if (over.length > 4 || under.length > 4 || slashes.length > 8) return null;
  const divided = under === "" ? 2 ** slashes.length : Number(under);
  return divided === 0 ? null : (over === "" ? 1 : Number(over)) / divided;
}

/**
 * Numbers of an ending: "1", "1,3" or "1-3".
 *
 * @param text the numbers as written
 * @returns the numbers in order, at most twenty
 * @see ABC music standard 2.1, section 4.9
 * @example readAbcEnding("1-3") // => [1, 2, 3]
 */
export function readAbcEnding(text: string): number[] {
  const numbers = new Set<number>();
  for (const [, from, to] of text.matchAll(/(\d{1,2})(?:-(\d{1,2}))?/g))
    for (let n = Number(from); n <= Math.min(mostTimes, Number(to ?? from)); n += 1) numbers.add(n);
  return [...numbers].sort((a, b) => a - b);
}

/**
 * How many notes a tuplet puts into the time of how many.
 *
 * @param text p, p:q or p:q:r with empty places
 * @param compound whether the metre is compound (6/8, 9/8, 12/8)
 * @returns factor on the written lengths and the number of notes it holds for; null for a tuplet of nothing
 * @see ABC music standard 2.1, section 4.13
 * @example readAbcTuplet("3", false)?.left // => 3
 */
export function readAbcTuplet(text: string, compound: boolean): { factor: number; left: number } | null {
  const [p = "", q = "", r = ""] = text.split(":");
  const notes = Number(p);
  const usual: Record<number, number> = { 2: 3, 3: 2, 4: 3, 6: 2, 8: 3 };
  const time = q === "" ? (usual[notes] ?? (compound ? 3 : 2)) : Number(q);
  const left = r === "" ? notes : Number(r);
  return notes > 0 && time > 0 && left > 0 ? { factor: time / notes, left } : null;
}

/**
 * Order of the parts that P: gives in a tune's head.
 *
 * @param text such as "ABAC" or "(AB)3C"
 * @returns the parts' letters in playing order; null for more than 500
 * @see ABC music standard 2.1, section 3.1.9
 * @example abcPartOrder("(AB)2C") // => ["A", "B", "A", "B", "C"]
 */
export function abcPartOrder(text: string): string[] | null {
  const stack: string[][] = [[]];
  let last: string[] = [];
  for (const [token] of text.matchAll(/[A-Za-z]|\(|\)|\d{1,3}/g)) {
    const order = stack.at(-1)!;
    if (token === "(") {
      stack.push([]);
      continue;
    }
    if (/\d/.test(token)) {
      if (last.length * Number(token) > 500) return null;
      for (let time = 1; time < Number(token); time += 1) order.push(...last);
      last = [];
    } else {
      last = token === ")" ? (stack.length > 1 ? stack.pop()! : []) : [token];
      stack.at(-1)!.push(...last);
    }
    if (stack.at(-1)!.length > 500) return null;
  }
  return stack.flat();
}
