import type { ChartPdfRequest } from "../../shared/contract/chartPdf";
import { keyWords } from "../../shared/music/keyWords";
import { glyphs } from "../../shared/music/pitch";
import { type ChartRow, chartRows, signLine } from "../../shared/sheets/chartRows";
import { paperTones } from "../../shared/sheets/paperTones";
import { rowPages } from "../../shared/sheets/rowPages";
import type { SheetFace } from "../../shared/sheets/sheetPiece";
import { cellWidth, textPiece, wrapText } from "../../shared/sheets/textPiece";
import { parseChart } from "../../shared/songs/chart";
import { pdfBytes, refuseBook } from "./pdfBytes";
import { PrintedText } from "./printedText";

const paperPt = { A4: [595.28, 841.89], Letter: [612, 792] } as const;
const marginPt = 54;
const size = 11;
const titleSize = 22;
const { ink, soft, plum } = paperTones;

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
  const head = wrapText(text.printable(title, "title"), "title", titleSize, room);
  const printed = parseChart(text.printable(withoutTabs(chart), "mono"));
  const rows = chartRows(printed, Math.floor(room / (size * cellWidth)));
  const headHeight = head.length * titleSize * 1.2 + (key ? 18 : 0) + 12;
  const pages = rowPages(
    rows,
    ({ kind }) => heights[kind],
    (page) => height - 2 * marginPt - (page === 0 ? headHeight : 0),
  );
  refuseBook(pages.length, "chart");

  const { document } = text;
  const finished = pdfBytes(document);
  const set = (line: string, face: SheetFace, color: string, y: number, x = marginPt, at = size) =>
    text.draw(textPiece(line, { x, y, size: at, face, tone: "ink" }), color);
  for (const [k, page] of pages.entries()) {
    document.addPage();
    let y = marginPt;
    if (k === 0) {
      for (const line of head) set(line, "title", ink, (y += titleSize * 1.2) - 4, marginPt, titleSize);
      if (key) set(glyphs(keyWords(key)), "mono", soft, (y += 18) - 4);
      y += 12;
    }
    for (const { row, top, height: high } of page) {
      const bottom = y + top + high;
      if (row.kind === "sung") set(signLine(row), "monoBold", plum, bottom - 18);
      if (row.kind === "chords") set(signLine(row), "monoBold", plum, bottom - 4);
      else if (row.kind === "heading") set(row.words, "monoBold", ink, bottom - 5);
      else set(row.words, "mono", row.kind === "remark" ? soft : ink, bottom - 4);
    }
    const number = `${k + 1} / ${pages.length}`;
    set(number, "mono", soft, height - 30, (width - number.length * 9 * cellWidth) / 2, 9);
  }
  document.end();
  return finished;
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
