import { render, screen } from "@testing-library/react";
import { splitSigns } from "./textSigns";
import { fontFaceCss, musicRange } from "./fontFaces";
import { Heading } from "./Heading";
import { SvgLabel } from "./SvgLabel";
import { Text } from "./Text";
import { fonts, themeCss } from "./theme";

describe("splitSigns", () => {
  it.each([
    ["F♯m", ["F", "♯", "m"]],
    ["B♭3 to F♯4", ["B", "♭", "3 to F", "♯", "4"]],
    ["𝄫", ["𝄫"]],
    ["no sign", ["no sign"]],
    ["", []],
  ])("cuts %j at its accidentals", (text, parts) => {
    expect(splitSigns(text).map((part) => part.text)).toEqual(parts);
  });

  it("loses no sign of the text", () => {
    const text = "♭B♭ ♯♮𝄪x";
    expect(
      splitSigns(text)
        .map((part) => part.text)
        .join(""),
    ).toBe(text);
  });
});

describe("Text", () => {
  it("sets each accidental in a span of its own that the sheet gives the music font", () => {
    render(<Text testID="line">Capo 1, shapes of B♭ and F♯m</Text>);
    const line = screen.getByTestId("line");
    expect(line.textContent).toBe("Capo 1, shapes of B♭ and F♯m");
    const signs = Array.from(line.querySelectorAll("span.mu")).map((sign) => sign.textContent);
    expect(signs).toEqual(["♭", "♯"]);
    expect(themeCss).toContain(`span.mu{font-family:${fonts.music}`);
  });

  it("draws ▲ and ▼, which no shipped font has, and keeps them as words", () => {
    render(<Text testID="line">▲ 2 and ▼ 1</Text>);
    const line = screen.getByTestId("line");
    expect(line.textContent).toBe("▲ 2 and ▼ 1");
    expect(Array.from(line.querySelectorAll("span.tri")).map((arrow) => arrow.className)).toEqual(["tri up", "tri"]);
    expect(themeCss).toContain("span.tri.up{clip-path");
  });

  it("sets accidentals in headings too", () => {
    render(<Heading level={1}>Ways to play E♭</Heading>);
    const heading = screen.getByRole("heading", { level: 1 });
    expect(heading.tagName).toBe("H1");
    expect(heading.querySelector("span.mu")?.textContent).toBe("♭");
  });

  it("sets accidentals inside drawings too", () => {
    const { container } = render(
      <svg>
        <SvgLabel x={0} y={0}>
          C♯5
        </SvgLabel>
      </svg>,
    );
    const sign = Array.from(container.querySelectorAll("tspan")).find((part) => part.textContent === "♯");
    expect(sign?.style.fontFamily).toContain("Noto Music");
  });

  it("names the music font in every stack", () => {
    for (const stack of [fonts.display, fonts.text, fonts.mono, fonts.music]) expect(stack).toContain("Noto Music");
  });
});

describe("the shipped fonts", () => {
  const css = fontFaceCss();

  it("hold one rule for each face, all swapping in when they come", () => {
    expect(css.match(/@font-face/g)).toHaveLength(8);
    expect(css.match(/font-display:swap/g)).toHaveLength(8);
  });

  it("limit the music font to the accidentals", () => {
    expect(css).toContain(`font-family:"Noto Music";font-weight:400;font-display:swap;unicode-range:${musicRange}`);
    const ranges = musicRange.split(",").map((range) =>
      range
        .replace("U+", "")
        .split("-")
        .map((code) => parseInt(code, 16)),
    );
    for (const sign of ["♯", "♭", "♮", "𝄪", "𝄫"]) {
      const code = sign.codePointAt(0) ?? 0;
      expect(ranges.some(([from = 0, to = 0]) => code >= from && code <= to)).toBe(true);
    }
  });
});
