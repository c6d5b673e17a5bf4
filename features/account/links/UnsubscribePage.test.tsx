import { fireEvent, screen } from "@testing-library/react";
import { refusal, setAccountStage, show, standAtHash } from "@/__tests__/client/accountStage";
import { UnsubscribePage } from "./UnsubscribePage";

jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
  useRouter: () => ({ setParams: () => undefined }),
}));

const stage = setAccountStage({ signedIn: false });
const asks = "POST /mail/unsubscribe?token=abc";

beforeEach(() => {
  standAtHash("abc");
});

it("asks before it stops anything, then says which mails have ended", async () => {
  stage.answers[asks] = { status: 200, body: { kind: "weekly" } };
  show(<UnsubscribePage />);
  expect(stage.sent(asks)).toEqual([]);
  fireEvent.click(screen.getByTestId("unsubscribe"));
  expect((await screen.findByTestId("unsubscribed")).textContent).toMatch(/“Your week” is switched off/);
});

it("can be pressed again after a lost connection", async () => {
  stage.offline = true;
  show(<UnsubscribePage />);
  fireEvent.click(screen.getByTestId("unsubscribe"));
  expect((await screen.findByTestId("form-problem")).textContent).toMatch(/cannot be reached/);
  stage.offline = false;
  stage.answers[asks] = { status: 200, body: { kind: "assigned" } };
  fireEvent.click(screen.getByTestId("unsubscribe"));
  expect(await screen.findByTestId("unsubscribed")).toBeTruthy();
});

it("leads to the choices where the link is none of ours", async () => {
  stage.answers[asks] = refusal(404, "not-found", "This link is not one of ours.");
  show(<UnsubscribePage />);
  fireEvent.click(screen.getByTestId("unsubscribe"));
  expect(await screen.findByTestId("link-not-valid")).toBeTruthy();
  expect(screen.getByRole("link", { name: "Choose which mails you get" }).getAttribute("href")).toBe("/account/mail");
});
