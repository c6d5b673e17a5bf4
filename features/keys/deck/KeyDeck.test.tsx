import { fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { aSong } from "@/__tests__/client/belongings";
import { usePinning } from "../compare/pins";
import { wholeVoice, type KeyRow } from "../keyRows";
import { keyRowsOf } from "../songKeys";
import { deckTarget, KeyDeck } from "./KeyDeck";
import { MoveByHand, nearestRow } from "./MoveByHand";

const song = aSong({ tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "D" } });
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const voice = wholeVoice(singing);
const rows = keyRowsOf(song, singing) ?? [];

function Page() {
  const [selected, setSelected] = useState<KeyRow>(rows[0]!);
  const pinning = usePinning(song.id, rows);
  const parts = { rows, voice, selected, onSelect: setSelected };
  return (
    <>
      <KeyDeck {...parts} pinning={pinning} />
      <MoveByHand {...parts} />
    </>
  );
}

beforeAll(() => {
  // jsdom has no layout to scroll in.
  Element.prototype.scrollTo = () => undefined;
});

const told = () => screen.getByTestId("key-deck").getAttribute("aria-label");

test("the cards stand best first; buttons and keys go through them to the ends", () => {
  render(<Page />);
  const deck = screen.getByTestId("key-deck");
  expect(told()).toContain(`1 of 12: ${rows[0]!.sign}, `);
  expect(screen.getByTestId("previous-key").getAttribute("aria-disabled")).toBe("true");
  fireEvent.click(screen.getByTestId("next-key"));
  expect(told()).toContain(`2 of 12: ${rows[1]!.sign}, `);
  fireEvent.keyDown(deck, { key: "ArrowRight" });
  expect(told()).toContain("3 of 12");
  fireEvent.keyDown(deck, { key: "End" });
  expect(told()).toContain(`12 of 12: ${rows[11]!.sign}, `);
  fireEvent.keyDown(deck, { key: "Home" });
  fireEvent.keyDown(deck, { key: "ArrowLeft" });
  expect(told()).toContain("1 of 12");
  expect(deckTarget("Enter", 3, 12)).toBeNull();
});

test("the card in sight is pinned by its button", () => {
  render(<Page />);
  fireEvent.click(screen.getByTestId("pin-key"));
  expect(screen.getByTestId("pin-key").textContent).toBe(`Unpin ${rows[0]!.sign}`);
});

test("the handle moves the tune by semitones, tells the score, and looks at the key when asked", () => {
  render(<Page />);
  const handle = screen.getByRole("slider", { name: "Move the song" });
  const next = rows.find(({ shift }) => shift === rows[0]!.shift + 1) ?? nearestRow(rows, rows[0]!.shift + 1)!;
  fireEvent.keyDown(handle, { key: "ArrowUp" });
  expect(handle.getAttribute("aria-valuetext")).toContain(`${next.score} of 100`);
  expect(screen.getByTestId("moved-score").textContent).toBe(`${next.score} of 100`);
  expect(told()).toContain("1 of 12");
  fireEvent.click(screen.getByTestId("look-at-moved"));
  expect(told()).toContain(`${next.sign}, `);
});

test("a window of hardly any width leaves no drawing less than nothing wide", () => {
  // jsdom lays nothing out: its window is 0 px wide, as a browser's may be while it opens.
  expect(document.documentElement.clientWidth).toBe(0);
  const { container } = render(<Page />);
  const widths = [...container.querySelectorAll("[width]")].map((each) => Number(each.getAttribute("width")));
  expect(widths.length).toBeGreaterThan(20);
  expect(widths.filter((width) => !(width >= 0))).toEqual([]);
  expect(Number(screen.getByTestId("move-by-hand").querySelector("svg")?.getAttribute("width"))).toBe(166);
});

test("where octaves leave a gap the nearest key is taken", () => {
  const [low, high] = [
    { ...rows[0]!, shift: -9 },
    { ...rows[1]!, shift: 3 },
  ];
  expect(nearestRow([high, low], -4)).toBe(low);
  expect(nearestRow([high, low], -3)).toBe(low);
  expect(nearestRow([high, low], -2)).toBe(high);
  expect(nearestRow([], 0)).toBeNull();
});
