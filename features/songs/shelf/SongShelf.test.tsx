import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { useState } from "react";
import { aSong } from "@/__tests__/client/belongings";
import { kept } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { SongShelf } from "./SongShelf";
import { readView, type ShelfView } from "./shelfView";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("./demoShelf", () => ({ seedDemoSongs: async () => undefined }));
jest.mock("expo-router", () => ({
  Link: ({ href, children, ...rest }: { href: unknown; children: React.ReactNode; testID?: string }) => (
    <a href={JSON.stringify(href)} data-testid={rest.testID}>
      {children}
    </a>
  ),
}));

const voice = { range: { lowMidi: 52, highMidi: 70 }, comfort: { lowMidi: 55, highMidi: 66 } };
const span = (lowMidi: number, highMidi: number) => ({ kind: "span" as const, lowMidi, highMidi, home: "D" });

beforeEach(async () => {
  kept.clear();
  queryClient.clear();
  window.scrollTo = () => undefined;
  // The DOM of the tests knows dialogs, but not how to open them.
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function () {
    this.open = false;
  };
});

function Page({ start, sung }: { start: Partial<ShelfView>; sung: boolean }) {
  const [view, setView] = useState<ShelfView>({ ...readView({}), ...start });
  return (
    <QueryClientProvider client={queryClient}>
      <SongShelf
        view={view}
        onView={(change) => setView((before) => ({ ...before, ...change }))}
        voice={sung ? voice : null}
        mineOf={noKeys}
      />
    </QueryClientProvider>
  );
}
const noKeys = () => null;

async function open(songs: Song[], start: Partial<ShelfView> = {}, sung = false) {
  for (const song of songs) await shelf.put("songs", song);
  render(<Page start={start} sung={sung} />);
  await waitFor(() => expect(screen.queryByText("Opening your songs")).toBeNull());
}
const titles = () => screen.getAllByRole("listitem").map((row) => within(row).getByRole("link").textContent);
const found = (words: string) => waitFor(() => expect(screen.getByText(words)).toBeTruthy());

test("each row says its place in the list, its key, its tags and its span over the voice", async () => {
  await open(
    [aSong({ title: "Gulls", tags: ["slow", "choir"], tune: span(57, 66) }), aSong({ title: "Terns" })],
    {},
    true,
  );
  const [first, second] = screen.getAllByRole("listitem");
  expect(first?.getAttribute("aria-posinset")).toBe("1");
  expect(first?.getAttribute("aria-setsize")).toBe("2");
  expect(first?.textContent).toContain("DGullsWritten in D.slow · choir");
  expect(within(first!).getByRole("img").getAttribute("aria-label")).toBe("A3 to F♯4, all of it comfortable");
  expect(second?.textContent).toContain("Written in D, no melody yet.");
});

test("typing narrows the shelf after a pause, keeps the focus and says what was found", async () => {
  await open([aSong({ title: "Gulls" }), aSong({ title: "Slack Water", chart: "D\nthe tide stands" })]);
  const field = screen.getByLabelText("Search titles, tags and words");
  field.focus();
  fireEvent.change(field, { target: { value: "TIDE" } });
  await found("1 song found");
  expect(titles()).toEqual([expect.stringContaining("Slack Water")]);
  expect(document.activeElement).toBe(field);
  fireEvent.change(field, { target: { value: "anchor" } });
  await found("No title, no tag and no line holds “anchor”. Try a word from the chorus.");
});

test("a tag gathers its songs, and lets them go again", async () => {
  await open([aSong({ title: "Gulls", tags: ["slow"] }), aSong({ title: "Terns" })]);
  fireEvent.click(await screen.findByTestId("tag-slow"));
  await found("1 song with the tag slow");
  fireEvent.click(screen.getByTestId("tag-slow"));
  await found("2 songs");
});

test("by fit the song that sits best stands first; without a voice it says what is missing", async () => {
  const songs = [aSong({ title: "A wide one", tune: span(45, 75) }), aSong({ title: "Narrow", tune: span(60, 64) })];
  await open(songs, { sort: "fit" }, true);
  await waitFor(() => expect(titles()[0]).toContain("Narrow"));
  act(() => void queryClient.clear());
});

test("without a voice the fit says what is missing", async () => {
  await open([aSong()], { sort: "fit" });
  expect(screen.getByText("Fit needs a voice")).toBeTruthy();
});

test("put aside, a song can be had back at once", async () => {
  const song = aSong({ title: "Gulls" });
  await open([song, aSong({ title: "Terns" })]);
  fireEvent.click(screen.getByTestId(`menu-${song.id}`));
  fireEvent.click(screen.getByTestId("menu-archive"));
  await found("“Gulls” is put aside.");
  await waitFor(() => expect(titles()).toHaveLength(1));
  fireEvent.click(screen.getByTestId("undo"));
  await found("“Gulls” is back on your shelf.");
  await waitFor(() => expect(titles()).toHaveLength(2));
  expect((await shelf.get("songs", song.id)).archivedAt).toBeNull();
});

test("tags are added and taken off from the row", async () => {
  const song = aSong({ title: "Gulls", tags: ["slow"] });
  await open([song, aSong({ title: "Terns", tags: ["choir"] })]);
  fireEvent.click(screen.getByTestId(`menu-${song.id}`));
  fireEvent.click(screen.getByTestId("menu-tags"));
  fireEvent.click(await screen.findByTestId("suggest-choir"));
  await waitFor(async () => expect((await shelf.get("songs", song.id)).tags).toEqual(["slow", "choir"]));
  fireEvent.click(screen.getByTestId("untag-slow"));
  await waitFor(async () => expect((await shelf.get("songs", song.id)).tags).toEqual(["choir"]));
});

test("a copy stands beside its song", async () => {
  const song = aSong({ title: "Gulls" });
  await open([song]);
  fireEvent.click(screen.getByTestId(`menu-${song.id}`));
  fireEvent.click(screen.getByTestId("menu-duplicate"));
  await found("“Copy of Gulls” stands on your shelf.");
  await waitFor(() => expect(titles()).toHaveLength(2));
});

test("an empty shelf says what it will be and offers the next steps", async () => {
  await open([]);
  expect(screen.getByRole("heading", { name: "No songs yet" })).toBeTruthy();
  expect(screen.getByText("Add a song").closest("a")?.getAttribute("href")).toBe('"/songs/new"');
  expect(screen.getByText("Import files").closest("a")?.getAttribute("href")).toBe('"/songs/import"');
});
