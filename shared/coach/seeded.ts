/** A source of numbers from 0 up to, not including, 1. */
export type Chance = () => number;

/**
 * A source of chance that gives the same numbers for the same seed.
 *
 * @param seed any whole number
 * @returns numbers, evenly spread
 * @see G. Marsaglia, Xorshift RNGs, J. Statistical Software 8(14), 2003
 * @example seeded(7)() === seeded(7)() // => true
 */
export function seeded(seed: number): Chance {
  // Neighbouring seeds are driven apart first; zero would stay zero for ever.
  let state = (Math.imul(seed | 0, 0x9e3779b1) ^ 0x6d2b79f5) >>> 0 || 1;
  const next = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 2 ** 32;
  };
  for (let k = 0; k < 4; k++) next();
  return next;
}

/**
 * One of several.
 *
 * @param items at least one
 * @param chance where the choice comes from
 * @returns one of them
 * @throws RangeError if there are none
 * @example picked(["only"], seeded(1)) // => "only"
 */
export function picked<Item>(items: readonly Item[], chance: Chance): Item {
  if (items.length === 0) throw new RangeError("there is nothing to choose from");
  return items[Math.floor(chance() * items.length)]!;
}

/**
 * The same items in an order of chance.
 *
 * @param items any
 * @param chance where the order comes from
 * @returns a new list
 * @example shuffled([1, 2, 3], seeded(1)).length // => 3
 */
export function shuffled<Item>(items: readonly Item[], chance: Chance): Item[] {
  const left = [...items];
  const order: Item[] = [];
  while (left.length > 0) order.push(...left.splice(Math.floor(chance() * left.length), 1));
  return order;
}
