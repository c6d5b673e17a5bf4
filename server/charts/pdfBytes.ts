import { HttpProblem } from "../http/httpProblem";

const mostPages = 100;

/** All that a PDF writes, once it is ended. */
export function pdfBytes(document: PDFKit.PDFDocument): Promise<Buffer> {
  const chunks: Buffer[] = [];
  return new Promise((resolve, reject) => {
    document.on("data", (chunk: Buffer) => chunks.push(chunk));
    document.on("end", () => resolve(Buffer.concat(chunks)));
    document.on("error", reject);
  });
}

/** Refuses what would fill a book. */
export function refuseBook(pages: number, path: string): void {
  if (pages > mostPages)
    throw new HttpProblem(422, "invalid", `This chart would fill more than ${mostPages} pages.`, [
      { path, message: "Make the chart shorter." },
    ]);
}
