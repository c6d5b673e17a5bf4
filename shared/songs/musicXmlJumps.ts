import type { MeasureSigns } from "./repeats";
import { type XmlElement, child, childrenOf } from "./xmlTree";

/** Signs of a measure, with those codas of which only the whole score tells whether one leaves there or arrives. */
export interface ScoreSigns extends MeasureSigns {
  codaSign?: boolean;
}

/**
 * Reads what a bar line says to a player.
 *
 * @param barline the element
 * @param signs the signs of its measure, which are added to
 * @see MusicXML 4.0: repeat, ending, segno, coda
 */
export function readBarline(barline: XmlElement, signs: ScoreSigns): void {
  const repeat = child(barline, "repeat");
  if (repeat?.attributes["direction"] === "forward") signs.repeatStart = true;
  if (repeat?.attributes["direction"] === "backward") {
    const times = Number(repeat.attributes["times"] ?? 2);
    signs.repeatEnd = Number.isInteger(times) && times >= 1 && times <= 20 ? times : 2;
  }
  const ending = child(barline, "ending");
  const numbers = (ending?.attributes["number"] ?? "").match(/\d{1,2}/g)?.map(Number);
  if (ending?.attributes["type"] === "start" && numbers) signs.endingStart = numbers;
  if (ending && ending.attributes["type"] !== "start") signs.endingEnd = true;
  if (child(barline, "segno")) signs.segno = true;
  if (child(barline, "coda")) signs.coda = true;
}

/**
 * Reads what a direction says to a player: by its sound element, else by its words and signs.
 *
 * @param element a direction, or a sound that stands alone
 * @param signs the signs of its measure, which are added to
 * @see MusicXML 4.0: sound, segno, coda, words
 */
export function readDirection(element: XmlElement, signs: ScoreSigns): void {
  const sounds = element.name === "sound" ? [element] : childrenOf(element, "sound");
  const before = Object.keys(signs).length;
  for (const { attributes } of sounds) {
    if (attributes["dacapo"] === "yes") signs.jump = "da capo";
    if ("dalsegno" in attributes) signs.jump = "dal segno";
    if ("segno" in attributes) signs.segno = true;
    if ("coda" in attributes) signs.coda = true;
    if ("tocoda" in attributes) signs.toCoda = true;
    if ("fine" in attributes) signs.fine = true;
  }
  if (Object.keys(signs).length > before) return;
  for (const kind of childrenOf(element, "direction-type")) {
    if (child(kind, "segno")) signs.segno = true;
    if (child(kind, "coda")) signs.codaSign = true;
    for (const { text } of childrenOf(kind, "words")) {
      if (/^\s*(?:D\.?\s?C\b|da capo)/i.test(text)) signs.jump ??= "da capo";
      if (/^\s*(?:D\.?\s?S\b|dal segno)/i.test(text)) signs.jump ??= "dal segno";
      if (/^\s*fine\b/i.test(text)) signs.fine = true;
      if (/^\s*to coda\b/i.test(text)) signs.toCoda = true;
    }
  }
}

/**
 * Tells of coda signs that no sound explains where one leaves and where the coda begins: the first of two is left at.
 *
 * @param signs signs of all measures, in order
 * @returns the same with the coda signs placed
 * @see common practice
 */
export function placeCodas(signs: readonly ScoreSigns[]): ScoreSigns[] {
  const marked = signs.flatMap((each, index) => (each.codaSign && !each.toCoda ? [index] : []));
  const leaves = signs.some((each) => each.toCoda) || marked.length < 2 ? -1 : marked[0]!;
  const arrives = signs.some((each) => each.coda) ? -1 : (marked.at(-1) ?? -1);
  return signs.map((each, index) => ({
    ...each,
    ...(index === leaves ? { toCoda: true } : {}),
    ...(index === arrives && index !== leaves ? { coda: true } : {}),
  }));
}
