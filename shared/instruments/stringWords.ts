const ordinals = ["first", "second", "third", "fourth", "fifth", "sixth", "seventh", "eighth"];

/**
 * A string by its note, as players say it; two of one note are told apart as low and high, more of them by their places.
 *
 * @param index of the string, from the bass side
 * @param names notes of all strings with octaves, ASCII or glyphs; absent where they are not known
 * @returns such as "D string", "low G string", "third string, G,"
 * @example stringWords(2, ["G3", "D4", "G4"]) // => "high G string"
 */
export function stringWords(index: number, names: readonly string[] | undefined): string {
  const name = names?.[index];
  const place = ordinals[index] ?? String(index + 1);
  if (!names || name === undefined) return `${place} string`;
  const letter = (full: string) => full.replace(/-?\d+$/, "");
  const alike = names.filter((other) => letter(other) === letter(name));
  if (alike.length === 1) return `${letter(name)} string`;
  const octaves = alike.map((other) => Number(/-?\d+$/.exec(other)?.[0] ?? NaN));
  const own = Number(/-?\d+$/.exec(name)?.[0] ?? NaN);
  if (alike.length === 2 && octaves.every(Number.isFinite) && octaves[0] !== octaves[1])
    return `${own === Math.min(...octaves) ? "low" : "high"} ${letter(name)} string`;
  return `${place} string, ${letter(name)},`;
}
