import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { refusal, setAccountStage, show } from "@/__tests__/client/accountStage";
import { session } from "@/features/api/session";
import { SessionsList } from "./SessionsList";

const stage = setAccountStage({ signedIn: true });
const lists = "GET /account/sessions";
const one = (k: number, device: string, current = false) => ({
  id: `00000000-0000-4000-8000-00000000000${k}`,
  device,
  begunAt: "2026-03-03T14:05:00.000Z",
  lastUsedAt: "2026-03-04T09:30:00.000Z",
  current,
});
const here = one(1, "Firefox on Linux", true);
const phone = one(2, "Safari on iPhone");

beforeEach(() => {
  stage.answers[lists] = { status: 200, body: [here, phone] };
});

it("lists where one is signed in, and says which of them this is", async () => {
  show(<SessionsList />);
  const items = within(await screen.findByTestId("sessions")).getAllByRole("listitem");
  expect(items.map(({ textContent }) => textContent)).toEqual([
    expect.stringMatching(/^Firefox on Linux, this oneLast used .*begun 3 Mar 2026/),
    expect.stringMatching(/^Safari on iPhoneLast used 4 Mar 2026/),
  ]);
});

it("ends one and asks for the list anew", async () => {
  const path = `DELETE /account/sessions/${phone.id}`;
  stage.answers[path] = { status: 204 };
  show(<SessionsList />);
  const button = await screen.findByRole("button", { name: "Sign out of Safari on iPhone" });
  stage.answers[lists] = { status: 200, body: [here] };
  fireEvent.click(button);
  await waitFor(() => expect(screen.queryByText("Safari on iPhone")).toBeNull());
  expect(stage.sent(path)).toHaveLength(1);
  expect(session.current().status).toBe("signed-in");
  expect(screen.queryByTestId("end-others")).toBeNull();
});

it.each([
  ["end-this", `DELETE /account/sessions/${here.id}`],
  ["end-all", "DELETE /account/sessions"],
])("signs out here too by %s", async (button, path) => {
  stage.answers[path] = { status: 204 };
  show(<SessionsList />);
  fireEvent.click(await screen.findByTestId(button));
  await waitFor(() => expect(session.current().status).toBe("visitor"));
});

it("keeps this one when all others end", async () => {
  stage.answers["DELETE /account/sessions?keepThis=true"] = { status: 204 };
  show(<SessionsList />);
  const button = await screen.findByTestId("end-others");
  stage.answers[lists] = { status: 200, body: [here] };
  fireEvent.click(button);
  await waitFor(() => expect(screen.queryByText("Safari on iPhone")).toBeNull());
  expect(session.current().status).toBe("signed-in");
});

it("says that one is still signed in there when it could not be ended", async () => {
  stage.answers[`DELETE /account/sessions/${phone.id}`] = refusal(404, "not-found", "There is no such session.");
  show(<SessionsList />);
  fireEvent.click(await screen.findByTestId("end-session"));
  expect((await screen.findByRole("alert")).textContent).toMatch(/still signed in there/);
  expect(screen.getByText("Safari on iPhone")).toBeTruthy();
});

it("says that the list cannot be had without a network, and has it at the next try", async () => {
  stage.offline = true;
  show(<SessionsList />);
  expect((await screen.findByRole("alert")).textContent).toMatch(/could not be listed.*cannot be reached/);
  stage.offline = false;
  fireEvent.click(screen.getByText("Try again"));
  expect(await screen.findByTestId("sessions")).toBeTruthy();
});
