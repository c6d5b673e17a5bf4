import { act, render, screen, waitFor } from "@testing-library/react";
import { parseChart } from "@/shared/songs/chart";
import * as cells from "./chartCells";
import { ChartView } from "./ChartView";

const text = "Verse 1\nF#m            D\nLantern on the slipway\n\nplain words stay";

test("chords stand in the column of their syllable, with glyphs", () => {
  render(<ChartView chart={parseChart(text)} />);
  const chord = screen.getByText(/^F/);
  expect(chord.textContent).toBe("F♯m");
  expect(chord.style.left).toBe("0ch");
  const cell = screen.getByText("D").parentElement?.parentElement;
  expect(cell?.textContent).toBe("Dslipway");
});

test("a chord inside a word keeps its column within the word's cell", () => {
  render(<ChartView chart={parseChart("   Am\nharbour")} />);
  expect(screen.getByText("Am").style.left).toBe("3ch");
});

test("tabs count to the next eighth column, over the words and in them", () => {
  render(<ChartView chart={parseChart("G\t\tC\t Am\nLow tide and\tthe harbour sleeps")} />);
  expect(screen.getByText("C").parentElement?.parentElement?.textContent).toBe("Cthe ");
  expect(screen.getByText("Am").parentElement?.parentElement?.textContent).toBe("Amharbour ");
  expect(screen.getByText("Am").style.left).toBe("5ch");
  expect(screen.getByTestId("chart").textContent).not.toContain("\t");
});

test("sections are headings and words without chords are there", () => {
  render(<ChartView chart={parseChart(text)} level={3} />);
  expect(screen.getByRole("heading", { level: 3, name: "Verse 1" })).toBeTruthy();
  expect(screen.getByTestId("chart").textContent).toContain("plain words stay");
});

test("a chart of nothing shows nothing", () => {
  render(<ChartView chart={parseChart("")} />);
  expect(screen.getByTestId("chart").textContent).toBe("");
});

test("what was not read is marked, in words too", () => {
  render(<ChartView chart={parseChart("G   H7   D\nlow tide and still")} />);
  const sign = screen.getByTitle(/Not read as a chord/);
  expect(sign.textContent).toBe("H7, not read");
  expect(sign.style.textDecoration).toContain("dotted");
  expect(screen.getAllByTitle(/Not read/)).toHaveLength(1);
});

const long = "G   C   D   G\nLow tide and still\n".repeat(500);
const drawn = () => screen.getByTestId("chart").textContent?.match(/Low/g)?.length;

test("a long chart is drawn whole, or as far as is asked for", async () => {
  const { unmount } = render(<ChartView chart={parseChart(long)} />);
  await waitFor(() => expect(drawn()).toBe(500));
  unmount();
  render(<ChartView chart={parseChart(long)} most={200} />);
  await act(async () => undefined);
  expect(drawn()).toBe(200);
});

test("a letter more in a long chart draws its own line only", () => {
  const asked: string[] = [];
  const before = cells.chartCells;
  const spy = jest.spyOn(cells, "chartCells").mockImplementation((lyrics, chords) => {
    asked.push(lyrics);
    return before(lyrics, chords);
  });
  const { rerender } = render(<ChartView chart={parseChart(long)} most={100} />);
  asked.length = 0;
  rerender(<ChartView chart={parseChart(long.replace("still", "stills"))} most={100} />);
  expect(asked).toEqual(["Low tide and stills"]);
  spy.mockRestore();
});
