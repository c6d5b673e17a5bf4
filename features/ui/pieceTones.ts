import type { SheetTone } from "@/shared/sheets/sheetPiece";
import { colors, mixtures } from "./theme";

/** The tones of drawn pieces on the page, which follow the light. */
export const pieceTones: Record<SheetTone, string> = {
  ink: colors.ink,
  soft: colors.inkSoft,
  line: colors.line,
  plum: colors.plum,
  lagoon: colors.lagoon,
  comfort: mixtures.tint,
  reach: colors.honey,
  paper: colors.paper,
  onPlum: colors.onPlum,
};
