import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import * as cells from "../chartCells";
import { EditScreen } from "./EditScreen";
import { draftStore } from "./keep/draftStore";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
  useRouter: () => ({ push: () => undefined }),
}));

// The DOM of the tests has no window to scroll.
HTMLElement.prototype.scrollIntoView = () => undefined;

beforeEach(() => {
  localStorage.clear();
  sessionStorage.clear();
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
});

const chart = "G       C\nLow tide and still\nD       G\nthe gulls go by";

function open(song: Song | null) {
  const saved: string[] = [];
  const page = render(
    <QueryClientProvider client={queryClient}>
      <EditScreen song={song} onSaved={(id) => saved.push(id)} />
    </QueryClientProvider>,
  );
  return { saved, close: page.unmount };
}

const type = (testId: string, text: string) =>
  fireEvent.change(screen.getByTestId(testId), { target: { value: text } });
const value = (testId: string) => (screen.getByTestId(testId) as HTMLInputElement).value;
const save = () => fireEvent.click(screen.getByTestId("save-song"));

describe("a new song", () => {
  test("comes on the shelf with the key that was found, and its draft goes", async () => {
    const { saved } = open(null);
    type("song-title", "Slack Water");
    type("song-chart", chart);
    await waitFor(() => expect(screen.getByTestId("written-key-name").textContent).toBe("G major"));
    expect(within(screen.getByTestId("preview")).getByTestId("chart").textContent).toContain("tide");
    save();
    await waitFor(() => expect(saved).toHaveLength(1));
    expect(await shelf.list("songs")).toMatchObject([
      { id: saved[0], title: "Slack Water", chart, writtenKey: { tonic: "G", mode: "major" }, tune: null, revision: 1 },
    ]);
    expect(draftStore.load(null)).toBeNull();
  });

  test("what is missing is said at its field, and nothing typed is lost", async () => {
    const { saved } = open(null);
    type("song-chart", "low tide");
    fireEvent.click(screen.getByText("By hand"));
    type("tune-low", "D");
    save();
    expect((await screen.findAllByText(/Give the song a title/)).length).toBeGreaterThan(0);
    expect(screen.getByTestId("tune-low").getAttribute("aria-invalid")).toBe("true");
    await waitFor(() => expect(document.activeElement).toBe(screen.getByTestId("song-title")));
    expect(value("song-chart")).toBe("low tide");
    expect(saved).toEqual([]);
    expect(screen.getByRole("alert").textContent).toMatch(/things need mending/);
    type("song-title", "x".repeat(201));
    expect(screen.getAllByText(/at most 200/).length).toBeGreaterThan(0);
  });

  test("a page closed in the middle finds everything typed again, until it is thrown away", async () => {
    const first = open(null);
    expect(draftStore.load(null)).toBeNull();
    type("song-title", "Slack");
    await waitFor(() => expect(draftStore.load(null)?.draft.title).toBe("Slack"));
    first.close();
    open(null);
    expect(screen.getByTestId("draft-restored")).toBeTruthy();
    expect(value("song-title")).toBe("Slack");
    fireEvent.click(screen.getByText("Start afresh"));
    expect(value("song-title")).toBe("");
    expect(screen.queryByTestId("draft-restored")).toBeNull();
  });

  test("a device that keeps nothing is told, everything typed stays, and a second try puts the song once", async () => {
    const { saved } = open(null);
    type("song-title", "Slack Water");
    refuseStorage(new DOMException("full", "QuotaExceededError"));
    save();
    await waitFor(() =>
      expect(screen.getByRole("alert").textContent).toMatch(/no room left.*Everything you typed is still here/),
    );
    expect(value("song-title")).toBe("Slack Water");
    refuseStorage(null);
    save();
    await waitFor(() => expect(saved).toHaveLength(1));
    expect(await shelf.list("songs")).toHaveLength(1);
  });

  test("typing in the title draws nothing of the chart anew", async () => {
    open(null);
    type("song-chart", chart);
    await waitFor(() => expect(screen.getByTestId("preview").textContent).toContain("gulls"));
    const spy = jest.spyOn(cells, "chartCells");
    type("song-title", "Slack Water");
    await waitFor(() => expect(draftStore.load(null)?.draft.title).toBe("Slack Water"));
    expect(spy).not.toHaveBeenCalled();
    type("song-chart", `${chart}s`);
    await waitFor(() => expect(spy).toHaveBeenCalledTimes(1));
    spy.mockRestore();
  });

  test("signs that are no chords are listed with line and column, and lead there", async () => {
    open(null);
    type("song-chart", "G   C   Hx#  D\nLow tide and still");
    await waitFor(() => expect(screen.getByTestId("unread").textContent).toContain("Hx#"));
    fireEvent.click(screen.getByText("line 1, column 9"));
    const field = screen.getByTestId("song-chart") as HTMLTextAreaElement;
    expect(document.activeElement).toBe(field);
    expect([field.selectionStart, field.selectionEnd]).toEqual([8, 11]);
  });

  test("the key can be changed by hand and given back", async () => {
    open(null);
    type("song-chart", chart);
    await waitFor(() => expect(screen.getByTestId("written-key-name").textContent).toBe("G major"));
    fireEvent.click(screen.getByTestId("another-key"));
    fireEvent.change(screen.getByTestId("key-mode"), { target: { value: "mixolydian" } });
    expect(screen.getByTestId("written-key-name").textContent).toBe("G mixolydian");
    fireEvent.click(screen.getByText("Use G major"));
    expect(screen.getByTestId("written-key-name").textContent).toBe("G major");
  });
});

