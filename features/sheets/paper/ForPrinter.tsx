import { createPortal } from "react-dom";
import { paperSizes, type SheetOptions } from "@/shared/sheets/sheet";
import type { SheetPage } from "@/shared/sheets/sheetPages";
import { PaperPage } from "./PaperPage";

export interface ForPrinterProps {
  pages: readonly SheetPage[];
  paper: SheetOptions["paper"];
}

/**
 * What the browser prints instead of the page around it: the sheet's own pages, nothing else, one on each piece of paper.
 * They stand outside of the page, whose layout would cut them.
 */
export function ForPrinter({ pages, paper }: ForPrinterProps) {
  const { width, height } = paperSizes[paper];
  const css = `.for-printer{display:none}
@page{size:${paper === "A4" ? "A4" : "letter"};margin:0}
@media print{body>:not(.for-printer){display:none!important}html,body{background:#fff;margin:0}
.for-printer{display:block}.for-printer svg{width:${width}px!important;height:${height}px;break-after:page;break-inside:avoid}
.for-printer svg:last-of-type{break-after:auto}}`;
  return createPortal(
    <div className="for-printer" aria-hidden data-testid="for-printer">
      <style>{css}</style>
      {pages.map((page) => (
        <PaperPage key={page.number} page={page} />
      ))}
    </div>,
    document.body,
  );
}
