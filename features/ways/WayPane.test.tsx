import { fireEvent, render, screen } from "@testing-library/react";
import { presets } from "@/shared/instruments/presets";
import type { KeyName } from "@/shared/music/keyName";
import { findWays } from "@/shared/ways/findWays";
import type { Way } from "@/shared/ways/way";
import { takeLabel } from "./wayWords";
import { WayPane } from "./WayPane";

jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
}));

const instrument = presets.find(({ id }) => id === "box-adf")!;
const inC: KeyName = { tonic: "C", mode: "major" };
const ways = findWays({ chords: ["D", "G", "A", "Bm"], from: { tonic: "D", mode: "major" }, to: inC, instrument });

function open(change: Partial<React.ComponentProps<typeof WayPane>> = {}) {
  const used: Way[] = [];
  const view = (more: Partial<React.ComponentProps<typeof WayPane>>) => (
    <WayPane
      songId="one"
      into={inC}
      hasChords
      search={{ data: ways, error: null, refetch: () => undefined }}
      instrument={instrument}
      kept={null}
      saving={false}
      onUse={(way) => used.push(way)}
      {...change}
      {...more}
    >
      {({ list, use }) => (
        <>
          {list}
          {use}
        </>
      )}
    </WayPane>
  );
  const page = render(view({}));
  return { used, show: (more: Partial<React.ComponentProps<typeof WayPane>>) => page.rerender(view(more)) };
}

test("there is more than one way, the best chosen first, and the button says what it does", () => {
  const { used } = open();
  const radios = screen.getAllByRole("radio");
  expect(radios.length).toBe(ways.length);
  expect(radios.length).toBeGreaterThan(1);
  expect(radios[0]?.getAttribute("aria-checked")).toBe("true");
  expect(screen.getByTestId("use-way").textContent).toBe(takeLabel(ways[0]!));
  fireEvent.click(radios[1]!);
  expect(screen.getByTestId("use-way").textContent).toBe(takeLabel(ways[1]!));
  fireEvent.click(screen.getByTestId("use-way"));
  expect(used).toEqual([ways[1]]);
});

test("the arrow keys choose, with one stop for Tab", () => {
  open();
  const radios = screen.getAllByRole("radio");
  expect(radios.filter((radio) => radio.tabIndex === 0)).toHaveLength(1);
  fireEvent.keyDown(radios[0]!, { key: "ArrowDown" });
  expect(screen.getAllByRole("radio")[1]?.getAttribute("aria-checked")).toBe("true");
});

test("each way draws a grid for every chord that it can play", () => {
  open();
  const playable = ways.flatMap((way) => way.chords).filter((chord) => chord.shape !== null);
  expect(screen.getAllByRole("img")).toHaveLength(playable.length);
});

test("the way kept with the decision is chosen, and cannot be kept twice", () => {
  const last = ways.at(-1)!;
  open({ kept: last, most: 1 });
  const chosen = screen.getAllByRole("radio").findIndex((radio) => radio.getAttribute("aria-checked") === "true");
  expect(chosen).toBe(1);
  expect(screen.getByTestId("use-way").textContent).toMatch(/^You use/);
  expect((screen.getByTestId("use-way") as HTMLButtonElement).disabled).toBe(true);
});

test("in another key the choice starts anew", () => {
  const { show } = open();
  fireEvent.click(screen.getAllByRole("radio")[1]!);
  show({ into: { tonic: "B", mode: "major" } });
  expect(screen.getAllByRole("radio")[0]?.getAttribute("aria-checked")).toBe("true");
});

test("a song without chords, a search that runs and one that failed each say so", () => {
  const { show } = open({ hasChords: false });
  expect(screen.getByTestId("ways-need-chords")).toBeTruthy();
  show({ hasChords: true, search: { data: undefined, error: null, refetch: () => undefined } });
  expect(screen.getByRole("status").textContent).toBe("Looking for ways to play it");
  const refetch = jest.fn();
  show({ hasChords: true, search: { data: undefined, error: new Error("x"), refetch } });
  fireEvent.click(screen.getByText("Try again"));
  expect(refetch).toHaveBeenCalledTimes(1);
});
