import { screen } from "@testing-library/react";
import { refusal, setAccountStage, show, standAtHash, submit, type, valueOf } from "@/__tests__/client/accountStage";
import { session } from "@/features/api/session";
import { ResetForm } from "./ResetForm";

const mockSetParams = jest.fn();
jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
  useRouter: () => ({ setParams: mockSetParams }),
}));

const stage = setAccountStage({ signedIn: true });
const asks = "POST /auth/reset";
const token = "t".repeat(43);

beforeEach(() => {
  mockSetParams.mockClear();
  standAtHash(token);
});

it("changes the password by the link, takes the token out of the address, and signs out here", async () => {
  stage.answers[asks] = { status: 204 };
  show(<ResetForm />);
  expect(mockSetParams).toHaveBeenCalledWith({ "#": "" });
  type("New password", "harbour wall at seven");
  submit("New password");
  expect(await screen.findByTestId("reset-done")).toBeTruthy();
  expect(stage.sent(asks)).toEqual([{ token, password: "harbour wall at seven" }]);
  expect(session.current().status).toBe("visitor");
});

it("says at the field that a password is too short or easy to guess, and keeps it", async () => {
  show(<ResetForm />);
  type("New password", "short");
  submit("New password");
  expect(await screen.findByText("Use at least 12 characters.")).toBeTruthy();
  expect(stage.sent(asks)).toEqual([]);
  stage.answers[asks] = refusal(422, "invalid", "This password is easy to guess.", "password");
  type("New password", "password1234");
  submit("New password");
  expect(await screen.findByText("This password is easy to guess.")).toBeTruthy();
  expect(valueOf("New password")).toBe("password1234");
});

it("leads to a new link where this one is used up, and nobody is signed out for it", async () => {
  stage.answers[asks] = refusal(410, "link-not-valid", "This link is used up.");
  show(<ResetForm />);
  type("New password", "harbour wall at seven");
  submit("New password");
  expect((await screen.findByTestId("link-not-valid")).textContent).toMatch(/Your password is as it was/);
  expect(screen.getByRole("link", { name: "Ask for a new link" }).getAttribute("href")).toBe("/account/forgotten");
  expect(session.current().status).toBe("signed-in");
});

it("says so at once where the address holds no token", () => {
  standAtHash("");
  show(<ResetForm />);
  expect(screen.getByTestId("link-not-valid")).toBeTruthy();
});

it("keeps the password over a lost connection, and the link is still good", async () => {
  stage.offline = true;
  show(<ResetForm />);
  type("New password", "harbour wall at seven");
  submit("New password");
  expect(await screen.findByText(/What you typed is still here/)).toBeTruthy();
  stage.offline = false;
  stage.answers[asks] = { status: 204 };
  submit("New password");
  expect(await screen.findByTestId("reset-done")).toBeTruthy();
});
