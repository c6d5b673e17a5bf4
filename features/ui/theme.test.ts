import { tokens, type ColorName, type Scheme } from "./theme";

/** WCAG 2.2 relative luminance. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const part = parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** WCAG 2.2 contrast ratio, 1 to 21. */
function contrast(one: string, other: string): number {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

const schemes: readonly Scheme[] = ["morning", "lamplight"];
const text: readonly (readonly [ColorName, ColorName])[] = (
  ["ink", "inkSoft", "plum", "lagoon", "honeyText", "brick"] as const
).flatMap((name) => [[name, "paper"] as const, [name, "card"] as const]);
const onFills: readonly (readonly [ColorName, ColorName])[] = [
  ["onPlum", "plum"],
  ["paper", "ink"],
  ["paper", "lagoon"],
  ["inkSoft", "line"],
];
const graphics: readonly (readonly [ColorName, ColorName])[] = (
  ["lagoon", "honey", "brick", "plum", "ink", "inkSoft"] as const
).flatMap((name) => [[name, "paper"] as const, [name, "card"] as const]);

describe.each(schemes)("the colours of %s", (scheme) => {
  const { [scheme]: colors } = tokens;

  it.each([...text, ...onFills])("%s is readable on %s, 4.5 : 1 or better", (front, back) => {
    expect(contrast(colors[front], colors[back])).toBeGreaterThanOrEqual(4.5);
  });

  it.each(graphics)("%s is seen on %s, 3 : 1 or better", (front, back) => {
    expect(contrast(colors[front], colors[back])).toBeGreaterThanOrEqual(3);
  });

  it("keeps the oldest notes of a trail, at 76 %, over 3 : 1", () => {
    const mix = (at: number) =>
      Math.round(
        0.76 * parseInt(colors.lagoon.slice(at, at + 2), 16) + 0.24 * parseInt(colors.paper.slice(at, at + 2), 16),
      );
    const faded = `#${[1, 3, 5].map((at) => mix(at).toString(16).padStart(2, "0")).join("")}`;
    expect(contrast(faded, colors.paper)).toBeGreaterThanOrEqual(3);
  });
});

it("measures black on white as 21 : 1, the greatest there is (WCAG 2.2)", () => {
  expect(contrast("#000000", "#FFFFFF")).toBeCloseTo(21, 6);
});
