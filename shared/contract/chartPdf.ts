import { z } from "zod";
import { song } from "./song";

/** A chart to be set as a PDF. */
export const chartPdfRequest = z.strictObject({
  title: song.shape.title,
  chart: song.shape.chart,
  /** said under the title, where it is known */
  key: song.shape.writtenKey.exactOptional(),
  paper: z.enum(["A4", "Letter"]),
});
export type ChartPdfRequest = z.infer<typeof chartPdfRequest>;
