import { tokens } from "@/features/ui/theme";
import type { SheetTone } from "@/shared/sheets/sheetPiece";

/** Paper is white in the evening too. */
const { ink, inkSoft, line, plum, lagoon, honey, onPlum } = tokens.morning;
export const onPaper: Record<SheetTone, string> = {
  ...{ ink, soft: inkSoft, line, plum, lagoon, onPlum },
  paper: "#FFFFFF",
  comfort: "#E1EFEE",
  reach: honey,
};
