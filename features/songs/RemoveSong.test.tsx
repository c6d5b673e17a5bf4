import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { RemoveSong } from "./RemoveSong";

const shown: Element[] = [];
beforeEach(() => {
  shown.length = 0;
  Element.prototype.scrollIntoView = function (this: Element) {
    shown.push(this);
  };
});

const open = (onRemove = jest.fn()) => {
  render(<RemoveSong title="Slack Water" onRemove={onRemove} busy={false} error={null} />);
  fireEvent.click(screen.getByTestId("remove-song"));
  return onRemove;
};

test("the question comes into view and takes the focus", () => {
  const onRemove = open();
  const question = screen.getByRole("group", { name: "Delete “Slack Water”?" });
  expect(document.activeElement).toBe(question);
  expect(shown).toEqual([question]);
  expect(onRemove).not.toHaveBeenCalled();
  fireEvent.click(screen.getByTestId("remove-confirmed"));
  expect(onRemove).toHaveBeenCalledTimes(1);
});

test("keeping the song gives the focus back", async () => {
  open();
  fireEvent.click(screen.getByText("Keep it"));
  await waitFor(() => expect(document.activeElement).toBe(screen.getByTestId("remove-song")));
});

test("Escape keeps the song, and the dialog that the question stands in", async () => {
  const around = jest.fn();
  document.addEventListener("keydown", around);
  const onRemove = open();
  expect(fireEvent.keyDown(screen.getByTestId("remove-confirmed"), { key: "Escape" })).toBe(false);
  document.removeEventListener("keydown", around);
  await waitFor(() => expect(document.activeElement).toBe(screen.getByTestId("remove-song")));
  expect(screen.queryByTestId("remove-confirmed")).toBeNull();
  expect(onRemove).not.toHaveBeenCalled();
  expect(around).not.toHaveBeenCalled();
});
