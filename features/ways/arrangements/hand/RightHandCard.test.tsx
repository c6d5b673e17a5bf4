import { fireEvent, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import { metreOf } from "@/shared/songs/backing/metre";
import { commonPatterns, type StrokePattern } from "@/shared/ways/hand/strokePattern";
import { RightHandCard } from "./RightHandCard";

const three = metreOf(3);

function open(changes: StrokePattern[]) {
  function Held() {
    const [pattern, setPattern] = useState(commonPatterns(three)[0]!);
    const change = (next: StrokePattern) => {
      changes.push(next);
      setPattern(next);
    };
    return <RightHandCard pattern={pattern} metre={three} onChange={change} />;
  }
  render(<Held />);
}

test("a usual pattern is chosen by name and told stroke by stroke", () => {
  const changes: StrokePattern[] = [];
  open(changes);
  fireEvent.change(screen.getByTestId("pattern"), { target: { value: "Bass, strum, strum" } });
  expect(changes.at(-1)?.steps).toEqual(["bass", "rest", "down", "rest", "down", "rest"]);
  expect(screen.getByRole("img").getAttribute("aria-label")).toBe(
    "Right hand, each bar: bass string on 1, down on 2, down on 3",
  );
});

test("the bar is changed eighth by eighth with the keyboard, and becomes one's own pattern", () => {
  const changes: StrokePattern[] = [];
  open(changes);
  fireEvent.click(screen.getByTestId("change-pattern"));
  const eighth = within(screen.getByTestId("pattern-grid")).getByRole("radiogroup", { name: "On the half after 1" });
  const radios = within(eighth).getAllByRole("radio");
  expect(radios.filter((radio) => radio.tabIndex === 0)).toHaveLength(1);
  const rest = within(eighth).getByRole("radio", { name: "Rest" });
  expect(rest.getAttribute("aria-checked")).toBe("true");
  // From rest, the last of the five, the arrow goes round to the first.
  fireEvent.keyDown(rest, { key: "ArrowDown" });
  expect(changes.at(-1)).toMatchObject({ name: "Your own pattern", beats: 3 });
  expect(changes.at(-1)?.steps).toEqual(["down", "down", "down", "rest", "down", "rest"]);
  fireEvent.keyDown(within(eighth).getByRole("radio", { name: "Down" }), { key: "ArrowUp" });
  expect(changes.at(-1)?.name).toBe("Down strokes");
});
