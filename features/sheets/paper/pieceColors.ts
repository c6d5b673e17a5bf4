import { colors, tokens } from "@/features/ui/theme";
import type { SheetTone } from "@/shared/sheets/sheetPiece";

/** Paper is white in the evening too. */
const { ink, inkSoft, line, plum, lagoon, onPlum } = tokens.morning;
export const onPaper: Record<SheetTone, string> = { ink, soft: inkSoft, line, plum, lagoon, paper: "#FFFFFF", onPlum };

/** The same on the page, which follows the light. */
export const onScreen: Record<SheetTone, string> = {
  ink: colors.ink,
  soft: colors.inkSoft,
  line: colors.line,
  plum: colors.plum,
  lagoon: colors.lagoon,
  paper: colors.paper,
  onPlum: colors.onPlum,
};
