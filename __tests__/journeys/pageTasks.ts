import type { Page } from "playwright-core";

interface TraceEvent {
  name: string;
  pid: number;
  tid: number;
  /** processor time, µs */
  tdur?: number;
  args: { name?: string };
}

/**
 * Processor time in ms of each task that the page's own thread ran meanwhile, longest first. The clock on the wall also
 * counts what other programs took; this does not.
 */
export async function pageTasks(page: Page, work: () => Promise<void>): Promise<number[]> {
  const session = await page.context().newCDPSession(page);
  const events: TraceEvent[] = [];
  session.on("Tracing.dataCollected", ({ value }) => events.push(...(value as unknown as TraceEvent[])));
  await session.send("Tracing.start", {
    transferMode: "ReportEvents",
    traceConfig: { includedCategories: ["toplevel", "disabled-by-default-devtools.timeline"] },
  });
  await work();
  const complete = new Promise<void>((done) => session.once("Tracing.tracingComplete", () => done()));
  await session.send("Tracing.end");
  await complete;
  await session.detach();
  const own = new Set(
    events
      .filter(({ name, args }) => name === "thread_name" && args.name === "CrRendererMain")
      .map(({ pid, tid }) => `${pid} ${tid}`),
  );
  return events
    .filter(({ name, pid, tid }) => name.endsWith("RunTask") && own.has(`${pid} ${tid}`))
    .map(({ tdur }) => (tdur ?? 0) / 1000)
    .sort((a, b) => b - a);
}
