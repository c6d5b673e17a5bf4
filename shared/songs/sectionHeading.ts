const plainNames =
  "verse|chorus|refrain|bridge|pre[- ]?chorus|post[- ]?chorus|intro(?:duction)?|outro|interlude|instrumental|middle (?:eight|8)|coda|solo|strophe";
const markedNames = `${plainNames}|break|tag|hook|ending|end|turnaround|turn|vamp|part|riff|rap|spoken|link|lead[- ]?in`;
const number = String.raw`(?:\s*(?:\d{1,2}|[ivx]{1,4}|[a-d])(?:\s*[-&+,]\s*\d{1,2})*\.?)?`;
const aside = String.raw`(?:\s*(?:\([^()]{1,40}\)|[x×]\s?\d{1,2}|\d{1,2}\s?[x×]))?`;
const bracketed =
  /^\s*([[{<(])\s*([^\][{}<>()|]{1,60}?)\s*[:.]?\s*([\]}>)])(\s*(?:\(?[x×]\s?\d{1,2}\)?|\d{1,2}\s?[x×]))?\s*[:.]?\s*$/i;
const plain = new RegExp(String.raw`^\s*((?:${plainNames})${number}${aside})\s*$`, "i");
const marked = new RegExp(String.raw`^\s*((?:${markedNames})${number}${aside})\s*[:.]\s*$`, "i");
const leading = new RegExp(String.raw`^\s*((?:${markedNames})${number}${aside})\s*:\s*(?=\S)`, "i");
const boxedLead = new RegExp(String.raw`^\s*\[\s*((?:${markedNames})${number}${aside})\s*\]\s*:?\s*(?=\S)`, "i");
const namedInside = new RegExp(String.raw`^(?:${markedNames})\b`, "i");

/**
 * Reads a line as the heading of a section.
 *
 * @param line one line of a chart
 * @returns the label without brackets and colon, or null if this is no heading
 * @example sectionHeading("[Chorus]") // => "Chorus"
 */
export function sectionHeading(line: string): string | null {
  if (line.length > 120) return null;
  const boxed = bracketed.exec(line);
  if (boxed) {
    const [, open = "", inside = "", , times = ""] = boxed;
    if (!/\p{L}/u.test(inside)) return null;
    // Round brackets also hold asides; only a section's own name makes them a heading.
    return open === "(" && !namedInside.test(inside) ? null : inside + (times.trim() === "" ? "" : ` ${times.trim()}`);
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
