import { fireEvent, screen, waitFor } from "@testing-library/react";
import { refusal, setAccountStage, show, submit, type, valueOf } from "@/__tests__/client/accountStage";
import { session } from "@/features/api/session";
import { DataPage } from "./DataPage";

const mockSaved = jest.fn();
jest.mock("@/features/api/saveFile", () => ({ saveFile: (file: unknown) => mockSaved(file) as unknown }));
jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const stage = setAccountStage({ signedIn: true });
beforeEach(() => {
  Element.prototype.scrollIntoView = () => undefined;
  mockSaved.mockClear();
  stage.answers["GET /account/person"] = { status: 200, body: { birthYear: 1979, country: "DE" } };
});

it("keeps year and country, and takes them back when they are emptied", async () => {
  const keeps = "PUT /account/person";
  stage.answers[keeps] = { status: 200, body: { birthYear: null, country: null } };
  show(<DataPage />);
  expect((await screen.findByTestId<HTMLInputElement>("birth-year")).value).toBe("1979");
  expect(screen.getByTestId<HTMLSelectElement>("country").value).toBe("DE");
  type("Year of birth", "");
  fireEvent.change(screen.getByTestId("country"), { target: { value: "" } });
  submit("About you");
  expect(await screen.findByText("Kept.")).toBeTruthy();
  expect(stage.sent(keeps)).toEqual([{ birthYear: null, country: null }]);
});

it("asks first where the year would end sharing and delete recordings, and keeps the old one unless that is meant", async () => {
  const keeps = "PUT /account/person";
  stage.answers[keeps] = refusal(409, "ends-sharing", "What you handed in there is deleted for good.");
  show(<DataPage />);
  await screen.findByTestId("birth-year");
  type("Year of birth", "2019");
  submit("About you");
  expect((await screen.findByRole("group", { name: "Stop sharing?" })).textContent).toMatch(/deleted for good/);
  fireEvent.click(screen.getByRole("button", { name: "Go on sharing" }));
  expect(valueOf("Year of birth")).toBe("1979");
  type("Year of birth", "2019");
  submit("About you");
  await screen.findByRole("group", { name: "Stop sharing?" });
  stage.answers[keeps] = { status: 200, body: { birthYear: 2019, country: "DE" } };
  fireEvent.click(screen.getByRole("button", { name: "Stop and delete them" }));
  expect(await screen.findByText("Kept.")).toBeTruthy();
  expect(stage.sent(keeps).at(-1)).toEqual({ birthYear: 2019, country: "DE", endsSharing: true });
});

it("says at the field that a year is none, sends nothing, and keeps what was typed", async () => {
  show(<DataPage />);
  await screen.findByTestId("birth-year");
  type("Year of birth", "79");
  submit("About you");
  expect(await screen.findByText("Give the year in four digits.")).toBeTruthy();
  expect(valueOf("Year of birth")).toBe("79");
  expect(stage.sent("PUT /account/person")).toEqual([]);
});

it("says that the facts could not be opened, and the other two cards stand", async () => {
  stage.answers["GET /account/person"] = refusal(404, "not-found", "This is gone.");
  show(<DataPage />);
  expect((await screen.findByRole("alert")).textContent).toMatch(/could not be opened/);
  expect(screen.getByTestId("export")).toBeTruthy();
  expect(screen.getByTestId("ask-erase")).toBeTruthy();
});

it("saves everything as a file of today, and says where it is", async () => {
  const send = globalThis.fetch;
  const zip = new Blob(["PK"]);
  globalThis.fetch = ((url: string, init: RequestInit) =>
    url === "/api/account/export" ? Promise.resolve({ ok: true, blob: async () => zip }) : send(url, init)) as never;
  show(<DataPage />);
  fireEvent.click(screen.getByTestId("export"));
  expect(await screen.findByText(/with your browser’s downloads/)).toBeTruthy();
  expect(mockSaved).toHaveBeenCalledWith({ name: expect.stringMatching(/^larkspan-\d{4}-\d\d-\d\d\.zip$/), blob: zip });
});

it("says that the file could not be made, and can be asked again", async () => {
  stage.answers["GET /account/export"] = refusal(429, "too-many-tries", "Try again in 9 minutes.");
  show(<DataPage />);
  fireEvent.click(screen.getByTestId("export"));
  expect((await screen.findByRole("alert")).textContent).toMatch(/could not be made.*9 minutes/);
  expect(screen.getByTestId("export").getAttribute("aria-disabled")).not.toBe("true");
  expect(mockSaved).not.toHaveBeenCalled();
});

it("erases only after the password, keeps a wrong one, and says the day and how to stay", async () => {
  const asks = "POST /account/erasure";
  stage.answers[asks] = refusal(403, "wrong-password", "This is not your password.", "password");
  show(<DataPage />);
  expect(screen.queryByLabelText("Password")).toBeNull();
  fireEvent.click(screen.getByTestId("ask-erase"));
  await waitFor(() => expect(document.activeElement).toBe(screen.getByLabelText("Password")));
  submit("Erase the account");
  expect(await screen.findByText("Type your password.")).toBeTruthy();
  type("Password", "not the one");
  submit("Erase the account");
  expect(await screen.findByText("This is not your password.")).toBeTruthy();
  expect(valueOf("Password")).toBe("not the one");
  stage.answers[asks] = { status: 202, body: { eraseAt: "2026-12-15T10:00:00.000Z" } };
  submit("Erase the account");
  expect((await screen.findByTestId("erasure-asked")).textContent).toMatch(/On 15 December 2026/);
  expect(session.current().status).toBe("visitor");
});

it("asks to sign in first, with the way back", async () => {
  await session.signOut();
  show(<DataPage />);
  expect(screen.getByRole("link", { name: "Sign in" }).getAttribute("href")).toBe(
    "/account/sign-in?next=%2Faccount%2Fdata",
  );
});
