import { QueryClientProvider } from "@tanstack/react-query";
import { fireEvent, render, screen, waitFor } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { shelf } from "@/features/api/shelf";
import type { Song } from "@/shared/contract/song";
import { draftStore } from "./draftStore";
import { EditScreen } from "./EditScreen";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ children }: { children: React.ReactNode }) => <a href="#x">{children}</a>,
}));

beforeEach(() => {
  localStorage.clear();
  kept.clear();
  refuseStorage(null);
  queryClient.clear();
});

function open(song: Song | null) {
  const saved: Song[] = [];
  const page = render(
    <QueryClientProvider client={queryClient}>
      <EditScreen song={song} onSaved={(each) => saved.push(each)} />
    </QueryClientProvider>,
  );
  return { saved, close: page.unmount };
}

const type = (testId: string, text: string) =>
  fireEvent.change(screen.getByTestId(testId), { target: { value: text } });
const value = (testId: string) => (screen.getByTestId(testId) as HTMLInputElement).value;
const save = () => fireEvent.click(screen.getByTestId("save-song"));

test("a new song comes on the shelf, and its draft goes", async () => {
  const { saved } = open(null);
  type("song-title", "Slack Water");
  type("song-chart", "G   C   D   G\nLow tide and still");
  save();
  await waitFor(() => expect(saved).toHaveLength(1));
  expect(await shelf.list("songs")).toEqual(saved);
  expect(draftStore.load(null)).toBeNull();
});

test("a page closed in the middle finds everything typed again, until it is thrown away", async () => {
  const first = open(null);
  type("song-title", "Slack");
  await waitFor(() => expect(draftStore.load(null)?.title).toBe("Slack"));
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

test("a song that is changed keeps its address, its demonstration mark and its day", async () => {
  const song = aSong({ demo: "ferry" });
  await shelf.put("songs", song);
  const { saved } = open(song);
  type("song-title", "Another name");
  save();
  await waitFor(() => expect(saved).toHaveLength(1));
  expect(await shelf.get("songs", song.id)).toEqual({ ...song, title: "Another name" });
});
