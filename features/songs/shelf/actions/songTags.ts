/** How many tags a song may have, and how long one may be. */
const mostTags = 20;
const longestTag = 40;

/** A tag as it is kept: no blanks around it, single ones within. */
function tidied(text: string): string {
  return text.replace(/\s+/g, " ").trim();
}

/** Two spellings of one tag. */
function same(a: string, b: string): boolean {
  return a.toLowerCase() === b.toLowerCase();
}

/** What keeps a text from becoming a tag of a song; null where it may. */
export function tagProblem(tags: readonly string[], text: string): string | null {
  const tag = tidied(text);
  if (tag === "") return "Write a tag first.";
  if ([...tag].length > longestTag) return `A tag may have at most ${longestTag} characters.`;
  if (tags.some((each) => same(each, tag))) return `“${tag}” is on this song already.`;
  if (tags.length >= mostTags) return `A song may have at most ${mostTags} tags.`;
  return null;
}

/** The tags with one more, spelled as it is spelled on other songs. */
export function withTag(tags: readonly string[], text: string, known: readonly string[]): string[] {
  const tag = tidied(text);
  return [...tags, known.find((each) => same(each, tag)) ?? tag];
}

/** Tags of other songs that go on with what is typed, the most used first. */
export function suggestedTags(
  known: readonly { tag: string; count: number }[],
  tags: readonly string[],
  typed: string,
  most = 6,
): string[] {
  const start = tidied(typed).toLowerCase();
  return [...known]
    .filter(({ tag }) => tag.toLowerCase().includes(start) && !tags.some((each) => same(each, tag)))
    .sort(
      (a, b) =>
        Number(b.tag.toLowerCase().startsWith(start)) - Number(a.tag.toLowerCase().startsWith(start)) ||
        b.count - a.count ||
        a.tag.localeCompare(b.tag, "en"),
    )
    .slice(0, most)
    .map(({ tag }) => tag);
}
