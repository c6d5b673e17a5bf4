/** The chord under construction: named places, so that an alteration replaces what it alters. */
interface Stack {
  thirds: number[];
  fifths: number[];
  others: Set<number>;
  seventh: number | null;
}

/**
 * Reads what stands behind the root of a chord symbol, without a bass.
 *
 * @param written ASCII, such as "m7b5" or "(add9)"; "" is a major triad
 * @returns semitones above the root, ascending, extensions above the octave, or null where something is not understood
 * @see common practice of lead-sheet symbols
 * @example readQuality("m7b5") // => [0, 3, 6, 10]
 */
export function readQuality(written: string): number[] | null {
  if (!parenthesesMatch(written)) return null;
  const stack: Stack = { thirds: [4], fifths: [7], others: new Set(), seventh: null };
  // Brackets and commas only part one alteration from the next.
  let rest = written
    .replaceAll("−", "-")
    .replace(/[(),]+/g, "|")
    .replace(/^\|/, "")
    .replace(/\|$/, "");
  const take = (pattern: RegExp): string | null => {
    const found = pattern.exec(rest)?.[0] ?? null;
    rest = rest.slice(found?.length ?? 0);
    return found;
  };
  const family = readFamily(take, stack);
  readNumber(take, stack, family);
  while (rest !== "") {
    if (!readModifier(take, stack) && take(/^\|/) === null) return null;
  }
  const all = [
    0,
    ...stack.thirds,
    ...stack.fifths,
    ...stack.others,
    ...(stack.seventh === null ? [] : [stack.seventh]),
  ];
  return [...new Set(all)].sort((a, b) => a - b);
}

type Family = "plain" | "major" | "majorSeventh" | "diminished" | "halfDiminished";
type Take = (pattern: RegExp) => string | null;

function readFamily(take: Take, stack: Stack): Family {
  if (take(/^[Δ∆△^]/) !== null) {
    stack.seventh = 11;
    return "majorSeventh";
  }
  if (take(/^(?:[Mm]ajor|MAJ|[Mm]aj|MA|Ma|ma(?!dd)|M(?![Ii]))/) !== null) return "major";
  if (take(/^(?:[Mm]inor|MIN|[Mm]in|MI|Mi|mi|m|-(?!5))/) !== null) {
    stack.thirds = [3];
    take(/^\|(?=[MmΔ∆△])/);
    if (take(/^[Δ∆△]/) !== null) {
      stack.seventh = 11;
      return "majorSeventh";
    }
    return take(/^(?:[Mm]aj|Ma|ma(?!dd)|M)(?=\|?(?:7|9|11|13))/) === null ? "plain" : "major";
  }
  if (take(/^(?:[Dd]im|[°º˚]|o(?!mit))/) !== null) {
    stack.thirds = [3];
    stack.fifths = [6];
    take(/^\|(?=[Mm]aj7)/);
    return take(/^(?:[Mm]aj|M)(?=7)/) === null ? "diminished" : "major";
  }
  if (take(/^[øØ]/) !== null) {
    stack.thirds = [3];
    stack.fifths = [6];
    stack.seventh = 10;
    return "halfDiminished";
  }
  if (take(/^(?:[Aa]ug|\+(?!5))/) !== null) {
    stack.fifths = [8];
    if (take(/^[Δ∆△]/) !== null) {
      stack.seventh = 11;
      return "majorSeventh";
    }
  }
  return "plain";
}

function readNumber(take: Take, stack: Stack, family: Family): void {
  const number = take(/^\|?(?:6\/9|69|13|11|9|7M?|6|5|4|2)/)?.replace("|", "");
  if (number === undefined) return;
  const seventh =
    family === "major" || family === "majorSeventh" || number === "7M" ? 11 : family === "diminished" ? 9 : 10;
  switch (number) {
    case "5":
      if (family !== "diminished") stack.thirds = [];
      break;
    case "2":
      stack.others.add(2);
      break;
    case "4":
      stack.thirds = [5];
      break;
    case "6":
      stack.others.add(9);
      break;
    case "69":
    case "6/9":
      stack.others.add(9).add(14);
      break;
    default:
      stack.seventh = seventh;
      if (number === "9" || number === "11" || number === "13") stack.others.add(14);
      if (number === "11") stack.others.add(17);
      if (number === "13") stack.others.add(21);
  }
}

const naturalTop: Record<string, number> = { "2": 2, "4": 5, "6": 9, "9": 14, "11": 17, "13": 21 };

function readModifier(take: Take, stack: Stack): boolean {
  const suspended = take(/^(?:sus|Sus|SUS)(?:2sus4|4sus2|24|42|2|4)?/);
  if (suspended !== null) {
    const digits = suspended.replace(/\D/g, "");
    stack.thirds = digits === "2" ? [2] : digits.length > 1 ? [2, 5] : [5];
    return true;
  }
  const added = take(/^add[#b]?(?:13|11|9|6|4|2)/);
  if (added !== null) {
    stack.others.add(altered(added.slice(3)));
    return true;
  }
  const dropped = take(/^(?:no|omit)\.?(?:3rd|3|5th|5)/);
  if (dropped !== null) {
    if (dropped.includes("3")) stack.thirds = [];
    else stack.fifths = [];
    return true;
  }
  if (take(/^alt/) !== null) {
    stack.fifths = [6, 8];
    stack.seventh ??= 10;
    stack.others.delete(14);
    stack.others.add(13).add(15);
    return true;
  }
  const fifth = take(/^[#b+-]5/);
  if (fifth !== null) {
    const semitones = /^[#+]/.test(fifth) ? 8 : 6;
    stack.fifths =
      stack.fifths.includes(7) || stack.fifths.length === 0 ? [semitones] : [...new Set([...stack.fifths, semitones])];
    return true;
  }
  const alteration = take(/^[#b+-](?:13|11|9|6)/);
  if (alteration !== null) {
    const degree = alteration.slice(1);
    stack.others.delete(naturalTop[degree]!);
    stack.others.add(altered(alteration));
    return true;
  }
  const majorSeventh = take(/^(?:[Mm]aj|M|Δ)7/);
  if (majorSeventh !== null && stack.seventh === null) {
    stack.seventh = 11;
    return true;
  }
  if (take(/^\+/) !== null) {
    stack.fifths = [8];
    return true;
  }
  const tension = take(/^[/|](?:13|11|9|6)/);
  if (tension === null) return false;
  stack.others.add(altered(tension.slice(1)));
  return true;
}

function altered(degree: string): number {
  const natural = naturalTop[degree.replace(/^[#b+-]/, "")]!;
  return natural + (/^[#+]/.test(degree) ? 1 : /^[b-]/.test(degree) ? -1 : 0);
}

function parenthesesMatch(text: string): boolean {
  let open = 0;
  let previous = "";
  for (const character of text) {
    if (character === "(") open += 1;
    if (character === ")") open -= 1;
    if (open < 0 || open > 1 || (character === ")" && previous === "(")) return false;
    previous = character;
  }
  return open === 0;
}
