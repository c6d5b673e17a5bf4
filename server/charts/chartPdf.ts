import type { ChartPdfRequest } from "../../shared/contract/chartPdf";
import { keyWords } from "../../shared/music/keyWords";
import { glyphs } from "../../shared/music/pitch";
import { HttpProblem } from "../http/httpProblem";
import { type ChartRow, chartRows } from "./chartRows";
import { cellWidth, type Face, PrintedText } from "./printedText";

const paperPt = { A4: [595.28, 841.89], Letter: [612, 792] } as const;
const marginPt = 54;
const size = 11;
const titleSize = 22;
const ink = "#241C33";
const soft = "#5D5370";
const plum = "#6A2C70";
const mostPages = 100;

const heights: Record<ChartRow["kind"], number> = {
  heading: 22,
  sung: 30,
  chords: 17,
  lyrics: 16,
  remark: 16,
  blank: 10,
};

/** Sets a chart on paper, chords over their syllables. Refuses one that would fill a book. */
export async function chartPdf({ title, chart, key, paper }: ChartPdfRequest): Promise<Buffer> {
  const [width, height] = paperPt[paper];
  const room = width - 2 * marginPt;
  const text = new PrintedText(title, paper);
  const head = wrapTitle(text, text.printable(title, "title"), room);
  const rows = chartRows(text.printable(withoutTabs(chart), "mono"), Math.floor(room / (size * cellWidth)));
  const headHeight = head.length * titleSize * 1.2 + (key ? 18 : 0) + 12;
  const pages = inPages(rows, height - 2 * marginPt, headHeight);
  if (pages.length > mostPages)
    throw new HttpProblem(422, "invalid", `This chart would fill more than ${mostPages} pages.`, [
      { path: "chart", message: "Make the chart shorter." },
    ]);

  const { document } = text;
  const chunks: Buffer[] = [];
  const finished = new Promise<Buffer>((resolve, reject) => {
    document.on("data", (chunk: Buffer) => chunks.push(chunk));
    document.on("end", () => resolve(Buffer.concat(chunks)));
    document.on("error", reject);
  });
  const set = (line: string, face: Face, color: string, y: number, x = marginPt, at = size) =>
    text.line(line, { face, size: at, color, x, y });
  for (const [k, page] of pages.entries()) {
    document.addPage();
    let y = marginPt;
    if (k === 0) {
      for (const line of head) set(line, "title", ink, (y += titleSize * 1.2) - 4, marginPt, titleSize);
      if (key) set(glyphs(keyWords(key)), "mono", soft, (y += 18) - 4);
      y += 12;
    }
    for (const row of page) {
      const bottom = y + heights[row.kind];
      if (row.kind === "sung") set(row.chords, "monoBold", plum, bottom - 18);
      if (row.kind === "chords") set(row.chords, "monoBold", plum, bottom - 4);
      else if (row.kind === "heading") set(row.words, "monoBold", ink, bottom - 5);
      else set(row.words, "mono", row.kind === "remark" ? soft : ink, bottom - 4);
      y = bottom;
    }
    const number = `${k + 1} / ${pages.length}`;
    set(number, "mono", soft, height - 30, (width - number.length * 9 * cellWidth) / 2, 9);
  }
  document.end();
  return finished;
}

/** Chords and words are one row and are never parted; a heading goes with what follows it. */
function inPages(rows: readonly ChartRow[], room: number, headHeight: number): ChartRow[][] {
  const pages: ChartRow[][] = [[]];
  let left = room - headHeight;
  for (const [k, row] of rows.entries()) {
    const next = row.kind === "heading" ? rows[k + 1] : undefined;
    if (heights[row.kind] + (next ? heights[next.kind] : 0) > left) {
      pages.push([]);
      left = room;
    }
    const page = pages.at(-1);
    if (row.kind === "blank" && page?.length === 0 && pages.length > 1) continue;
    page?.push(row);
    left -= heights[row.kind];
  }
  return pages;
}

function wrapTitle(text: PrintedText, title: string, room: number): string[] {
  const lines: string[] = [];
  let line = "";
  const fits = (words: string) => text.width(words, "title", titleSize) <= room;
  for (const word of title.split(/\s+/).filter((part) => part !== "")) {
    const longer = line === "" ? word : `${line} ${word}`;
    if (fits(longer)) line = longer;
    else {
      if (line !== "") lines.push(line);
      line = "";
      for (const sign of word) {
        if (!fits(line + sign)) {
          lines.push(line);
          line = "";
        }
        line += sign;
      }
    }
  }
  return line === "" ? lines : [...lines, line];
}

/** Tabulators reach to the next column that eight divides, as in an editor. */
function withoutTabs(chart: string): string {
  return chart
    .split(/\r\n?|\n/)
    .map((line) => {
      const [first = "", ...others] = line.split("\t");
      return others.reduce((before, part) => before.padEnd(8 * (Math.floor(before.length / 8) + 1)) + part, first);
    })
    .join("\n");
}
