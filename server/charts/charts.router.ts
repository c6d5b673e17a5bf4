import type { Response } from "express";
import type { DataSource } from "typeorm";
import { chartPdfRequest } from "../../shared/contract/chartPdf";
import { sheetPdfRequest } from "../../shared/contract/sheetPdf";
import type { Api } from "../http/api";
import { HttpProblem } from "../http/httpProblem";
import { parse } from "../http/parse";
import { TryBucket } from "../http/tryBucket";
import { chartPdf } from "./chartPdf";
import { sheetPdf } from "./sheetPdf";

const mostBytes = 200_000;
const mostInAMinute = 60;

const answers = {
  200: { description: "The PDF.", mediaType: "application/pdf" },
  413: { description: "The chart is larger than 200 kB (too-large)." },
  422: { description: "Does not fit the schema, or would fill more than 100 pages (invalid)." },
  429: { description: "Asked too often (too-many-tries); Retry-After tells the seconds to wait." },
};

/** Charts and sheets on paper. Nothing is kept. */
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
      answers,
    },
    async (req, res) => {
      const request = parse(chartPdfRequest, req.body);
      refuseLarge(request.chart);
      await limit.take(req.ip ?? "");
      send(res, request.title, await chartPdf(request));
    },
  );
  api.route(
    {
      method: "post",
      path: "/sheets/pdf",
      tag: "charts",
      summary: "A sheet as a PDF, page by page as the screen lays it out",
      signedIn: false,
      body: { name: "SheetPdfRequest", schema: sheetPdfRequest },
      answers,
    },
    async (req, res) => {
      const request = parse(sheetPdfRequest, req.body);
      refuseLarge(request.sheet.chart);
      await limit.take(req.ip ?? "");
      send(res, request.sheet.title, await sheetPdf(request));
    },
  );
}

function refuseLarge(chart: string): void {
  if (Buffer.byteLength(chart) > mostBytes)
    throw new HttpProblem(413, "too-large", "This is too large: a chart to print may have at most 200 kB.");
}

function send(res: Response, title: string, pdf: Buffer): void {
  res
    .attachment(`${fileNameOf(title)}.pdf`)
    .type("application/pdf")
    .send(pdf);
}

/** A title without what no file name may hold. */
function fileNameOf(title: string): string {
  const name = title
    .replace(/[\p{C}<>:"/\\|?*]/gu, " ")
    .replace(/\s+/g, " ")
    .trim();
  return name === "" ? "Song" : name.slice(0, 80).toWellFormed();
}
