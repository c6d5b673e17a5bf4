import { screen } from "@testing-library/react";
import { refusal, setAccountStage, show, submit, type, valueOf } from "@/__tests__/client/accountStage";
import { ForgottenForm } from "./ForgottenForm";

jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
}));

const stage = setAccountStage({ signedIn: false });
const asks = "POST /auth/forgotten";

beforeEach(() => {
  stage.answers[asks] = { status: 202 };
});

it("asks for an address before it sends anything", async () => {
  show(<ForgottenForm />);
  submit("Forgotten password");
  expect(await screen.findByText("Type your e-mail address.")).toBeTruthy();
  expect(stage.sent(asks)).toEqual([]);
});

it("says the same of every address, keeps it, and can be asked once more", async () => {
  show(<ForgottenForm />);
  type("E-mail address", "nobody@orlow.example");
  submit("Forgotten password");
  expect((await screen.findByTestId("link-sent")).textContent).toMatch(/If nobody@orlow\.example has an account/);
  expect(valueOf("E-mail address")).toBe("nobody@orlow.example");
  expect(screen.getByTestId("send").textContent).toBe("Send it once more");
  submit("Forgotten password");
  await screen.findByTestId("link-sent");
  expect(stage.sent(asks)).toEqual([{ email: "nobody@orlow.example" }, { email: "nobody@orlow.example" }]);
});

it("shows at the field what the server finds wrong with the address, which stays", async () => {
  stage.answers[asks] = refusal(422, "invalid", "Write an e-mail address, like name@example.org.", "email");
  show(<ForgottenForm />);
  type("E-mail address", "maren at the quay");
  submit("Forgotten password");
  expect(await screen.findByText("Write an e-mail address, like name@example.org.")).toBeTruthy();
  expect(screen.getByLabelText("E-mail address").getAttribute("aria-invalid")).toBe("true");
  expect(valueOf("E-mail address")).toBe("maren at the quay");
});

it("says how long to wait after too many tries, and that nothing is reached without a network", async () => {
  stage.answers[asks] = refusal(429, "too-many-tries", "That was tried too often. Try again in 12 minutes.");
  show(<ForgottenForm />);
  type("E-mail address", "maren@orlow.example");
  submit("Forgotten password");
  expect(await screen.findByText(/Try again in 12 minutes/)).toBeTruthy();
  stage.offline = true;
  submit("Forgotten password");
  expect(await screen.findByText(/cannot be reached.*What you typed is still here/)).toBeTruthy();
  expect(valueOf("E-mail address")).toBe("maren@orlow.example");
  expect(screen.queryByTestId("link-sent")).toBeNull();
});
