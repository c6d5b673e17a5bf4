import type { SheetTone } from "@/shared/sheets/sheetPiece";
import { colors } from "./theme";

/** The tones of drawn pieces on the page, which follow the light. */
export const pieceTones: Record<SheetTone, string> = {
  ink: colors.ink,
  soft: colors.inkSoft,
  line: colors.line,
  plum: colors.plum,
  lagoon: colors.lagoon,
  paper: colors.paper,
  onPlum: colors.onPlum,
};
