import { render, screen } from "@testing-library/react";
import { TextLink } from "./TextLink";

jest.mock("expo-router", () => ({
  Link: jest.requireActual<typeof import("react-native")>("react-native").Text,
}));

it("can be pressed on 48 px, without pushing the words around it away", () => {
  render(
    <TextLink href="/voice/sing" testID="link">
      Sing a phrase instead
    </TextLink>,
  );
  const { paddingTop, paddingBottom, lineHeight, marginTop, marginLeft, paddingLeft } = getComputedStyle(
    screen.getByTestId("link"),
  );
  const px = (length: string) => Number(/^-?\d+px$/.test(length) ? length.slice(0, -2) : NaN);
  expect(px(lineHeight) + px(paddingTop) + px(paddingBottom)).toBeGreaterThanOrEqual(48);
  expect(px(marginTop)).toBe(-px(paddingTop));
  expect(px(marginLeft)).toBe(-px(paddingLeft));
});
