/** One element of an XML document, its children in document order. */
export interface XmlElement {
  name: string;
  attributes: Record<string, string>;
  children: XmlElement[];
  text: string;
}

/** `text` is what one stretch of text or one attribute may hold, in characters; the rest of it is left out. */
const most = { nesting: 40, elements: 400_000, attributes: 40, text: 20_000 };
const known: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };
const name = /[A-Za-z_:][\w.:-]*/y;
const attribute = /\s+([A-Za-z_:][\w.:-]*)\s*=\s*(?:"([^"<]*)"|'([^'<]*)')/y;
const tagEnd = /\s*(\/?)>/y;

/**
 * Parses XML in document order, in time that grows with its length. Documents that declare entities of their own are
 * refused, so that none can be expanded.
 *
 * @param source the document's text
 * @returns its root element, or null if the text is not well-formed, nests beyond 40 levels or has over 400,000 elements
 * @see W3C Extensible Markup Language (XML) 1.0, fifth edition
 */
export function parseXml(source: string): XmlElement | null {
  if (/<!ENTITY/i.test(source)) return null;
  const root: XmlElement = { name: "", attributes: {}, children: [], text: "" };
  const open = [root];
  let elements = 0;
  let place = 0;
  while (place < source.length) {
    const parent = open.at(-1)!;
    const next = source.indexOf("<", place);
    const text = source.slice(place, next < 0 ? source.length : next);
    if (text.trim() !== "") {
      if (parent === root) return null;
      parent.text += plainText(text);
    }
    if (next < 0) break;
    const skipped = pastMarkup(source, next);
    if (skipped === -1) return null;
    if (skipped !== null) {
      if (source.startsWith("<![CDATA[", next)) parent.text += source.slice(next + 9, skipped - 3);
      place = skipped;
    } else if (source[next + 1] === "/") {
      const end = source.indexOf(">", next);
      const closed = open.pop()!;
      if (end < 0 || closed === root || source.slice(next + 2, end).trim() !== closed.name) return null;
      place = end + 1;
    } else {
      const tag = readTag(source, next + 1);
      elements += 1;
      if (!tag || elements > most.elements || (parent === root && root.children.length > 0)) return null;
      parent.children.push(tag.element);
      if (!tag.empty) open.push(tag.element);
      if (open.length > most.nesting) return null;
      place = tag.end;
    }
  }
  return open.length === 1 ? (root.children[0] ?? null) : null;
}

/**
 * First child of a name.
 *
 * @param element the parent, or undefined
 * @param name element name
 * @returns the child, or undefined
 */
export function child(element: XmlElement | undefined, name: string): XmlElement | undefined {
  return element?.children.find((each) => each.name === name);
}

/**
 * All children of a name.
 *
 * @param element the parent, or undefined
 * @param name element name
 * @returns the children in order
 */
export function childrenOf(element: XmlElement | undefined, name: string): XmlElement[] {
  return element?.children.filter((each) => each.name === name) ?? [];
}

/**
 * Number inside a child.
 *
 * @param element the parent, or undefined
 * @param name element name
 * @returns the number, or null where the child is missing or holds none
 */
export function childNumber(element: XmlElement | undefined, name: string): number | null {
  const text = child(element, name)?.text.trim() ?? "";
  return /^[+-]?\d{1,9}(?:\.\d{1,9})?$/.test(text) ? Number(text) : null;
}

/** Where a comment, an instruction, a declaration or character data ends; null at anything else, -1 where it never ends. */
function pastMarkup(source: string, at: number): number | null {
  const ends: [string, string][] = [
    ["<!--", "-->"],
    ["<![CDATA[", "]]>"],
    ["<?", "?>"],
  ];
  for (const [begin, end] of ends) {
    if (!source.startsWith(begin, at)) continue;
    const found = source.indexOf(end, at + begin.length);
    return found < 0 ? -1 : found + end.length;
  }
  if (!source.startsWith("<!", at)) return null;
  const close = source.indexOf(">", at);
  const subset = source.indexOf("[", at);
  const end = subset >= 0 && subset < close ? source.indexOf("]>", subset) + 1 : close;
  return end <= 0 ? -1 : end + 1;
}

/** Reads a start tag from behind its bracket. */
function readTag(source: string, at: number): { element: XmlElement; empty: boolean; end: number } | null {
  name.lastIndex = at;
  const named = name.exec(source)?.[0];
  if (named === undefined) return null;
  const element: XmlElement = { name: named, attributes: {}, children: [], text: "" };
  attribute.lastIndex = name.lastIndex;
  let place = name.lastIndex;
  let found: RegExpExecArray | null;
  for (let count = 0; (found = attribute.exec(source)); count += 1) {
    if (count >= most.attributes) return null;
    element.attributes[found[1]!] = plainText(found[2] ?? found[3] ?? "");
    place = attribute.lastIndex;
  }
  tagEnd.lastIndex = place;
  const end = tagEnd.exec(source);
  if (!end) return null;
  return { element, empty: end[1] === "/", end: tagEnd.lastIndex };
}

function plainText(whole: string): string {
  const text = whole.slice(0, most.text);
  if (!text.includes("&")) return text;
  return text.replace(/&(?:#x([0-9a-f]{1,6})|#(\d{1,7})|(\w{1,5}));/gi, (sign, hex, decimal, word) => {
    if (word !== undefined) return known[word as string] ?? sign;
    const code = hex === undefined ? Number(decimal) : parseInt(hex as string, 16);
    return code > 0 && code < 0x110000 ? String.fromCodePoint(code) : "";
  });
}
