import type { DataSource } from "typeorm";
import { chartPdfRequest } from "../../shared/contract/chartPdf";
import type { Api } from "../http/api";
import { HttpProblem } from "../http/httpProblem";
import { parse } from "../http/parse";
import { TryBucket } from "../http/tryBucket";
import { chartPdf } from "./chartPdf";

const mostBytes = 200_000;
const mostInAMinute = 60;

/** Charts on paper. Nothing is kept. */
export function chartsRoutes(api: Api, dataSource: DataSource): void {
  const limit = new TryBucket(dataSource, "chart-pdf", mostInAMinute, 60);
  api.route(
    {
      method: "post",
      path: "/charts/pdf",
      tag: "charts",
      summary: "A chart as a PDF, chords over their syllables",
      signedIn: false,
      body: { name: "ChartPdfRequest", schema: chartPdfRequest },
      answers: {
        200: { description: "The PDF.", mediaType: "application/pdf" },
        413: { description: "The chart is larger than 200 kB (too-large)." },
        422: { description: "Does not fit the schema, or would fill more than 100 pages (invalid)." },
        429: { description: "Asked too often (too-many-tries); Retry-After tells the seconds to wait." },
      },
    },
    async (req, res) => {
      const request = parse(chartPdfRequest, req.body);
      if (Buffer.byteLength(request.chart) > mostBytes)
        throw new HttpProblem(413, "too-large", "This is too large: a chart to print may have at most 200 kB.");
      await limit.take(req.ip ?? "");
      const pdf = await chartPdf(request);
      res
        .attachment(`${fileNameOf(request.title)}.pdf`)
        .type("application/pdf")
        .send(pdf);
    },
  );
}

/** A title without what no file name may hold. */
function fileNameOf(title: string): string {
  const name = title
    .replace(/[\p{C}<>:"/\\|?*]/gu, " ")
    .replace(/\s+/g, " ")
    .trim();
  return name === "" ? "Song" : name.slice(0, 80).toWellFormed();
}
