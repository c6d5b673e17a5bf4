import { tokens } from "@/features/ui/theme";
import type { SheetTone } from "@/shared/sheets/sheetPiece";

/** Paper is white in the evening too. */
const { ink, inkSoft, line, plum, lagoon, onPlum } = tokens.morning;
export const onPaper: Record<SheetTone, string> = { ink, soft: inkSoft, line, plum, lagoon, paper: "#FFFFFF", onPlum };
