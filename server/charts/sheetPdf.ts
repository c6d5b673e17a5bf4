import type { SheetPdfRequest } from "../../shared/contract/sheetPdf";
import { sheetPages } from "../../shared/sheets/sheetPages";
import type { SheetPiece, SheetTone } from "../../shared/sheets/sheetPiece";
import { pdfBytes, refuseBook } from "./pdfBytes";
import { PrintedText } from "./printedText";

/** The layout counts 96 to the inch, a PDF 72. */
const scale = 0.75;

const colors: Record<SheetTone, string> = {
  ink: "#241C33",
  soft: "#5D5370",
  line: "#E3DACB",
  plum: "#6A2C70",
  lagoon: "#1F7A74",
  comfort: "#E1EFEE",
  reach: "#B9770E",
  paper: "#FFFFFF",
  onPlum: "#FFFFFF",
};

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
      text.draw(piece, colors[piece.tone]);
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
        .stroke(colors[piece.tone]);
      break;
    case "box":
      document.roundedRect(piece.x, piece.y, piece.width, piece.height, piece.radius).fill(colors[piece.tone]);
      break;
    case "dot":
      document.circle(piece.x, piece.y, piece.radius);
      if (piece.stroke === null) document.fill(colors[piece.tone]);
      else document.lineWidth(piece.stroke).stroke(colors[piece.tone]);
  }
}