describe("going back and forth", () => {
  test("by buttons and by keys, over text and parts alike", async () => {
    open(null);
    type("song-chart", `Verse\n${chart}`);
    fireEvent.click(await screen.findByText("Parts"));
    fireEvent.click(screen.getByTestId("part-name-0"));
    fireEvent.click(screen.getByTestId("once-more"));
    expect(draftStore.load(null)?.draft.chart).toBe(`Verse x2\n${chart}`);
    fireEvent.click(screen.getByTestId("undo"));
    expect(draftStore.load(null)?.draft.chart).toBe(`Verse\n${chart}`);
    fireEvent.keyDown(document.body, { key: "z", ctrlKey: true });
    expect(draftStore.load(null)?.draft.chart).toBe("");
    fireEvent.keyDown(document.body, { key: "Z", ctrlKey: true, shiftKey: true });
    fireEvent.keyDown(document.body, { key: "y", ctrlKey: true });
    expect(draftStore.load(null)?.draft.chart).toBe(`Verse x2\n${chart}`);
    expect(screen.getByTestId("redo").getAttribute("aria-disabled")).toBe("true");
  });

  test("chords that are not spelled by their key are set right by one touch, which can be taken back", async () => {
    open(null);
    const written = "F  A#  C  F\nlow tide and still\nF  A#  C  F\nthe gulls go by";
    type("song-chart", written);
    fireEvent.click(await screen.findByTestId("respell-now"));
    expect(value("song-chart")).toBe(written.replaceAll("A#", "Bb"));
    await waitFor(() => expect(screen.queryByTestId("respell")).toBeNull());
    fireEvent.click(screen.getByTestId("undo"));
    expect(value("song-chart")).toBe(written);
  });
});

describe("placing chords", () => {
  const spot = (label: string) => screen.getByRole("button", { name: label });

  test("a syllable, then a chord; again to change, nudge and take away", async () => {
    open(null);
    type("song-chart", "G   D   C   G\nlow tide and still\n\nharbour lights");
    await waitFor(() => expect(screen.getByTestId("written-key-name").textContent).toBe("G major"));
    fireEvent.click(screen.getByText("Place chords"));
    const names = within(screen.getByTestId("palette"))
      .getAllByRole("button")
      .map((button) => button.lastElementChild?.textContent);
    expect(names.slice(0, 4)).toEqual(["G, I", "C, IV", "D, V", "Em, vi"]);
    fireEvent.click(spot("“bour” of harbour, line 4"));
    fireEvent.click(screen.getByRole("button", { name: "C, IV" }));
    const text = () => draftStore.load(null)?.draft.chart.split("\n").slice(3).join("\n");
    expect(text()).toBe("   C\nharbour lights");
    expect(screen.getByTestId("place-words").textContent).toBe("C over “bour” of harbour, line 5");
    fireEvent.click(screen.getByTestId("nudge-right"));
    expect(text()).toBe("    C\nharbour lights");
    fireEvent.click(screen.getByRole("button", { name: "D, V" }));
    expect(text()).toBe("    D\nharbour lights");
    fireEvent.click(screen.getByTestId("remove-chord"));
    expect(text()).toBe("harbour lights");
  });

  test("by keys alone, and with a chord of one's own; what cannot be read is told", () => {
    open(null);
    type("song-chart", "G   D\nlow tide");
    fireEvent.click(screen.getByText("Place chords"));
    fireEvent.focus(spot("G over “low”, line 2"));
    fireEvent.keyDown(spot("G over “low”, line 2"), { key: "Delete" });
    expect(draftStore.load(null)?.draft.chart).toBe("    D\nlow tide");
    fireEvent.click(screen.getByTestId("other"));
    type("other-chord", "Quux");
    fireEvent.click(screen.getByTestId("put-other"));
    expect(screen.getByTestId("place-words").textContent).toMatch(/cannot be read/);
    type("other-chord", "Am7");
    fireEvent.click(screen.getByTestId("put-other"));
    expect(draftStore.load(null)?.draft.chart).toBe("Am7 D\nlow tide");
  });
});

test("a song on the shelf opens as it is, and is done with once it is kept", async () => {
  const song = await shelf.put("songs", aSong({ revision: 0 }));
  const { saved } = open(song);
  expect(value("song-chart")).toBe(song.chart);
  type("song-title", "Another name");
  save();
  await waitFor(() => expect(saved).toEqual([song.id]));
  expect(await shelf.get("songs", song.id)).toMatchObject({ title: "Another name", revision: 2 });
});
