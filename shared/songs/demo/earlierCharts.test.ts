import { parseChart } from "../chart";
import { demoSongs } from "../demoSongs";
import { earlierCharts } from "./earlierCharts";

const to = Date.parse("2026-03-19T18:30:00.000Z");

test("each earlier chart stood for its days, up to the present one", () => {
  const earlier = [
    { chart: "D", days: 6 },
    { chart: "D A", days: 7 },
  ];
  expect(earlierCharts({ earlier }, to)).toEqual([
    { chart: "D", savedAt: "2026-03-06T18:30:00.000Z" },
    { chart: "D A", savedAt: "2026-03-12T18:30:00.000Z" },
  ]);
  expect(earlierCharts({}, to)).toEqual([]);
});

test("one song of the demonstration grew in the class: every state reads, none is like the next", () => {
  const [song] = demoSongs.filter(({ earlier }) => earlier !== undefined);
  const charts = [...earlierCharts(song!, to).map(({ chart }) => chart), song!.chart];
  expect(charts.length).toBeGreaterThanOrEqual(3);
  expect(new Set(charts).size).toBe(charts.length);
  for (const chart of charts) expect(parseChart(chart).unread).toEqual([]);
});
