import { fireEvent, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import { findPreset } from "@/shared/instruments/presets";
import { parseChart } from "@/shared/songs/chart";
import { WhyMissing } from "./WhyMissing";
import { WhyScreen } from "./WhyScreen";

jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
}));

const asked = {
  chart: parseChart("Verse 1\nD      G\nlow water at the slip\nA      D\nropes along the wall"),
  from: { tonic: "D", mode: "major" } as const,
  to: { tonic: "C", mode: "major" } as const,
  instrument: findPreset("box-adf")!,
  way: { retune: 0, capo: 3, shapeKey: "A" },
  seed: 5,
};

function Page({ change = {} }: { change?: Partial<typeof asked> }) {
  const [step, setStep] = useState<string | undefined>(undefined);
  return (
    <WhyScreen
      song={{ id: "one", title: "Slack Water" }}
      asked={{ ...asked, ...change }}
      way="Capo 3, shapes in A"
      step={step}
      onStep={setStep}
      waysHref={{ pathname: "/songs/[id]/ways", params: { id: "one", key: "C", shift: "-2" } }}
    />
  );
}

const set = (width: number) => {
  Object.defineProperty(document.documentElement, "clientWidth", { configurable: true, value: width });
  Object.defineProperty(window, "innerWidth", { configurable: true, value: width });
  fireEvent(window, new Event("resize"));
};
beforeAll(() => {
  // jsdom has no page to scroll.
  window.scrollTo = () => undefined;
});
beforeEach(() => set(390));

const verdict = () => screen.getByTestId("verdict").textContent ?? "";
const next = () => fireEvent.click(screen.getByTestId("step-next"));

test("on the phone one step stands on the page, with how far it is, and Next and Back lead through all of them", () => {
  render(<Page />);
  expect(screen.getByTestId("step-progress").textContent).toBe("Step 1 of 5");
  const titles: string[] = [];
  for (let k = 0; k < 5; k++) {
    titles.push(screen.getByRole("heading", { level: 2 }).textContent ?? "");
    if (k < 4) next();
  }
  expect(titles).toEqual([
    "The scale of D major",
    "Numbers under your chords",
    "The same numbers in C major",
    "What the capo at fret 3 moves",
    "Movable shapes along your neck",
  ]);
  expect(screen.queryByTestId("step-next")).toBeNull();
  expect(screen.getByTestId("left-out").textContent).toContain("nothing is retuned in this way");
  fireEvent.click(screen.getByTestId("step-back"));
  expect(document.activeElement?.textContent).toBe("What the capo at fret 3 moves");
});

test("the arrow keys lead on and back, but not out of an answer", () => {
  render(<Page />);
  next();
  const heading = screen.getByRole("heading", { level: 2 });
  fireEvent.keyDown(within(screen.getByTestId("answer-choices")).getAllByRole("radio")[0]!, { key: "ArrowLeft" });
  expect(screen.getByTestId("step-progress").textContent).toBe("Step 2 of 5");
  fireEvent.keyDown(heading, { key: "ArrowRight" });
  expect(screen.getByTestId("step-progress").textContent).toBe("Step 3 of 5");
  fireEvent.keyDown(screen.getByRole("heading", { level: 2 }), { key: "ArrowLeft" });
  expect(screen.getByTestId("step-progress").textContent).toBe("Step 2 of 5");
});

test("a wrong key is told from what was pressed, the right one is taken, and then another question comes", () => {
  render(<Page />);
  const ask = () => within(screen.getByTestId("question")).getByRole("heading").textContent;
  const asking = ask();
  const keys = within(screen.getByTestId("answer-keys")).getAllByTestId(/^key-/);
  const answers = keys.map((key) => {
    fireEvent.click(key);
    return verdict();
  });
  expect(answers.filter((words) => words.startsWith("Right."))).toHaveLength(1);
  expect(new Set(answers).size).toBe(12);
  fireEvent.click(keys[answers.findIndex((words) => words.startsWith("Right."))]!);
  const asked: (string | null)[] = [asking];
  for (let k = 0; k < 3; k++) {
    const more = screen.queryByTestId("another");
    if (more) fireEvent.click(more);
    asked.push(ask());
    const again = within(screen.getByTestId("answer-keys")).getAllByTestId(/^key-/);
    for (const key of again) {
      fireEvent.click(key);
      if (verdict().startsWith("Right.")) break;
    }
  }
  expect(new Set(asked).size).toBeGreaterThan(1);
});

test("the neck takes a fret as a whole for the capo, and a place for a root", () => {
  render(<Page />);
  next();
  next();
  next();
  const frets = within(screen.getByTestId("answer-neck")).getAllByRole("button");
  expect(frets[0]?.getAttribute("aria-label")).toBe("No capo");
  const words = frets.map((fret) => {
    fireEvent.click(fret);
    return verdict();
  });
  expect(words.filter((each) => each.startsWith("Right."))).toHaveLength(1);
  next();
  const places = within(screen.getByTestId("answer-neck")).getAllByRole("button");
  expect(places.length).toBe(3 * 8);
  for (const place of places) {
    expect(place.getAttribute("aria-label")).toMatch(/^String \S+, (open|fret \d+)$/);
    fireEvent.click(place);
    if (verdict().startsWith("Right.")) break;
  }
  expect(verdict()).toMatch(/^Right\./);
});

test("numbers stand over the song's own chords, and every picture is told in words", () => {
  render(<Page />);
  expect(screen.getByRole("img").getAttribute("aria-label")).toBe("D major: 1 D, 2 E, 3 F♯, 4 G, 5 A, 6 B, 7 C♯");
  next();
  expect(screen.getByTestId("numbered-lines").textContent).toContain("low water at the slip");
  expect(screen.getByTestId("numbered-lines").textContent).toContain("IVG");
  next();
  expect(screen.getAllByRole("row")).toHaveLength(4);
  next();
  expect(screen.getByTestId("neck-strip").getAttribute("aria-label")).toBe(
    "The neck with a capo at fret 3. Behind it the strings sound C, F and A.",
  );
});

test("on the wide screen all steps stand in a column and each can be opened", () => {
  set(1440);
  render(<Page />);
  fireEvent.click(screen.getByTestId("step-capo"));
  expect(screen.getByTestId("neck-strip")).toBeTruthy();
  expect(screen.getByTestId("step-scale")).toBeTruthy();
  expect(screen.getByTestId("left-out")).toBeTruthy();
});

test("a song without chords, a search that runs, one that failed and no way each say so", () => {
  const song = { id: "one", title: "Slack Water" };
  const idle = { isPending: false, error: null, refetch: () => undefined };
  const page = render(<WhyMissing song={song} hasChords={false} search={idle} />);
  expect(screen.getByTestId("why-needs-chords")).toBeTruthy();
  page.rerender(<WhyMissing song={song} hasChords search={{ ...idle, isPending: true }} />);
  expect(screen.getByRole("status").textContent).toBe("Looking for the way");
  const refetch = jest.fn();
  page.rerender(<WhyMissing song={song} hasChords search={{ ...idle, error: new Error("x"), refetch }} />);
  fireEvent.click(screen.getByText("Try again"));
  expect(refetch).toHaveBeenCalledTimes(1);
  page.rerender(<WhyMissing song={song} hasChords search={idle} />);
  expect(screen.getByText("No way on this instrument")).toBeTruthy();
});
