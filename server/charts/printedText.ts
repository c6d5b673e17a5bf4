import { readFileSync } from "node:fs";
import path from "node:path";
import PDFDocument from "pdfkit";
import { writeGlyphsFromOutlines } from "./webFontGlyphs";

export type Face = "mono" | "monoBold" | "title";

const files = {
  mono: "sometype-mono-latin-400-normal",
  monoBold: "sometype-mono-latin-600-normal",
  title: "bricolage-grotesque-latin-700-normal",
  music: "noto-music-music-400-normal",
};
const folder = path.resolve(__dirname, "../../fonts");

/** Every letter of the monospaced face is so wide, in parts of its size. */
export const cellWidth = 0.58;

const isMusic = (sign: string) => /[♯♭♮]/.test(sign);

interface Place {
  face: Face;
  size: number;
  color: string;
  x: number;
  /** of the base line */
  y: number;
}

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

/** The music font's signs are small beside letters, and its sharp hangs low. */
const musicScale = 1.25;
const lift = (sign: string) => (sign === "♭" ? 0 : 0.14);

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
      if (name !== "title") font.layout = (text) => oneByOne(font.glyphsForString(text));
    }
  }

  /** The text with what a face can set: accents it does not know fall off, other strange signs become "?". */
  printable(text: string, face: Face): string {
    const has = (sign: string) => isMusic(sign) || this.hasGlyph(sign, face);
    let printed = "";
    for (const sign of text.normalize("NFC")) {
      if (sign === "\n" || has(sign)) printed += sign;
      else if (/\s/.test(sign)) printed += " ";
      else if (!/[\p{Cc}\p{Cf}\p{M}]/u.test(sign)) printed += plainLetter(sign, has);
    }
    return printed;
  }

  width(text: string, face: Face, size: number): number {
    return runsOf(text).reduce((sum, { run, music }) => sum + this.runWidth(run, music ? "music" : face, size), 0);
  }

  /** Sets one line; in the monospaced faces every sign has its column. */
  line(text: string, { face, size, color, x, y }: Place): void {
    const cell = face === "title" ? null : size * cellWidth;
    let at = x;
    for (const { run, music } of runsOf(text)) {
      for (const piece of music ? [...run] : [run]) {
        const natural = this.runWidth(piece, music ? "music" : face, size);
        const room = cell === null ? natural : cell * piece.length;
        const inset = music ? (room - natural) / 2 : 0;
        if (piece.trim() !== "")
          this.document
            .font(music ? "music" : face)
            .fontSize(music ? size * musicScale : size)
            .fillColor(color)
            .text(piece, at + inset, music ? y - size * lift(piece) : y, { lineBreak: false, baseline: "alphabetic" });
        at += room;
      }
    }
  }

  /** Without what letters do to one another: that takes long for long words, and changes little. */
  private runWidth(run: string, name: Face | "music", size: number): number {
    const { font } = this.embedded(name);
    const units = font.glyphsForString(run).reduce((sum, { advanceWidth }) => sum + advanceWidth, 0);
    return (units / font.unitsPerEm) * (name === "music" ? size * musicScale : size);
  }

  private hasGlyph(sign: string, face: Face): boolean {
    const point = sign.codePointAt(0) ?? 0;
    return point >= 32 && this.embedded(face).font.hasGlyphForCodePoint(point);
  }

  /** pdfkit's types leave out the font that is set. */
  private embedded(name: string): Embedded {
    return (this.document.font(name) as unknown as { _font: Embedded })._font;
  }
}

/** In the monospaced and the music font no sign depends on its neighbours. */
function oneByOne(glyphs: Glyph[]) {
  const positions = glyphs.map(({ advanceWidth }) => ({ xAdvance: advanceWidth, yAdvance: 0, xOffset: 0, yOffset: 0 }));
  return { glyphs, positions, advanceWidth: positions.reduce((sum, { xAdvance }) => sum + xAdvance, 0) };
}

function plainLetter(sign: string, has: (sign: string) => boolean): string {
  const base = sign.normalize("NFKD").charAt(0);
  return base !== sign && base !== "" && has(base) ? base : "?";
}

function runsOf(text: string): { run: string; music: boolean }[] {
  return [...text.matchAll(/[♯♭♮]+|[^♯♭♮]+/g)].map(([run]) => ({ run, music: isMusic(run) }));
}
