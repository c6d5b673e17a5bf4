import type { SheetPdfRequest } from "../../shared/contract/sheetPdf";
import { paperTones } from "../../shared/sheets/paperTones";
import { sheetPages } from "../../shared/sheets/sheetPages";
import type { SheetPiece } from "../../shared/sheets/sheetPiece";
import { pdfBytes, refuseBook } from "./pdfBytes";
import { PrintedText } from "./printedText";

/** The layout counts 96 to the inch, a PDF 72. */
const scale = 0.75;

/** Draws the pages of a sheet, as the screen shows them. Refuses one that would fill a book. */
export async function sheetPdf({ sheet, options }: SheetPdfRequest): Promise<Buffer> {
  const pages = sheetPages(sheet, options);
  refuseBook(pages.length, "sheet.chart");
  const text = new PrintedText(sheet.title, options.paper);
  const { document } = text;
  const finished = pdfBytes(document);
  for (const { pieces } of pages) {
    document.addPage();
    document.save().scale(scale);
    for (const piece of pieces) draw(text, piece);
    document.restore();
  }
  document.end();
  return finished;
}

function draw(text: PrintedText, piece: SheetPiece): void {
  const { document } = text;
  switch (piece.kind) {
    case "text":
      text.draw(piece, paperTones[piece.tone]);
      break;
    case "picture":
      for (const part of piece.pieces) draw(text, part);
      break;
    case "line":
      document
        .lineWidth(piece.width)
        .lineCap("round")
        .moveTo(piece.x1, piece.y1)
        .lineTo(piece.x2, piece.y2)
        .stroke(paperTones[piece.tone]);
      break;
    case "box":
      document.roundedRect(piece.x, piece.y, piece.width, piece.height, piece.radius).fill(paperTones[piece.tone]);
      break;
    case "dot":
      document.circle(piece.x, piece.y, piece.radius);
      if (piece.stroke === null) document.fill(paperTones[piece.tone]);
      else document.lineWidth(piece.stroke).stroke(paperTones[piece.tone]);
  }
}
