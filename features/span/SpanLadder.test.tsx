import { fireEvent, render, screen } from "@testing-library/react";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import { KeySpan } from "./KeySpan";
import { isNamed, keySpanWidth, keySpanX, markHeight, seamless } from "./keySpanGeometry";
import { isNatural, zoneOf } from "./ladderGeometry";
import { shiftForDrag, shiftForKey, shiftWords } from "./ShiftHandle";
import { SpanLadder } from "./SpanLadder";
import { stripX, VoiceStrip } from "./VoiceStrip";

const voice: SingingVoice = { range: { lowMidi: 53, highMidi: 72 }, comfort: { lowMidi: 55, highMidi: 69 } };
const marks: KeyMark[] = [60, 70, 74].map((midi, index) => ({
  midi,
  share: [0.6, 0.3, 0.1][index] ?? 0,
  zone: zoneOf(midi, voice),
  home: index === 0,
}));

describe("SpanLadder", () => {
  it("is one picture with its words", () => {
    render(<SpanLadder voice={voice} marks={marks} step={18} width={358} />);
    expect(screen.getByRole("img").getAttribute("aria-label")).toContain("Comfortable from G3 to A4");
  });

  it("shows zones by form: solid, hatched, dotted with a triangle", () => {
    const { container } = render(<SpanLadder voice={voice} marks={marks} step={18} width={358} />);
    const bars = Array.from(container.querySelectorAll('rect[x="116"],rect[x="116.75"]'));
    expect(bars.map((bar) => [bar.getAttribute("fill")?.replace(/#\w+/, "#"), bar.getAttribute("stroke")])).toEqual([
      ["var(--ink)", null],
      ["url(#)", "var(--honey)"],
      ["none", "var(--brick)"],
    ]);
    expect(container.querySelectorAll('path[fill="var(--brick)"]')).toHaveLength(1);
  });

  it("marks the home note with a dot", () => {
    const { container } = render(<SpanLadder voice={voice} marks={marks} step={18} width={358} />);
    expect(container.querySelectorAll("circle")).toHaveLength(1);
  });

  it("can be drawn without a voice", () => {
    render(<SpanLadder voice={null} marks={marks} step={12} width={166} />);
    expect(screen.getByRole("img").getAttribute("aria-label")).toBe("Notes from C4 to D5.");
  });

  it("moves the song by the arrow keys, one semitone each, within its limits", () => {
    const onChange = jest.fn();
    render(
      <SpanLadder
        voice={voice}
        marks={marks}
        step={15}
        width={300}
        shift={{ value: 3, min: -11, max: 4, name: "F", onChange }}
      />,
    );
    const handle = screen.getByRole("slider", { name: "Move the song" });
    expect(handle.getAttribute("aria-valuetext")).toBe("F, 3 up");
    fireEvent.keyDown(handle, { key: "ArrowUp" });
    fireEvent.keyDown(handle, { key: "ArrowDown" });
    fireEvent.keyDown(handle, { key: "PageUp" });
    fireEvent.keyDown(handle, { key: "a" });
    expect(onChange.mock.calls).toEqual([[4], [2], [4]]);
  });
});

describe("the shift", () => {
  const limits = { min: -11, max: 12 };

  it("snaps a drag to semitones: up on the screen is up in pitch", () => {
    expect(shiftForDrag(0, -31, 15, limits)).toBe(2);
    expect(shiftForDrag(0, 7, 15, limits)).toBe(0);
    expect(shiftForDrag(0, 1000, 15, limits)).toBe(-11);
  });

  it("knows its keys", () => {
    expect(shiftForKey("Home", { value: 2, ...limits })).toBe(-11);
    expect(shiftForKey("End", { value: 2, ...limits })).toBe(12);
    expect(shiftForKey("Tab", { value: 2, ...limits })).toBeNull();
  });

  it.each([
    [0, "as written"],
    [5, "5 up"],
    [-2, "2 down"],
  ])("says %i as %s", (value, words) => {
    expect(shiftWords(value)).toBe(words);
  });
});

describe("VoiceStrip", () => {
  it("keeps one scale: the same pitch stands in the same place", () => {
    const scale = { low: 52, high: 75 };
    expect(stripX(52, scale, 120)).toBe(2.5);
    expect(stripX(75, scale, 120)).toBe(117.5);
  });

  it("says what it shows", () => {
    render(
      <VoiceStrip voice={voice} marks={marks} scale={{ low: 49, high: 78 }} summary="In C: all of it sits well." />,
    );
    expect(screen.getByRole("img", { name: "In C: all of it sits well." })).toBeTruthy();
  });
});

describe("KeySpan", () => {
  it("has 14.4 px for each semitone, with room for the names at both ends", () => {
    const scale = { low: 48, high: 76 };
    expect(keySpanX(61, scale, 14.4) - keySpanX(60, scale, 14.4)).toBeCloseTo(14.4, 9);
    expect(keySpanWidth(scale, 14.4)).toBeCloseTo(432, 9);
  });

  it("stands the longest note 36 tall and none under 8", () => {
    expect(markHeight(0.2, 0.2, 36)).toBe(36);
    expect(markHeight(0.001, 0.2, 36)).toBe(8);
  });

  it.each([45, 46, 50, 51])("repeats its hatch a whole number of times in a row of %i", (height) => {
    const lines = height / (seamless(height, 7).pitch * Math.SQRT2);
    expect(Math.abs(lines - Math.round(lines))).toBeLessThan(1e-9);
  });

  it.each([14.4, 9, 8, 5, 3, 1.5])(
    "names no two notes closer than their letters at %f px a semitone",
    (perSemitone) => {
      const naturals = Array.from({ length: 85 }, (_, k) => 24 + k).filter(isNatural);
      const named = naturals.filter((midi) => isNamed(midi, perSemitone));
      expect(named.length).toBeGreaterThan(1);
      const gaps = named.slice(1).map((midi, k) => (midi - named[k]!) * perSemitone);
      expect(Math.min(...gaps)).toBeGreaterThanOrEqual(9);
    },
  );

  it("names both ends, and marks the one beyond with a triangle", () => {
    const { container } = render(
      <KeySpan voice={voice} marks={marks} scale={{ low: 48, high: 78 }} spelling="flats" />,
    );
    expect(Array.from(container.querySelectorAll("text")).map((text) => text.textContent)).toEqual(["C4", "D5"]);
    expect(container.querySelectorAll('path[fill="var(--brick)"]')).toHaveLength(1);
  });
});
