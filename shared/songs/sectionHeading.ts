import { type SectionKind, sectionNames } from "./sectionKind";

const every = Object.values(sectionNames);
const plainNames = every.flatMap(({ plain }) => plain ?? []).join("|");
const markedNames = [plainNames, ...every.flatMap(({ marked }) => marked ?? []), "part"].join("|");
const number = String.raw`(?:\s*(?:\d{1,2}|[ivx]{1,4}|[a-d])(?:\s*[-&+,]\s*\d{1,2})*\.?)?`;
const times = String.raw`(?:[x×]\s?\d{1,2}|\d{1,2}\s?[x×]|(?:\d{1,2}|two|three|four)\s+times|twice)`;
const aside = String.raw`(?:\s*[,-]?\s*(?:\([^()]{1,40}\)|${times}))?`;
const bracketed = new RegExp(
  String.raw`^\s*([[{<(])\s*([^\][{}<>()|]{1,60}?(?:\(${times}\))?)\s*[:.]?\s*([\]}>)])(\s*(?:\(${times}\)|${times}))?\s*[:.]?\s*$`,
  "i",
);
const plain = new RegExp(String.raw`^\s*((?:${plainNames})${number}${aside})\s*$`, "i");
const marked = new RegExp(String.raw`^\s*((?:${markedNames})${number}${aside})\s*[:.]\s*$`, "i");
const leading = new RegExp(String.raw`^\s*((?:${markedNames})${number}${aside})\s*:\s*(?=\S)`, "i");
const boxedLead = new RegExp(String.raw`^\s*\[\s*((?:${markedNames})${number}${aside})\s*\]\s*:?\s*(?=\S)`, "i");
const namedInside = new RegExp(String.raw`^(?:${markedNames})\b`, "i");
const again = new RegExp(
  String.raw`^\s*(?:repeat\s+(?:the\s+)?(?:last\s+|first\s+)?)((?:${markedNames})${number}${aside})\s*[.]?\s*$`,
  "i",
);
const onceMore = new RegExp(
  String.raw`^\s*((?:${plainNames})${number})\s+(?:again|repeats?|once more|as before)${aside}\s*[.:]?\s*$`,
  "i",
);
const repeatWords = /^(?:repeat\s+(?:the\s+)?(?:last\s+|first\s+)?)|\s+(?:again|repeats?|once more|as before)\b/gi;
const timesSigns = new RegExp(String.raw`\(?\b(?:${times})(?!\w)\)?|[x×]\s?\d{1,2}\)?|\(\s*\)`, "gi");
const kinds = Object.entries(sectionNames).map(
  ([kind, { plain: names = [], marked: more = [] }]) =>
    [kind as SectionKind, new RegExp(String.raw`^(?:${[names, more].flat().join("|")})(?!\p{L})`, "iu")] as const,
);
const figures = /\s(\d{1,2}|[ivx]{1,4}|[a-d])\b/i;
const alone = new RegExp(String.raw`^\s*(?:\(${times}\)|[x×]\s?\d{1,2}|\d{1,2}\s?[x×])\s*$`, "i");
const countWords: Record<string, number> = { twice: 2, two: 2, three: 3, four: 4 };

/** What a heading says. */
export interface SectionName {
  kind: SectionKind;
  /** the first number of "Verse 2", "Verse IV" or "Part B" (2); null without */
  number: number | null;
  /** how often it is played: 2 for "x2", "(2x)" and "twice"; 1 where nothing is said */
  times: number;
  /** the name alone, small letters, for comparing: "verse 2", "everybody now" */
  name: string;
}

/**
 * Reads a line as the heading of a section.
 *
 * @param line one line of a chart
 * @returns the label without brackets and colon, or null if this is no heading
 * @example sectionHeading("[Chorus]") // => "Chorus"
 */
export function sectionHeading(line: string): string | null {
  if (line.length > 120) return null;
  const repeated = again.exec(line) ?? onceMore.exec(line);
  if (repeated) return line.trim().replace(/[.:]$/, "");
  const boxed = bracketed.exec(line);
  if (boxed) {
    const [, open = "", inside = "", , more = ""] = boxed;
    if (!/\p{L}/u.test(inside)) return null;
    const said = namedInside.test(inside) || again.test(inside);
    // Round brackets also hold asides; only a section's own name makes them a heading.
    return open === "(" && !said ? null : inside + (more.trim() === "" ? "" : ` ${more.trim()}`);
  }
  return (plain.exec(line) ?? marked.exec(line))?.[1]?.trim() ?? null;
}

/**
 * Reads a heading that stands in front of chords on the same line ("Intro: G D").
 *
 * @param line one line of a chart
 * @returns the label and how many characters it takes up, or null
 * @example leadingLabel("Intro: G D") // => { label: "Intro", length: 7 }
 */
export function leadingLabel(line: string): { label: string; length: number } | null {
  if (line.length > 2000) return null;
  const match = leading.exec(line) ?? boxedLead.exec(line);
  return match ? { label: (match[1] ?? "").trim(), length: match[0].length } : null;
}

/**
 * Takes a label apart.
 *
 * @param label such as "Chorus (x2)", "Verse 2" or "Everybody now"
 * @returns kind, number, how often, and the bare name
 * @example readSectionName("Chorus 2 (x3)") // => { kind: "chorus", number: 2, times: 3, name: "chorus 2" }
 */
export function readSectionName(label: string): SectionName {
  const short = label.slice(0, 120);
  const said = short.match(timesSigns)?.join(" ").toLowerCase() ?? "";
  const word = Object.keys(countWords).find((each) => said.includes(each));
  const counted = Number(/\d+/.exec(said)?.[0] ?? countWords[word ?? ""] ?? 1);
  const name = short
    .replace(/^repeat\s+(?:the\s+)?first\s+(\S+)/i, "$1 1")
    .replace(timesSigns, " ")
    .replace(repeatWords, " ")
    .replace(/[\s.,:-]+$/, "")
    .trim()
    .replace(/\s+/g, " ");
  const kind = kindOf(name);
  const figure = kind === "own" ? null : figures.exec(name)?.[1];
  return {
    kind,
    number: figure ? numberOf(figure.toLowerCase()) : null,
    times: Math.max(1, counted),
    name: name.toLowerCase(),
  };
}

/**
 * How often a line of its own says that what stands above is played ("x2", "(3x)", "twice").
 *
 * @param line one line of a chart
 * @returns the number, or null if the line says anything else
 * @example timesAlone("  (2x)") // => 2
 */
export function timesAlone(line: string): number | null {
  return line.length <= 40 && alone.test(line) ? readSectionName(line).times : null;
}

function kindOf(name: string): SectionKind {
  return kinds.find(([, pattern]) => pattern.test(name))?.[0] ?? "own";
}

function numberOf(figure: string): number | null {
  if (/^\d/.test(figure)) return Number(figure);
  const roman = ["i", "ii", "iii", "iv", "v", "vi", "vii", "viii", "ix", "x"].indexOf(figure);
  if (roman >= 0) return roman + 1;
  return figure.length === 1 && "abcd".includes(figure) ? "abcd".indexOf(figure) + 1 : null;
}
