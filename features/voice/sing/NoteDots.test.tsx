import { render, screen } from "@testing-library/react";
import { NoteDots } from "./NoteDots";

it("draws as many dots as the words beside it say, the clear ones filled", () => {
  render(<NoteDots words="Heard clearly in 16 of 19 notes." />);
  const dots = [...screen.getByTestId("note-dots").children] as HTMLElement[];
  expect(dots).toHaveLength(19);
  expect(new Set(dots.slice(0, 16).map(({ style }) => style.backgroundColor)).size).toBe(1);
  expect(dots[16]?.className + dots[16]?.style.backgroundColor).not.toBe(
    dots[15]!.className + dots[15]!.style.backgroundColor,
  );
});

it("draws nothing where the words name no notes", () => {
  render(<NoteDots words="" />);
  expect(screen.queryByTestId("note-dots")).toBeNull();
});
