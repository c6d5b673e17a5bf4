import { render, screen } from "@testing-library/react";
import { parseChart } from "@/shared/songs/chart";
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

test("sections are headings and words without chords are there", () => {
  render(<ChartView chart={parseChart(text)} level={3} />);
  expect(screen.getByRole("heading", { level: 3, name: "Verse 1" })).toBeTruthy();
  expect(screen.getByTestId("chart").textContent).toContain("plain words stay");
});

test("a chart of nothing shows nothing", () => {
  render(<ChartView chart={parseChart("")} />);
  expect(screen.getByTestId("chart").textContent).toBe("");
});
