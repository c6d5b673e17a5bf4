import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { PartList } from "./PartList";

const moves = (name: string) =>
  ["up", "down"].map((way) => screen.getByLabelText(`Move ${name} ${way}`).getAttribute("aria-disabled"));

test("the first and the last part go no further, and none goes before what stands first", () => {
  render(
    <PartList text={"Low tide\n\nVerse\nstill\n\nChorus\nslow"} onText={() => undefined} onShow={() => undefined} />,
  );
  expect(moves("Verse")).toEqual(["true", null]);
  expect(moves("Chorus")).toEqual([null, "true"]);
});

test("of thousands of parts the first are listed, and more on request", async () => {
  const text = "Verse 1\nG\nlow tide\n\n".repeat(2000);
  const { rerender } = render(<PartList text={text} onText={() => undefined} onShow={() => undefined} />);
  expect(screen.getAllByRole("listitem")).toHaveLength(60);
  fireEvent.click(screen.getByText("Show more of the 2000 parts"));
  expect(screen.getAllByRole("listitem")).toHaveLength(120);
  rerender(<PartList text={"Verse\nlow tide\n\nChorus\nslow"} onText={() => undefined} onShow={() => undefined} />);
  await waitFor(() => expect(screen.getAllByRole("listitem")).toHaveLength(2));
});
