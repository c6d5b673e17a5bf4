import { QueryClientProvider } from "@tanstack/react-query";
import { act, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { aSong, aTake, aVoice } from "@/__tests__/client/belongings";
import { FakeApi } from "@/__tests__/client/fakeApi";
import { kept } from "@/__tests__/client/memoryIdb";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";
import { EnteredNotice } from "./EnteredNotice";
import { EntryPage } from "./EntryPage";
import type { EntryKind } from "./useEntry";

jest.mock("idb-keyval", () => jest.requireActual<{ memoryIdb: object }>("@/__tests__/client/memoryIdb").memoryIdb);
jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
  Redirect: ({ href }: { href: string }) => <output data-testid="redirect">{href}</output>,
}));

const email = "maren@orlow.example";
const password = "tide tables 1907";
let api: FakeApi;

beforeEach(async () => {
  localStorage.clear();
  kept.clear();
  api = new FakeApi();
  api.install();
  await session.settled();
});

afterEach(async () => {
  api.intercept = () => undefined;
  await act(() => session.signOut());
  queryClient.clear();
});

const open = (kind: EntryKind, next?: string) =>
  render(
    <QueryClientProvider client={queryClient}>
      <EntryPage kind={kind} next={next} />
    </QueryClientProvider>,
  );

const type = (label: string, text: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });
const value = (label: string) => (screen.getByLabelText(label) as HTMLInputElement).value;

function fillAndSend(form: "Sign up" | "Sign in", typed = { email, password }) {
  type("E-mail address", typed.email);
  type("Password", typed.password);
  fireEvent.click(within(screen.getByRole("form", { name: form })).getByRole("button", { name: form }));
}

it("signs up, moves in what is on the device, and goes back to where the person came from", async () => {
  const voice = aVoice();
  await shelf.put("voices", voice);
  await shelf.put("takes", aTake(voice.id));
  open("sign-up", "/songs/7");
  expect(await screen.findByText(/moves into your account: 1 voice and 1 take\./)).toBeTruthy();
  fillAndSend("Sign up");
  expect((await screen.findByTestId("redirect")).textContent).toBe("/songs/7");
  expect(api.tables.takes.size).toBe(1);
  expect([...kept.keys()]).toEqual([]);
});

it("goes to the account, where it is told, when something could not move", async () => {
  await shelf.put("songs", aSong({ title: "" }));
  open("sign-up", "/songs/7");
  fillAndSend("Sign up");
  expect((await screen.findByTestId("redirect")).textContent).toBe("/account");
});

it("leads to the songs, which say that one is in, where nobody said where to go", async () => {
  open("sign-up");
  fillAndSend("Sign up");
  expect((await screen.findByTestId("redirect")).textContent).toBe("/songs?entered=yes");
  const line = "You are signed in; what you did here is in your account.";
  const { rerender } = render(<EnteredNotice entered="yes" />);
  expect(screen.getByTestId("entered").textContent).toBe(line);
  rerender(<EnteredNotice entered={undefined} />);
  expect(screen.queryByTestId("entered")).toBeNull();
  rerender(<EnteredNotice entered="yes" />);
  await act(() => session.signOut());
  expect(screen.queryByTestId("entered")).toBeNull();
});

it("does not follow an address of another site", async () => {
  open("sign-up", "//elsewhere.example/songs");
  fillAndSend("Sign up");
  expect((await screen.findByTestId("redirect")).textContent).toBe("/songs?entered=yes");
});

it("says beside the field that a password is too short, sends nothing and keeps what was typed", async () => {
  open("sign-up");
  fillAndSend("Sign up", { email, password: "short" });
  expect(await screen.findByText("Use at least 12 characters.")).toBeTruthy();
  expect(api.calls).toEqual([]);
  expect([value("E-mail address"), value("Password")]).toEqual([email, "short"]);
  expect(screen.getByLabelText("Password").getAttribute("aria-invalid")).toBe("true");
  await waitFor(() => expect(document.activeElement).toBe(screen.getByLabelText("Password")));
});

it("shows the server's sentence for each field in place", async () => {
  open("sign-up");
  fillAndSend("Sign up", { email: "maren", password });
  expect(await screen.findByText("Write an e-mail address, like name@example.org.")).toBeTruthy();
  await waitFor(() => expect(document.activeElement).toBe(screen.getByLabelText("E-mail address")));
  expect(value("Password")).toBe(password);
});

it("signs up the same whether or not the address is known", async () => {
  api.addPerson(email, "another long one");
  open("sign-up");
  fillAndSend("Sign up");
  expect((await screen.findByTestId("redirect")).textContent).toBe("/songs?entered=yes");
});

const challenge = { status: 202, body: { challenge: "c-1", expiresInS: 300 } };
const refusal = (status: number, code: string, message: string, path?: string) => ({
  status,
  body: { code, message, ...(path === undefined ? {} : { fields: [{ path, message }] }) },
});

