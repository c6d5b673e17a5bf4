import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aDecision, aSong, aVoice } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept, refuseStorage } from "@/__tests__/client/memoryIdb";
import { moveIn } from "@/features/api/moveIn";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { SessionProvider } from "@/features/api/SessionProvider";
import { shelf } from "@/features/api/shelf";
import { ThemeProvider } from "@/features/ui/ThemeProvider";
import { AccountPage } from "./AccountPage";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const credentials = { email: "maren@orlow.example", password: "tide tables 1907" };
let api: FakeApi;

beforeEach(async () => {
  localStorage.clear();
  kept.clear();
  refuseStorage(null);
  api = new FakeApi();
  api.install();
  await session.settled();
});

afterEach(async () => {
  api.intercept = () => undefined;
  await act(() => session.signOut());
  queryClient.clear();
});

const open = () =>
  render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <SessionProvider>
          <AccountPage />
        </SessionProvider>
      </ThemeProvider>
    </QueryClientProvider>,
  );

it("tells a visitor what is on this device and offers to keep it", async () => {
  await shelf.put("voices", aVoice());
  open();
  expect((await screen.findByText(/You have 1 voice here/)).textContent).toMatch(/until you sign up/);
  expect(screen.getByRole("link", { name: "Sign up to keep it" }).getAttribute("href")).toBe(
    "/account/sign-up?next=%2Faccount",
  );
});

it("tells a visitor who did nothing yet what an account is for", async () => {
  await shelf.put("songs", aSong({ demo: "ferry" }));
  open();
  expect(await screen.findByRole("link", { name: "Sign up" })).toBeTruthy();
  expect(screen.getByTestId("on-this-device").textContent).toMatch(/works without one/);
});

it("says it when the browser keeps nothing", async () => {
  refuseStorage(new DOMException("denied", "SecurityError"));
  open();
  expect(await screen.findByText(/private window/)).toBeTruthy();
});

it("signs out: the session is over at the server and nothing of the account is left behind", async () => {
  await session.signUp(credentials);
  await shelf.put("songs", aSong());
  await queryClient.fetchQuery({ queryKey: ["songs"], queryFn: () => shelf.list("songs") });
  open();
  expect(screen.getByTestId("account-email").textContent).toBe(credentials.email);
  fireEvent.click(screen.getByTestId("sign-out"));
  expect(await screen.findByRole("link", { name: "Sign in" })).toBeTruthy();
  expect(api.count("POST /auth/sign-out")).toBe(1);
  expect(queryClient.getQueryData(["songs"])).toBeUndefined();
  expect(kept.size).toBe(0);
  expect(await shelf.list("songs")).toEqual([]);
});

it("says that one is still signed in where the server could not be told", async () => {
  await session.signUp(credentials);
  open();
  api.intercept = () => "down";
  fireEvent.click(screen.getByTestId("sign-out"));
  expect(await screen.findByText("You are still signed in")).toBeTruthy();
  expect(screen.getByTestId("account-email")).toBeTruthy();
});

it("finishes an interrupted move when the network is back", async () => {
  const song = aSong();
  await shelf.put("songs", song);
  await session.signUp(credentials);
  api.intercept = (method) => (method === "PUT" ? "down" : undefined);
  open();
  expect(await screen.findByText("The move was interrupted")).toBeTruthy();
  api.intercept = () => undefined;
  fireEvent(window, new Event("online"));
  expect(await screen.findByText("1 thing moved from this device into your account.")).toBeTruthy();
  expect(api.tables.songs.has(song.id)).toBe(true);
});

it("names what could not move, and why", async () => {
  const song = aSong({ title: " " });
  await shelf.put("songs", song);
  await shelf.put("decisions", aDecision(song.id, null));
  await session.signUp(credentials);
  await moveIn.afterSignUp();
  open();
  const notice = await screen.findByTestId("move-in");
  await waitFor(() =>
    expect(
      within(notice)
        .getAllByRole("listitem")
        .map((each) => each.textContent),
    ).toEqual([
      "Without a title: Give the song a title.",
      "The key you chose for a song: What it belongs to stayed here.",
    ]),
  );
});

it("keeps the choice of light, and goes back to the system's", async () => {
  open();
  fireEvent.click(screen.getByRole("radio", { name: "Lamplight" }));
  expect(document.documentElement.dataset.scheme).toBe("lamplight");
  expect(screen.getByRole("radio", { name: "Lamplight" }).getAttribute("aria-checked")).toBe("true");
  fireEvent.click(screen.getByRole("radio", { name: "As the system" }));
  expect(document.documentElement.dataset.scheme).toBeUndefined();
});
