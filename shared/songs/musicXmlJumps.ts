import { type ScoreSigns, readJumpWords } from "./scoreSigns";
import { type XmlElement, child, childrenOf } from "./xmlTree";

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
    for (const { text } of childrenOf(kind, "words")) Object.assign(signs, { ...readJumpWords(text), ...signs });
  }
}
