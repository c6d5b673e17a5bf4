import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { useState } from "react";
import type { Player } from "@/shared/contract/lineUp";
import { findPreset } from "@/shared/instruments/presets";
import type { KeyName } from "@/shared/music/keyName";
import { findWays } from "@/shared/ways/findWays";
import { EveryoneScreen, type EveryoneScreenProps } from "./EveryoneScreen";

jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
}));
jest.mock("../search/waySearch", () => ({
  searchWays: (question: Parameters<typeof findWays>[0]) =>
    Promise.resolve(jest.requireActual<{ findWays: typeof findWays }>("@/shared/ways/findWays").findWays(question)),
}));

const major = (tonic: string): KeyName => ({ tonic, mode: "major" });
const tede: Player = { id: "1", name: "Tede", instrument: "whistle-D", way: null };
const maren: Player = { id: "2", name: "Maren", instrument: "box-adf", way: null };
const lost: Player = { id: "3", name: "Ilse", instrument: "sold-long-ago", way: null };

function Page({ start = [], ...change }: { start?: readonly Player[] } & Partial<EveryoneScreenProps>) {
  const [players, setPlayers] = useState(start);
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <EveryoneScreen
        song={{ id: "one", title: "Slack Water" }}
        into={major("C")}
        shift={-2}
        keys={[
          { shift: -2, label: "C" },
          { shift: 0, label: "D" },
        ]}
        onKey={() => undefined}
        chords={{ chords: ["D", "G", "A"], from: major("D") }}
        lineUp={{ players, unread: null, error: null, refetch: () => undefined, change: setPlayers }}
        offered={[{ value: "box-adf", label: "my box guitar" }]}
        first="box-adf"
        instrumentOf={(id) => {
          const instrument = findPreset(id);
          return instrument && { instrument, words: instrument.name };
        }}
        {...change}
      />
    </QueryClientProvider>
  );
}

test("an empty line-up says what it will be, asks for a name, and takes players one after the other", async () => {
  render(<Page />);
  expect(screen.getByTestId("everyone-empty")).toBeTruthy();
  fireEvent.submit(screen.getByRole("form"));
  expect(screen.getAllByText("Say who plays.").length).toBeGreaterThan(0);
  fireEvent.change(screen.getByTestId("player-name"), { target: { value: " Maren " } });
  fireEvent.submit(screen.getByRole("form"));
  expect(within(screen.getByTestId("player")).getByRole("heading").textContent).toBe("Maren");
  await waitFor(() => expect(screen.getAllByRole("radio").length).toBeGreaterThan(1));
  fireEvent.change(screen.getByTestId("player-name"), { target: { value: "Tede" } });
  fireEvent.change(screen.getByTestId("player-instrument"), { target: { value: "whistle-D" } });
  fireEvent.submit(screen.getByRole("form"));
  expect(screen.getAllByTestId("player")).toHaveLength(2);
  fireEvent.click(screen.getAllByTestId("player-remove")[0]!);
  expect(screen.getAllByTestId("player")).toHaveLength(1);
  expect(document.activeElement?.textContent).toBe("All of these sound in C");
});

test("each player has two or three ways, picks one, and its shapes are drawn", async () => {
  render(<Page start={[maren]} />);
  await waitFor(() => expect(screen.getAllByRole("radio").length).toBeGreaterThan(1));
  const radios = screen.getAllByRole("radio");
  expect(radios.length).toBeLessThanOrEqual(3);
  expect(radios[0]?.getAttribute("aria-checked")).toBe("true");
  expect(screen.getAllByRole("img")).toHaveLength(3);
  fireEvent.click(radios[1]!);
  expect(screen.getAllByRole("radio")[1]?.getAttribute("aria-checked")).toBe("true");
});

test("a way that was picked for one key is not taken for another", async () => {
  const ways = findWays({
    chords: ["D", "G", "A"],
    from: major("D"),
    to: major("C"),
    instrument: findPreset("box-adf")!,
  });
  const { retune, capo, shapeKey } = ways[1]!;
  const picked = { ...maren, way: { into: "C", retune, capo, shapeKey } };
  const { unmount } = render(<Page start={[picked]} />);
  await waitFor(() => expect(screen.getAllByRole("radio").length).toBeGreaterThan(1));
  const on = () => screen.getAllByRole("radio").find((radio) => radio.getAttribute("aria-checked") === "true");
  expect(on()?.textContent).toContain(ways[1]!.title);
  unmount();
  render(<Page start={[picked]} into={major("D")} shift={0} />);
  await waitFor(() => expect(screen.getAllByRole("radio")[0]?.getAttribute("aria-checked")).toBe("true"));
});

test("an instrument made in one key says whether it plays the key, and else which one would", () => {
  const { unmount } = render(<Page start={[tede]} />);
  const card = screen.getByTestId("fixed-does-not-fit").textContent;
  expect(card).toContain("Does not play C");
  expect(card).toContain("A whistle in D plays D or G.");
  expect(card).toContain("For C, take a whistle in C or a whistle in G");
  unmount();
  render(<Page start={[tede]} into={major("D")} shift={0} />);
  expect(screen.getByTestId("fixed-fits").textContent).toContain("Plays D: its own key.");
});

test("an instrument that is gone, a line-up that cannot be read or kept, and no chords each say so", () => {
  const { unmount } = render(<Page start={[lost]} />);
  expect(screen.getByText("An instrument that is not there any more")).toBeTruthy();
  unmount();
  const refetch = jest.fn();
  const lineUp = {
    players: undefined,
    unread: new Error("No connection."),
    error: null,
    refetch,
    change: () => undefined,
  };
  const second = render(<Page lineUp={lineUp} />);
  fireEvent.click(screen.getByText("Try again"));
  expect(refetch).toHaveBeenCalledTimes(1);
  second.unmount();
  const third = render(<Page lineUp={{ ...lineUp, players: [], unread: null, error: new Error("No connection.") }} />);
  expect(screen.getByRole("alert").textContent).toContain("The line-up is not saved");
  third.unmount();
  render(<Page chords={null} />);
  expect(screen.getByTestId("everyone-needs-chords")).toBeTruthy();
});
