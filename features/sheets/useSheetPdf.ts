import { useMutation } from "@tanstack/react-query";
import { fileStem } from "@/features/api/fileStem";
import { printedPdf } from "@/features/api/printedPdf";
import { saveFile } from "@/features/api/saveFile";
import type { Sheet, SheetOptions } from "@/shared/sheets/sheet";

const longestMs = 60_000;

/** Fetches the sheet as a PDF, exactly as the screen lays it out, and hands it to the browser to be saved. */
export function useSheetPdf() {
  return useMutation({
    mutationFn: async (of: { sheet: Sheet; options: SheetOptions }) => {
      const blob = await printedPdf("/sheets/pdf", of, AbortSignal.timeout(longestMs));
      saveFile({ name: `${fileStem(of.sheet.title)}.pdf`, blob });
    },
  });
}
