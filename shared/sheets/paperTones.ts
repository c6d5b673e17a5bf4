import type { SheetTone } from "./sheetPiece";

/**
 * The tones of drawn pieces on paper, which is white in the evening too; the same on the screen's pages, in print and in
 * the PDF.
 *
 * @example paperTones.paper // => "#FFFFFF"
 */
export const paperTones: Readonly<Record<SheetTone, string>> = {
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
