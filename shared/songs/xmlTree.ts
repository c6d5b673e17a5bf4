import { XMLParser } from "fast-xml-parser";

/** One element of an XML document, its children in document order. */
export interface XmlElement {
  name: string;
  attributes: Record<string, string>;
  children: XmlElement[];
  text: string;
}

const mostNesting = 40;

/**
 * Parses XML in document order. Documents that declare entities of their own are refused, so that none can be expanded.
 *
 * @param source the document's text
 * @returns its root element, or null if the text is not well-formed enough to be read
 */
export function parseXml(source: string): XmlElement | null {
  if (/<!ENTITY/i.test(source)) return null;
  const parser = new XMLParser({
    preserveOrder: true,
    ignoreAttributes: false,
    attributeNamePrefix: "",
    parseTagValue: false,
    parseAttributeValue: false,
    ignoreDeclaration: true,
    ignorePiTags: true,
    maxNestedTags: mostNesting,
  });
  try {
    const roots = elementsOf(parser.parse(source, true) as unknown);
    return roots.length === 1 ? roots[0]! : null;
  } catch {
    return null;
  }
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

function elementsOf(nodes: unknown): XmlElement[] {
  if (!Array.isArray(nodes)) return [];
  return nodes.flatMap((node: Record<string, unknown>): XmlElement[] => {
    const name = Object.keys(node).find((key) => key !== ":@");
    if (name === undefined || name === "#text") return [];
    const inside = node[name];
    return [
      {
        name,
        attributes: (node[":@"] ?? {}) as Record<string, string>,
        children: elementsOf(inside),
        text: textOf(inside),
      },
    ];
  });
}

function textOf(nodes: unknown): string {
  if (!Array.isArray(nodes)) return "";
  return nodes.map((node: Record<string, unknown>) => ("#text" in node ? String(node["#text"]) : "")).join("");
}
