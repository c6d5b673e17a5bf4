import { readFileSync } from "node:fs";
import path from "node:path";
import PDFDocument from "pdfkit";
import type { SheetFace, SheetText } from "../../shared/sheets/sheetPiece";
import { writeGlyphsFromOutlines } from "./webFontGlyphs";

const files: Record<SheetFace | "music", string> = {
  mono: "sometype-mono-latin-400-normal",
  monoBold: "sometype-mono-latin-600-normal",
  title: "bricolage-grotesque-latin-700-normal",
  text: "figtree-latin-400-normal",
  textBold: "figtree-latin-600-normal",
  music: "noto-music-music-400-normal",
};
const folder = path.resolve(__dirname, "../../fonts");

const isMusic = (sign: string) => /[♯♭♮]/.test(sign);

interface Glyph {
  advanceWidth: number;
}

interface Embedded {
  font: {
    unitsPerEm: number;
    hasGlyphForCodePoint(point: number): boolean;
    glyphsForString(text: string): Glyph[];
    layout(text: string): { glyphs: Glyph[]; positions: object[]; advanceWidth: number };
  };
  subset: object;
}

/** A PDF whose text is set from the product's own fonts, accidentals from the music font. */
export class PrintedText {
  readonly document: PDFKit.PDFDocument;

  constructor(title: string, size: "A4" | "Letter") {
    this.document = new PDFDocument({
      size: size === "A4" ? "A4" : "LETTER",
      margin: 0,
      autoFirstPage: false,
      lang: "en",
      displayTitle: true,
      info: { Title: title, Creator: "Larkspan" },
    });
    for (const [name, file] of Object.entries(files)) {
      this.document.registerFont(name, readFileSync(path.join(folder, `${file}.woff2`)));
      const { font, subset } = this.embedded(name);
      writeGlyphsFromOutlines(subset);
      // Set one by one, as the layout has counted them: without what letters do to one another.
      font.layout = (text) => oneByOne(font.glyphsForString(text));
    }
  }

  /** The text with what a face can set: accents it does not know fall off, other strange signs become "?". */
  printable(text: string, face: SheetFace): string {
    const has = (sign: string) => isMusic(sign) || this.hasGlyph(sign, face);
    let printed = "";
    for (const sign of text.normalize("NFC")) {
      if (sign === "\n" || has(sign)) printed += sign;
      else if (/\s/.test(sign)) printed += " ";
      else if (!/[\p{Cc}\p{Cf}\p{M}]/u.test(sign)) printed += plainLetter(sign, has);
    }
    return printed;
  }

  /** Draws one line where it was laid. */
  draw({ runs, face }: SheetText, color: string): void {
    for (const { text, x, y, size, music } of runs) {
      const shown = music ? text : this.printable(text, face);
      if (shown.trim() === "") continue;
      this.document
        .font(music ? "music" : face)
        .fontSize(size)
        .fillColor(color)
        .text(shown, x, y, { lineBreak: false, baseline: "alphabetic" });
    }
  }

  private hasGlyph(sign: string, face: SheetFace): boolean {
    const point = sign.codePointAt(0) ?? 0;
    return point >= 32 && this.embedded(face).font.hasGlyphForCodePoint(point);
  }

  /** pdfkit's types leave out the font that is set. */
  private embedded(name: string): Embedded {
    return (this.document.font(name) as unknown as { _font: Embedded })._font;
  }
}

function oneByOne(glyphs: Glyph[]) {
  const positions = glyphs.map(({ advanceWidth }) => ({ xAdvance: advanceWidth, yAdvance: 0, xOffset: 0, yOffset: 0 }));
  return { glyphs, positions, advanceWidth: positions.reduce((sum, { xAdvance }) => sum + xAdvance, 0) };
}

function plainLetter(sign: string, has: (sign: string) => boolean): string {
  const base = sign.normalize("NFKD").charAt(0);
  return base !== sign && base !== "" && has(base) ? base : "?";
}
