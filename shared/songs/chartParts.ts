import { parseChart } from "./chart";
import { readSectionName } from "./sectionHeading";
import type { SectionKind } from "./sectionKind";

/** A part of a chart, between one heading and the next. */
export interface ChartPart {
  /** its name without the times; null for what stands before the first heading */
  name: string | null;
  kind: SectionKind;
  /** how often it is played, 1 to 99 */
  times: number;
  /** rows it takes up, counted from 0, its heading first; `end` is the row behind it */
  start: number;
  end: number;
}

const timesBehind =
  /[\s,-]*\(?\s*(?:[x×]\s?\d{1,2}|\d{1,2}\s?[x×]|\b(?:\d{1,2}|two|three|four)\s+times|\btwice)\s*\)?\s*$/i;

/**
 * The parts of a chart.
 *
 * @param text a chart
 * @returns its parts in order; blank rows before the first heading are none
 * @example chartParts("[Chorus] x2\nG\nLow tide")[0] // => { name: "Chorus", kind: "chorus", times: 2, start: 0, end: 3 }
 */
export function chartParts(text: string): ChartPart[] {
  return blocksOf(text).map(({ label, kind, start, rows, gap }) => {
    const { name, times } = readLabel(label);
    return { name, kind, times, start, end: start + rows.length + gap.length };
  });
}

/**
 * Gives a part another name, or another number of times. Its heading keeps its brackets; a heading before chords on
 * one line comes to stand on a line of its own.
 *
 * @param text a chart
 * @param index which part, from 0
 * @param name the new name, 1 to 40 characters that hold a letter
 * @param times how often it is played, 1 to 99
 * @returns the new text; null where there is no such part or the name could not be read again as one
 * @example renamePart("Chorus\nG\nLow tide", 0, "Tag", 2) // => "Tag x2:\nG\nLow tide"
 */
export function renamePart(text: string, index: number, name: string, times: number): string | null {
  const blocks = blocksOf(text);
  const block = blocks[index];
  if (!block) return null;
  const heading = headingFor(name, times, block.heading ?? "");
  if (heading === null) return null;
  if (block.heading !== null) block.rows[0] = heading;
  else {
    const first = block.rows[0] ?? "";
    // The chords behind a heading on their line keep their columns over the words.
    const body = block.label === null ? first : " ".repeat(block.lead) + first.slice(block.lead);
    block.rows.splice(0, 1, heading, body);
  }
  return joined(text, blocks);
}

/**
 * Moves a part to another place among the parts. What stands before the first heading stays first.
 *
 * @param text a chart
 * @param index which part, from 0
 * @param to the place it is to have, from 0
 * @returns the new text; null where there is no such part or place
 * @example movePart("Verse\nLow tide\n\nChorus\nStill", 1, 0) // => "Chorus\nStill\n\nVerse\nLow tide"
 */
export function movePart(text: string, index: number, to: number): string | null {
  const blocks = blocksOf(text);
  const gaps = blocks.map(({ gap }) => gap);
  const [moved] = blocks.splice(index, 1);
  const movable = moved !== undefined && moved.label !== null && index >= 0;
  if (!movable || to < 0 || to > blocks.length || (to === 0 && blocks[0]?.label === null)) return null;
  blocks.splice(to, 0, moved);
  return joined(
    text,
    blocks.map((block, place) => ({ ...block, gap: gaps[place] ?? [] })),
  );
}

/**
 * Puts a second copy of a part behind it. A part with a number behind its name gets the next free one.
 *
 * @param text a chart
 * @param index which part, from 0
 * @returns the new text; null where there is no such part with a name
 * @example copyPart("Verse 1\nLow tide", 0) // => "Verse 1\nLow tide\n\nVerse 2\nLow tide"
 */
export function copyPart(text: string, index: number): string | null {
  const blocks = blocksOf(text);
  const block = blocks[index];
  if (!block || block.label === null) return null;
  const copy = { ...block, rows: [...block.rows] };
  const { name, times } = readLabel(block.label);
  const numbered = /^(.*\D)(\d{1,2})$/.exec(name ?? "");
  if (numbered && block.heading !== null) {
    const taken = new Set(blocks.map(({ label }) => readLabel(label).name?.toLowerCase()));
    let next = Number(numbered[2]) + 1;
    while (taken.has(`${numbered[1]}${next}`.toLowerCase())) next += 1;
    copy.rows[0] = headingFor(`${numbered[1]}${next}`, times, block.heading) ?? block.heading;
  }
  const between = block.gap.length > 0 && index < blocks.length - 1 ? block.gap : [""];
  blocks.splice(index, 1, { ...block, gap: between }, { ...copy, gap: block.gap });
  return joined(text, blocks);
}

