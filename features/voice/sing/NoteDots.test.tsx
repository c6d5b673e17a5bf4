import { render, screen } from "@testing-library/react";
import { NoteDots } from "./NoteDots";

it("draws as many dots as the words beside it say, the clear ones filled", () => {
  render(<NoteDots words="Heard clearly in 16 of 19 notes." />);
  const dots = [...screen.getByTestId("note-dots").children] as HTMLElement[];
  expect(dots).toHaveLength(19);
  const looks = dots.map(({ className, style }) => `${className} ${style.backgroundColor}`);
  expect(looks.filter((look) => look === looks[0])).toHaveLength(16);
});

it("leaves no unclear note of a long take out", () => {
  render(<NoteDots words="Heard clearly in 39 of 46 notes." />);
  const dots = [...screen.getByTestId("note-dots").children] as HTMLElement[];
  const looks = dots.map(({ className, style }) => `${className} ${style.backgroundColor}`);
  expect(looks.filter((look) => look !== looks[0])).toHaveLength(7);
});

it("draws no cloud of dots for a recording of many minutes", () => {
  render(<NoteDots words="Heard clearly in 280 of 300 notes." />);
  expect(screen.queryByTestId("note-dots")).toBeNull();
});

it("draws nothing where the words name no notes", () => {
  render(<NoteDots words="" />);
  expect(screen.queryByTestId("note-dots")).toBeNull();
});
