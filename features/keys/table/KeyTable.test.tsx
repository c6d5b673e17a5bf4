import { fireEvent, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import type { Song } from "@/shared/contract/song";
import { mostPins, turnPin } from "../compare/pins";
import { wholeVoice, type KeyRow } from "../keyRows";
import { KeyTable } from "./KeyTable";
import { bestFirst, sortedRows, type KeyOrder } from "./keyOrder";
import { tableColumns } from "./tableColumns";
import type { TableWay } from "./tableWays";
import { keyRowsOf } from "../songKeys";

const song: Song = {
  id: "7f0b6f0e-6a51-4a8e-9a53-0a3d8f6f3f01",
  title: "Slack Water",
  chart: "G    C   D  Em\nLow tide and still",
  writtenKey: { tonic: "G", mode: "major" },
  tune: { kind: "span", lowMidi: 62, highMidi: 76, home: "G" },
  beatsPerBar: null,
  tempo: null,
  demo: null,
  tags: [],
  archivedAt: null,
  playedAt: null,
  createdAt: "2026-03-05T19:00:00.000Z",
  revision: 1,
};
const singing = { range: { lowMidi: 51, highMidi: 74 }, comfort: { lowMidi: 55, highMidi: 70 } };
const rows = keyRowsOf(song, singing) ?? [];
const way: TableWay = { title: "Capo 5", cost: "easy", capo: 5, barres: 0, difficulty: 0.1 };

const atWidth = (width: number) => {
  window.innerWidth = width;
  Object.defineProperty(document.documentElement, "clientWidth", { value: width, configurable: true });
  fireEvent(window, new Event("resize"));
};
beforeEach(() => atWidth(1440));

interface PageProps {
  wayOf?: (row: KeyRow) => TableWay | null | undefined;
  instrument?: string | null;
  markOf?: (row: KeyRow) => string | null;
  among?: readonly KeyRow[];
}

function Page({ wayOf = () => null, instrument = "A D F♯", markOf = () => null, among = rows }: PageProps) {
  const [selected, setSelected] = useState<KeyRow | null>(among[0] ?? null);
  const [order, setOrder] = useState<KeyOrder>(bestFirst);
  const [pins, setPins] = useState<readonly number[]>([]);
  const facts = { pinned: (row: KeyRow) => pins.includes(row.shift), wayOf };
  return (
    <KeyTable
      {...facts}
      rows={sortedRows(among, order, facts)}
      all={among}
      voice={wholeVoice(singing)}
      selected={selected}
      onSelect={setSelected}
      pinRoom={pins.length < mostPins}
      onPin={(row) => setPins(turnPin(pins, row.shift))}
      order={order}
      onOrder={setOrder}
      instrument={instrument}
      markOf={markOf}
    />
  );
}

const bodyRows = () => within(screen.getByRole("table")).getAllByRole("row").slice(1);
const signOf = (row: HTMLElement) => within(row).getByRole("rowheader").querySelector("span > span")?.textContent;

test("it is a real table: a caption, eight column heads, twelve rows with row heads", () => {
  render(<Page />);
  expect(screen.getByRole("table", { name: /All twelve keys/ })).toBeTruthy();
  expect(screen.getAllByRole("columnheader")).toHaveLength(8);
  expect(bodyRows()).toHaveLength(12);
  expect(signOf(bodyRows()[0]!)).toBe(rows[0]?.sign);
});

test("each row has its score, its picture in words, and chords in its key", () => {
  render(<Page />);
  const inC = bodyRows().find((row) => signOf(row) === "C")!;
  expect(inC.textContent).toContain("7 down");
  expect(inC.textContent).toContain(String(rows.find((row) => row.sign === "C")?.score));
  expect(within(inC).getByRole("img").getAttribute("aria-label")).toMatch(/G3/);
  expect(within(inC).getByText("Am")).toBeTruthy();
});

test("the heads sort, and say which one does", () => {
  render(<Page />);
  expect(screen.getByRole("columnheader", { name: /Score/ }).getAttribute("aria-sort")).toBe("descending");
  fireEvent.click(screen.getByRole("button", { name: /Key, semitones/ }));
  expect(screen.getByRole("columnheader", { name: /Key, semitones/ }).getAttribute("aria-sort")).toBe("ascending");
  expect(screen.getByRole("columnheader", { name: /Score/ }).getAttribute("aria-sort")).toBe("none");
  const moves = bodyRows().map((row) => Math.abs(rows.find((each) => each.sign === signOf(row))?.shift ?? 99));
  expect(moves).toEqual([...moves].sort((a, b) => a - b));
  fireEvent.click(screen.getByRole("button", { name: /Key, semitones/ }));
  expect(screen.getByRole("columnheader", { name: /Key, semitones/ }).getAttribute("aria-sort")).toBe("descending");
  expect(signOf(bodyRows().at(-1)!)).toBe(rows.find(({ shift }) => Math.abs(shift) === Math.min(...moves))?.sign);
});

test("every column can put the rows in its order", () => {
  render(<Page wayOf={() => way} />);
  for (const name of [
    "Pinned",
    "Key, semitones from written",
    "Score",
    "Span",
    "Room below",
    "Room above",
    "Chords",
    "Best way",
  ]) {
    const head = screen.getByRole("columnheader", { name: new RegExp(`^${name}`) });
    fireEvent.click(within(head).getByRole("button"));
    expect(head.getAttribute("aria-sort")).toMatch(/^(a|de)scending$/);
  }
});

test("four keys can be pinned; a fifth waits until one is unpinned", () => {
  render(<Page />);
  const pins = screen.getAllByRole("button", { name: /^Pin / });
  expect(pins).toHaveLength(12);
  pins.slice(0, 5).forEach((pin) => fireEvent.click(pin));
  const pressed = () => pins.filter((pin) => pin.getAttribute("aria-pressed") === "true");
  expect(pressed()).toEqual(pins.slice(0, 4));
  expect(pins[4]!.getAttribute("aria-disabled")).toBe("true");
  expect(pins[4]!.title).toMatch(/^Four keys are pinned/);
  fireEvent.click(pins[0]!);
  fireEvent.click(pins[4]!);
  expect(pressed()).toEqual(pins.slice(1, 5));
});

test("a key is chosen by its radio button or anywhere in its row", () => {
  render(<Page />);
  const [, second, third] = screen.getAllByRole("radio") as HTMLInputElement[];
  fireEvent.click(second!);
  expect(second!.checked).toBe(true);
  fireEvent.click(bodyRows()[2]!);
  expect(third!.checked).toBe(true);
  expect(second!.checked).toBe(false);
});

test("a way that is still searched, one found and none are told apart", () => {
  const [first, second] = rows;
  render(
    <Page
      wayOf={(row) =>
        row === first
          ? undefined
          : row === second
            ? { ...way, title: "Capo 5, shapes of G", cost: "easy, nothing retuned" }
            : null
      }
    />,
  );
  expect(bodyRows()[0]?.textContent).toContain("Searching");
  expect(bodyRows()[1]?.textContent).toContain("Capo 5, shapes of Geasy, nothing retuned");
  expect(bodyRows()[2]?.textContent).toContain("None found");
});

test("on a narrower screen no column hides: chords stand over the best way", () => {
  atWidth(1100);
  render(<Page wayOf={() => way} />);
  expect(screen.getAllByRole("columnheader")).toHaveLength(7);
  const inC = bodyRows().find((row) => signOf(row) === "C")!;
  expect(within(inC).getAllByRole("cell").at(-1)?.textContent).toBe("CFGAmCapo 5easy");
});

test.each([700, 864, 940, 1279, 1280, 1600])("columns for %i px fit in and leave room for the pictures", (room) => {
  for (const withWays of [true, false]) {
    const { widths, total, span } = tableColumns(room, withWays);
    expect(widths.reduce((sum, width) => sum + width, 0)).toBe(total);
    expect(span).toBeGreaterThanOrEqual(180);
    if (room >= 864) expect(total).toBeLessThanOrEqual(room);
  }
});

test("a song without chords has no columns for them", () => {
  render(<Page instrument={null} />);
  expect(screen.getAllByRole("columnheader")).toHaveLength(6);
  expect(screen.queryByText("None found")).toBeNull();
});

test("the decided key is marked, with the voice it was decided for", () => {
  render(<Page markOf={(row) => (row.sign === "C" ? "decided for Evenings" : null)} />);
  expect(bodyRows().filter((row) => row.textContent?.includes("Decided for Evenings"))).toHaveLength(1);
});

test("the picture is as high as its row", () => {
  const heights = [51, 84];
  class Observer {
    constructor(private readonly tell: () => void) {}
    observe(element: HTMLElement) {
      const at = bodyRows().indexOf(element);
      Object.defineProperty(element, "offsetHeight", { value: heights[at] ?? 51 });
      this.tell();
    }
    disconnect() {}
  }
  const before = globalThis.ResizeObserver;
  globalThis.ResizeObserver = Observer as unknown as typeof ResizeObserver;
  render(<Page />);
  const drawn = bodyRows().map((row) => within(row).getByRole("img").getAttribute("height"));
  globalThis.ResizeObserver = before;
  expect(drawn.slice(0, 3)).toEqual(["51", "84", "51"]);
});

test("a mode is small beside its tonic, and spoken in full", () => {
  const modal = keyRowsOf({ ...song, writtenKey: { tonic: "G", mode: "mixolydian" } }, singing) ?? [];
  render(<Page among={modal} instrument={null} />);
  expect(within(bodyRows()[0]!).getByText("mixo.").getAttribute("aria-hidden")).toBe("true");
  expect(screen.getAllByRole("rowheader", { name: /mixolydian/ })).toHaveLength(12);
});

test("that it is coarse stands on the page, not in every row", () => {
  expect(rows.every(({ coarse }) => coarse)).toBe(true);
  expect(rows.map(({ reason, spoken }) => reason + spoken).join(" ")).not.toMatch(/span alone/);
});