/**
 * Takes a part out, heading, words and chords.
 *
 * @param text a chart
 * @param index which part, from 0
 * @returns the new text; null where there is no such part
 * @example removePart("Verse\nLow tide\n\nChorus\nStill", 0) // => "Chorus\nStill"
 */
export function removePart(text: string, index: number): string | null {
  const blocks = blocksOf(text);
  const [gone] = blocks.splice(index, 1);
  if (!gone || index < 0) return null;
  const last = blocks.at(-1);
  if (index === blocks.length && last) last.gap = gone.gap;
  return joined(text, blocks);
}

/**
 * Adds an empty part at the end.
 *
 * @param text a chart
 * @param name its name, 1 to 40 characters that hold a letter
 * @returns the new text; null where the name could not be read as one
 * @example addPart("Verse\nLow tide", "Bridge") // => "Verse\nLow tide\n\nBridge\n"
 */
export function addPart(text: string, name: string): string | null {
  const heading = headingFor(name, 1, "");
  if (heading === null) return null;
  const before = text.replace(/\s+$/, "");
  return `${before === "" ? "" : `${before}\n\n`}${heading}\n`;
}

interface Block {
  label: string | null;
  kind: SectionKind;
  /** the heading's row as written; null where it stands before chords on their row, or where there is none */
  heading: string | null;
  /** characters that a heading takes up before chords on their row */
  lead: number;
  start: number;
  rows: string[];
  /** blank rows behind it */
  gap: string[];
}

function blocksOf(text: string): Block[] {
  const all = text.replace(/\r\n?/g, "\n").split("\n");
  let row = 0;
  const blocks = parseChart(text).sections.map(({ label, kind, heading, lines }): Block => {
    const start = row;
    row += heading === null ? 0 : 1;
    for (const line of lines) row += line.kind === "sung" ? 2 : 1;
    const rows = all.slice(start, row);
    const first = lines[0];
    const lead = heading === null && label !== null && first && "chords" in first ? (first.chords[0]?.column ?? 0) : 0;
    let end = rows.length;
    while (end > 0 && rows[end - 1]!.trim() === "") end -= 1;
    return { label, kind: kind ?? "own", heading, lead, start, rows: rows.slice(0, end), gap: rows.slice(end) };
  });
  return blocks.filter(({ label, rows }) => label !== null || rows.length > 0);
}

/** Puts the parts together again, with the blank rows that stood before the first of them. */
function joined(before: string, blocks: readonly Block[]): string {
  const first = blocksOf(before)[0]?.start ?? 0;
  const head = before.replace(/\r\n?/g, "\n").split("\n").slice(0, first);
  return [...head, ...blocks.flatMap(({ rows, gap }) => [...rows, ...gap])].join("\n");
}

function readLabel(label: string | null): { name: string | null; times: number } {
  if (label === null) return { name: null, times: 1 };
  const { times } = readSectionName(label);
  const name = times === 1 ? label.trim() : label.replace(timesBehind, "").trim();
  return name === "" ? { name: label.trim(), times: 1 } : { name, times };
}

/** A row that is read as this heading: in the brackets of the old one, bare, with a colon, or in square brackets. */
function headingFor(name: string, times: number, old: string): string | null {
  const clean = name
    .replace(/[[\]{}<>()|\s]+/g, " ")
    .trim()
    .slice(0, 40);
  if (!/\p{L}/u.test(clean) || !Number.isInteger(times) || times < 1 || times > 99) return null;
  const behind = times === 1 ? "" : ` x${times}`;
  const [, indent = "", open = "", close = ""] =
    /^(\s*)([[{<(]?).*?([\]}>)]?)(?:\s*\(?[x×]?\s?\d*\s?[x×]?\)?)?\s*[:.]?\s*$/i.exec(old) ?? [];
  const colon = /:\s*$/.test(old) ? ":" : "";
  const tries = [
    ...(open !== "" && close !== ""
      ? [`${indent}${open}${clean}${close}${behind}`]
      : [`${indent}${clean}${behind}${colon}`]),
    `${clean}${behind}:`,
    `[${clean}]${behind}`,
  ];
  return (
    tries.find((row) => {
      const [part, more] = parseChart(row).sections;
      const read = readLabel(part?.label ?? null);
      return more === undefined && part?.heading === row && read.name === clean && read.times === times;
    }) ?? null
  );
}
