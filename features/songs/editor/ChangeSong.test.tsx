import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import { songVersions } from "@/features/api/songVersions";
import type { Song } from "@/shared/contract/song";
import { ChangeSong } from "./ChangeSong";
import { draftStore } from "./keep/draftStore";
import { draftOf } from "./songDraft";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
}));

beforeEach(() => {
  localStorage.clear();
  sessionStorage.clear();
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
  jest.useFakeTimers();
});
afterEach(() => jest.useRealTimers());

function open(song: Song) {
  const done = jest.fn();
  const view = (shown: Song) => (
    <QueryClientProvider client={queryClient}>
      <ChangeSong song={shown} onDone={done} />
    </QueryClientProvider>
  );
  const page = render(view(song));
  return { done, close: page.unmount, refetched: (newer: Song) => page.rerender(view(newer)) };
}

const type = (testId: string, text: string) =>
  fireEvent.change(screen.getByTestId(testId), { target: { value: text } });
const value = (testId: string) => (screen.getByTestId(testId) as HTMLInputElement).value;
const save = () => fireEvent.click(screen.getByTestId("save-song"));
const keptWords = () => screen.getByTestId("kept-words").textContent;
const pass = (ms: number) => act(() => jest.advanceTimersByTimeAsync(ms));

test("is kept by itself a moment after typing, with its address, its mark and its day", async () => {
  const song = await shelf.put("songs", aSong({ demo: "ferry", revision: 0 }));
  open(song);
  expect(keptWords()).toBe("Changes are kept by themselves");
  type("song-title", "Another name");
  expect(draftStore.load(song.id)?.draft.title).toBe("Another name");
  await pass(2000);
  expect(keptWords()).toMatch(/^Kept \d\d:\d\d$/);
  expect(await shelf.get("songs", song.id)).toEqual({ ...song, title: "Another name", revision: 2 });
  expect(draftStore.load(song.id)).toBeNull();
});

test("is kept when the page is left before that moment", async () => {
  const song = await shelf.put("songs", aSong({ revision: 0 }));
  const page = open(song);
  type("song-title", "Left in haste");
  page.close();
  await pass(0);
  expect((await shelf.get("songs", song.id)).title).toBe("Left in haste");
});

test("is not kept without a title, and says so at the field", async () => {
  const song = await shelf.put("songs", aSong({ revision: 0 }));
  open(song);
  type("song-title", "");
  await pass(2000);
  expect(keptWords()).toMatch(/something needs mending/);
  expect(screen.getByTestId("song-title").getAttribute("aria-invalid")).toBe("true");
  expect((await shelf.get("songs", song.id)).title).toBe(song.title);
});

test("a change elsewhere is told, both go together, and both stay in the earlier versions", async () => {
  const song = await shelf.put("songs", aSong({ title: "Slack", chart: "one\ntwo\nthree", revision: 0 }));
  const { done } = open(song);
  await shelf.put("songs", { ...song, chart: "one\ntwo\nthree there" });
  type("song-chart", "one here\ntwo\nthree");
  await pass(2000);
  expect(screen.getByTestId("clash").textContent).toMatch(/Both changes fit together/);
  fireEvent.click(screen.getByTestId("clash-merge"));
  await pass(2000);
  expect((await shelf.get("songs", song.id)).chart).toBe("one here\ntwo\nthree there");
  expect(value("song-chart")).toBe("one here\ntwo\nthree there");
  fireEvent.click(screen.getByTestId("undo"));
  expect(value("song-chart")).toBe("one here\ntwo\nthree");
  fireEvent.click(screen.getByTestId("redo"));
  save();
  await pass(0);
  expect(done).toHaveBeenCalledTimes(1);
  const versions = await songVersions.list(song.id);
  expect(versions).toHaveLength(2);
});

test("what is fetched anew while one types changes nothing of where one began: the change elsewhere is told", async () => {
  const song = await shelf.put("songs", aSong({ chart: "one\ntwo", revision: 0 }));
  const { refetched } = open(song);
  type("song-chart", "one here\ntwo");
  const theirs = await shelf.put("songs", { ...song, chart: "one there\ntwo" });
  refetched(theirs);
  expect(value("song-chart")).toBe("one here\ntwo");
  expect(draftStore.load(song.id)?.base).toEqual(song);
  await pass(2000);
  expect(screen.getByTestId("clash").textContent).toMatch(/One place was changed in both.*one here.*one there/);
  expect((await shelf.get("songs", song.id)).chart).toBe("one there\ntwo");
});

test("what is fetched anew before anything was typed is shown, and typing goes on from there", async () => {
  const song = await shelf.put("songs", aSong({ chart: "one\ntwo", revision: 0 }));
  const { refetched } = open(song);
  const theirs = await shelf.put("songs", { ...song, chart: "one there\ntwo" });
  refetched(theirs);
  expect(value("song-chart")).toBe("one there\ntwo");
  type("song-chart", "one there\ntwo here");
  await pass(2000);
  expect(screen.queryByTestId("clash")).toBeNull();
  expect((await shelf.get("songs", song.id)).chart).toBe("one there\ntwo here");
});

test("a draft found again after a reload still knows where it began", async () => {
  const song = await shelf.put("songs", aSong({ chart: "one\ntwo", revision: 0 }));
  const theirs = await shelf.put("songs", { ...song, chart: "one there\ntwo" });
  const draft = { ...draftOf(song), chart: "one here\ntwo" };
  draftStore.save(song.id, draft, song);
  open(theirs);
  expect(value("song-chart")).toBe("one here\ntwo");
  await pass(2000);
  expect(screen.getByTestId("clash")).toBeTruthy();
  expect((await shelf.get("songs", song.id)).chart).toBe("one there\ntwo");
});

test("where both changed the same line, one chooses; taking theirs keeps mine in the earlier versions", async () => {
  const song = await shelf.put("songs", aSong({ chart: "one\ntwo", revision: 0 }));
  open(song);
  await shelf.put("songs", { ...song, chart: "one there\ntwo" });
  type("song-chart", "one here\ntwo");
  await pass(2000);
  expect(screen.getByTestId("clash").textContent).toMatch(/One place was changed in both.*one here.*one there/);
  fireEvent.click(screen.getByTestId("clash-theirs"));
  await pass(2000);
  expect((await shelf.get("songs", song.id)).chart).toBe("one there\ntwo");
  const entries = await songVersions.list(song.id);
  const charts = await Promise.all(entries.map(async ({ id }) => (await songVersions.get(song.id, id)).song.chart));
  expect(charts).toContain("one here\ntwo");
  expect(charts).toContain("one there\ntwo");
  expect(keptWords()).toMatch(/^Kept/);
});
