import { SaxesParser } from "saxes";

/** One element of an XML document, its children in document order. */
export interface XmlElement {
  name: string;
  attributes: Record<string, string>;
  children: XmlElement[];
  text: string;
}

class Refused extends Error {}

/**
 * `text` is what one element holds, in characters; the rest of it is left out. `head` is what may stand before the root.
 */
const most = { nesting: 40, elements: 300_000, attributes: 40, text: 20_000, head: 100_000 };
/** Characters that are read before another look at the head. */
const step = 65_536;

/**
 * Parses XML into a tree in document order, in time that grows with its length. Documents that declare entities of
 * their own are refused, so that none can be expanded.
 *
 * @param source the document's text
 * @returns its root element, or null if the text is not well-formed, nests beyond 40 levels, or has over 300,000
 *   elements, 40 attributes in one of them, 20,000 characters in one attribute or 100,000 before the root
 * @see W3C Extensible Markup Language (XML) 1.0, fifth edition
 */
export function parseXml(source: string): XmlElement | null {
  const parser = new SaxesParser();
  const open: XmlElement[] = [];
  let root: XmlElement | null = null;
  let elements = 0;
  let attributes = 0;
  const say = (text: string) => {
    const here = open.at(-1);
    if (here && here.text.length < most.text) here.text += text.slice(0, most.text - here.text.length);
  };
  parser.on("doctype", (doctype) => {
    if (/<!ENTITY/i.test(doctype)) throw new Refused("entities");
  });
  parser.on("opentagstart", () => {
    attributes = 0;
    elements += 1;
    if (elements > most.elements || open.length >= most.nesting) throw new Refused("elements");
  });
  parser.on("attribute", (attribute) => {
    attributes += 1;
    if (attributes > most.attributes || attribute.value.length > most.text) throw new Refused("attributes");
  });
  parser.on("opentag", (tag) => {
    const element: XmlElement = { name: tag.name, attributes: tag.attributes, children: [], text: "" };
    open.at(-1)?.children.push(element);
    root ??= element;
    open.push(element);
  });
  parser.on("closetag", () => open.pop());
  parser.on("text", say);
  parser.on("cdata", say);
  parser.on("error", (error) => {
    throw new Refused(error.message);
  });
  try {
    const text = source.trimStart();
    for (let place = 0; place < text.length; place += step) {
      if (root === null && place > most.head) return null;
      parser.write(text.slice(place, place + step));
    }
    parser.close();
  } catch (error) {
    if (error instanceof Refused) return null;
    throw error;
  }
  return root;
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