it("asks for the code after the password, keeps a wrong one, and goes in with the right one", async () => {
  const id = api.addPerson(email, password);
  await shelf.put("voices", aVoice());
  let answer: ReturnType<typeof api.intercept> = refusal(401, "wrong-code", "This code is not right.", "code");
  api.intercept = (_method, path) =>
    path === "/auth/sign-in" ? challenge : path === "/auth/second-step" ? answer : undefined;
  open("sign-in", "/songs/7");
  fillAndSend("Sign in");
  await waitFor(() => expect(document.activeElement).toBe(screen.getByLabelText("Code")));
  expect(screen.getByLabelText("Code").getAttribute("autocomplete")).toBe("one-time-code");
  type("Code", "123");
  fireEvent.submit(screen.getByRole("form"));
  expect(await screen.findByText("Type the six digits, or a recovery code.")).toBeTruthy();
  expect(api.count("POST /auth/second-step")).toBe(0);
  type("Code", "123456");
  fireEvent.submit(screen.getByRole("form"));
  expect(await screen.findByText("This code is not right.")).toBeTruthy();
  expect(value("Code")).toBe("123456");
  answer = api.sessionOf(id);
  fireEvent.submit(screen.getByRole("form"));
  expect((await screen.findByTestId("redirect")).textContent).toBe("/songs/7");
  expect(api.tables.voices.size).toBe(1);
});

it("goes back to the password with the address still there when the code took too long", async () => {
  api.intercept = (_method, path) =>
    path === "/auth/sign-in"
      ? challenge
      : path === "/auth/second-step"
        ? refusal(401, "challenge-expired", "That took too long. Type your password again.")
        : undefined;
  open("sign-in");
  fillAndSend("Sign in");
  fireEvent.change(await screen.findByLabelText("Code"), { target: { value: "123456" } });
  fireEvent.submit(screen.getByRole("form"));
  expect((await screen.findByTestId("password-again")).textContent).toMatch(/took too long/);
  expect([value("E-mail address"), value("Password")]).toEqual([email, ""]);
});

it("says that an account is suspended", async () => {
  api.intercept = () => refusal(403, "suspended", "This account is suspended. Write to whoever runs this server.");
  open("sign-in");
  fillAndSend("Sign in");
  expect((await screen.findByRole("alert")).textContent).toMatch(/suspended/);
  expect(value("E-mail address")).toBe(email);
});

it("says that address and password do not belong together, and keeps both", async () => {
  api.addPerson(email, password);
  open("sign-in");
  fillAndSend("Sign in", { email, password: "not the one" });
  const said = await screen.findByRole("alert");
  expect(said.textContent).toMatch(/do not belong together/);
  await waitFor(() => expect(document.activeElement?.contains(said)).toBe(true));
  expect(document.activeElement).not.toBe(document.body);
  expect([value("E-mail address"), value("Password")]).toEqual([email, "not the one"]);
  expect(api.count("POST /auth/refresh")).toBe(0);
});

it("keeps everything when there is no network, and succeeds at the next try", async () => {
  api.addPerson(email, password);
  api.intercept = () => "down";
  open("sign-in");
  fillAndSend("Sign in");
  expect(await screen.findByText(/cannot be reached.*What you typed is still here\./)).toBeTruthy();
  api.intercept = () => undefined;
  fireEvent.submit(screen.getByRole("form"));
  expect(await screen.findByTestId("redirect")).toBeTruthy();
});

it("is a form that password keepers understand", () => {
  const { unmount } = open("sign-up");
  expect(screen.getByLabelText("E-mail address").getAttribute("autocomplete")).toBe("email");
  const secret = screen.getByLabelText<HTMLInputElement>("Password");
  expect([secret.getAttribute("autocomplete"), secret.type]).toEqual(["new-password", "password"]);
  fireEvent.click(screen.getByText("Show password"));
  expect(secret.type).toBe("text");
  fireEvent.click(screen.getByText("Hide password"));
  expect(secret.type).toBe("password");
  unmount();
  open("sign-in");
  expect(screen.getByLabelText("Password").getAttribute("autocomplete")).toBe("current-password");
});

it("keeps the focus on the button while it is sent, and sends once however often it is pressed", async () => {
  api.addPerson(email, password);
  let answer: () => void = () => undefined;
  const held = new Promise<void>((resolve) => (answer = resolve));
  const send = globalThis.fetch;
  globalThis.fetch = (async (...asked: Parameters<typeof fetch>) => (await held, send(...asked))) as typeof fetch;
  open("sign-in");
  act(() => screen.getByTestId("send").focus());
  fillAndSend("Sign in");
  await waitFor(() => expect(screen.getByTestId("send").getAttribute("aria-disabled")).toBe("true"));
  expect(document.activeElement).toBe(screen.getByTestId("send"));
  fireEvent.click(screen.getByTestId("send"));
  answer();
  expect(await screen.findByTestId("redirect")).toBeTruthy();
  expect(api.count("POST /auth/sign-in")).toBe(1);
});

it("carries the way back over to the other form", () => {
  open("sign-in", "/songs/7");
  expect(screen.getByRole("link", { name: "Sign up" }).getAttribute("href")).toBe("/account/sign-up?next=%2Fsongs%2F7");
});

test.each(["sign-up", "sign-in"] as const)("keeps what was typed when a device is turned: %s", (kind) => {
  const widthWas = window.innerWidth;
  const turnTo = (width: number) =>
    act(() => {
      Object.defineProperty(document.documentElement, "clientWidth", { configurable: true, value: width });
      window.innerWidth = width;
      window.dispatchEvent(new Event("resize"));
    });
  turnTo(390);
  open(kind);
  type("E-mail address", email);
  type("Password", password);
  turnTo(1440);
  expect([value("E-mail address"), value("Password")]).toEqual([email, password]);
  turnTo(widthWas);
});
