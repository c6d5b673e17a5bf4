import { render, screen } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { KeyUnknown } from "./KeyUnknown";

test("a song that says nothing of its key is not tried in one that nobody wrote: it asks for chords or the melody", () => {
  render(<KeyUnknown song={aSong({ chart: "Only words", writtenKey: null, tune: null })} />);
  expect(screen.getByTestId("try-needs-key").textContent).toContain("The key is not known yet");
  expect(screen.getByRole("link", { name: "Add chords or the melody" }).getAttribute("href")).toMatch(/\/edit$/);
});
