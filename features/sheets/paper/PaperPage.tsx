import { memo, type CSSProperties } from "react";
import { paperTones } from "@/shared/sheets/paperTones";
import type { SheetPage } from "@/shared/sheets/sheetPages";
import { Piece } from "./Piece";

export interface PaperPageProps {
  page: SheetPage;
  style?: CSSProperties;
}

/** One page as it will come out of the printer, as large as its room is wide. */
export const PaperPage = memo(function PaperPage({ page, style }: PaperPageProps) {
  const { width, height, number, of, pieces } = page;
  return (
    <svg
      role="group"
      aria-label={`Page ${number} of ${of}`}
      data-testid="paper-page"
      viewBox={`0 0 ${width} ${height}`}
      style={{ display: "block", width: "100%", background: paperTones.paper, ...style }}
    >
      {pieces.map((piece, index) => (
        <Piece key={index} piece={piece} colors={paperTones} />
      ))}
    </svg>
  );
});
