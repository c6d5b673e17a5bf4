import { QueryClientProvider, useQuery } from "@tanstack/react-query";
import { act, render, screen, waitFor } from "@testing-library/react";
import { aSong } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";
import { songQueries } from "./songQueries";
import { SignedOutNotice } from "./SignedOut";
import { SongState } from "./SongState";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => (
    <a href={typeof href === "string" ? href : "#x"}>{children}</a>
  ),
  usePathname: () => "/songs/7",
}));

let api: FakeApi;
const credentials = { email: "maren@orlow.example", password: "tide tables 1907" };

beforeEach(async () => {
  localStorage.clear();
  kept.clear();
  api = new FakeApi();
  api.install();
  await session.settled();
  await session.signUp(credentials);
});

afterEach(async () => {
  api.intercept = () => undefined;
  await act(() => session.signOut());
  queryClient.clear();
});

function Page({ id }: { id: string }) {
  return (
    <SongState query={useQuery(songQueries.detail(id))} title="Song">
      {(song) => <p>{song.title}</p>}
    </SongState>
  );
}
const open = (page: React.ReactNode) => render(<QueryClientProvider client={queryClient}>{page}</QueryClientProvider>);

it("opens a song of the loaded shelf without a connection", async () => {
  const song = await shelf.put("songs", aSong({ title: "Slack Water" }));
  await queryClient.fetchQuery(songQueries.all());
  api.intercept = () => "down";
  open(<Page id={song.id} />);
  expect(screen.getByText("Slack Water")).toBeTruthy();
  await waitFor(() => expect(queryClient.isFetching()).toBe(0));
  expect(screen.getByText("Slack Water")).toBeTruthy();
  expect(screen.queryByRole("alert")).toBeNull();
});

it("says of a song that was never loaded that there is no connection", async () => {
  api.intercept = () => "down";
  open(<Page id={aSong().id} />);
  expect((await screen.findByRole("alert")).textContent).toContain("cannot be reached");
});

it("says that one is signed out, not that the song is somebody else's, and leads back here", async () => {
  const song = await shelf.put("songs", aSong());
  api.endSessions();
  open(<Page id={song.id} />);
  expect((await screen.findByTestId("signed-out")).textContent).toContain("Sign in to see your songs");
  expect(screen.queryByTestId("no-such-song")).toBeNull();
  expect(screen.getByText("Sign in").closest("a")?.getAttribute("href")).toBe("/account/sign-in?next=%2Fsongs%2F7");
});

it("says so over the shelf too, until the person goes on without an account", async () => {
  api.endSessions();
  await expect(shelf.list("songs")).rejects.toMatchObject({ status: 401 });
  open(<SignedOutNotice />);
  expect(screen.getByTestId("signed-out").textContent).toContain("You are signed out");
  act(() => screen.getByTestId("stay-out").click());
  expect(screen.queryByTestId("signed-out")).toBeNull();
});
