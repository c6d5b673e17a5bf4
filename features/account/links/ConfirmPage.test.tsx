import { act, screen } from "@testing-library/react";
import { refusal, setAccountStage, show, standAtHash } from "@/__tests__/client/accountStage";
import { session } from "@/features/api/session";
import { ConfirmPage } from "./ConfirmPage";
import { keptTokens } from "@/features/api/keptTokens";

jest.mock("expo-router", () => ({
  Link: ({ href, children }: { href: string; children: React.ReactNode }) => <a href={href}>{children}</a>,
  useRouter: () => ({ setParams: () => undefined }),
}));

const stage = setAccountStage({ signedIn: true });
const asks = "POST /account/email/confirm";
const token = "c".repeat(43);
const confirmed = () => ({ ...session.current().account!, confirmed: true, email: "maren@quay.example" });

beforeEach(() => {
  keptTokens.confirm.clear();
  standAtHash(token);
});

it("confirms once, and the account of the page knows it", async () => {
  stage.answers[asks] = { status: 200, body: confirmed() };
  show(<ConfirmPage />);
  expect((await screen.findByTestId("confirmed")).textContent).toMatch(/maren@quay\.example is the address/);
  expect(stage.sent(asks)).toEqual([{ token }]);
  expect(session.current().account?.email).toBe("maren@quay.example");
  expect(keptTokens.confirm.read()).toBe("");
});

it("keeps the link while its owner signs in, then confirms by itself", async () => {
  stage.answers[asks] = { status: 200, body: confirmed() };
  await act(() => session.signOut());
  const { unmount } = show(<ConfirmPage />);
  expect(screen.getByTestId("confirm-sign-in")).toBeTruthy();
  expect(stage.sent(asks)).toEqual([]);
  unmount();
  standAtHash("");
  await act(() => session.signIn({ email: "maren@orlow.example", password: "tide tables 1907" }));
  show(<ConfirmPage />);
  expect(await screen.findByTestId("confirmed")).toBeTruthy();
  expect(stage.sent(asks)).toEqual([{ token }]);
});

it("says that a link does not work, and forgets it", async () => {
  stage.answers[asks] = refusal(410, "link-not-valid", "This link is used up.");
  show(<ConfirmPage />);
  expect(await screen.findByTestId("link-not-valid")).toBeTruthy();
  expect(keptTokens.confirm.read()).toBe("");
});

it("says whose the address is now, and offers no second try", async () => {
  stage.answers[asks] = refusal(409, "address-in-use", "Another account uses this address. Sign in to that one.");
  show(<ConfirmPage />);
  expect((await screen.findByRole("alert")).textContent).toMatch(/Sign in to that one/);
  expect(screen.queryByText("Try again")).toBeNull();
});

it("tries again with the same link after a lost connection", async () => {
  stage.offline = true;
  show(<ConfirmPage />);
  const again = await screen.findByText("Try again");
  stage.offline = false;
  stage.answers[asks] = { status: 200, body: confirmed() };
  act(() => again.click());
  expect(await screen.findByTestId("confirmed")).toBeTruthy();
});
