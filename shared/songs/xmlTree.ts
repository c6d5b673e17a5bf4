import { SaxesParser } from "saxes";

/** One element of an XML document, its children in document order. */
export interface XmlElement {
  name: string;
  attributes: Record<string, string>;
  children: XmlElement[];
  text: string;
}

class Refused extends Error {}
/** What most elements say of themselves: one object for all of them. */
const none: XmlElement["attributes"] = {};

/**
 * `text` is what one element holds, in characters; the rest of it is left out. `head` is what may stand before the root.
 * `marks` (the signs at which a parser has to stop and look) and `stretch` (characters from one mark to the next) are
 * looked at before anything is parsed, so that files made to be slow cost nothing; scores come nowhere near them.
 */
const most = {
  nesting: 40,
  elements: 200_000,
  attributes: 40,
  text: 20_000,
  head: 100_000,
  marks: 450_000,
  stretch: 200_000,
};
const markCodes = ["<", "&", "]"].map((mark) => mark.charCodeAt(0));
/** Characters that are read before another look at the head. */
const step = 65_536;

/**
 * Parses XML into a tree in document order, in time that grows with its length. Documents that declare entities of
 * their own are refused, so that none can be expanded.
 *
 * @param source the document's text
 * @returns its root element, or null if the text is not well-formed, nests beyond 40 levels, or has over 200,000
 *   elements, 40 attributes in one of them, 20,000 characters in one attribute, 100,000 before the root, 450,000 of
 *   the marks < & ] or 200,000 from one of them to the next
 * @see W3C Extensible Markup Language (XML) 1.0, fifth edition
 */
export function parseXml(source: string): XmlElement | null {
  if (endless(source)) return null;
  const parser = new SaxesParser({ position: false, xmlns: false });
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
    const element: XmlElement = {
      name: tag.name,
      attributes: attributes > 0 ? tag.attributes : none,
      children: [],
      text: "",
    };
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

/** Whether a text has more marks, or more between two of them, than any document that is read. */
function endless(source: string): boolean {
  let [marks, last] = [0, 0];
  for (let at = 0; at < source.length; at += 1) {
    if (!markCodes.includes(source.charCodeAt(at))) continue;
    marks += 1;
    if (marks > most.marks || at - last > most.stretch) return true;
    last = at;
  }
  return source.length - last > most.stretch;
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
