import { act, fireEvent, screen, waitFor } from "@testing-library/react";
import { refusal, setAccountStage, show, submit, type, valueOf } from "@/__tests__/client/accountStage";
import { PeoplePage } from "./PeoplePage";

const stage = setAccountStage({ signedIn: true });
const person = (k: number, change: object = {}) => ({
  id: `10000000-0000-4000-8000-0000000000${String(k).padStart(2, "0")}`,
  email: `singer-${k}@orlow.example`,
  role: "singer",
  confirmed: true,
  secondFactor: false,
  suspended: false,
  eraseAt: null,
  createdAt: "2026-03-01T10:00:00.000Z",
  lastSeenAt: null,
  ...change,
});
const page = (from: number, count: number) => Array.from({ length: count }, (_, k) => person(from + k));

beforeEach(() => {
  // jsdom scrolls nothing.
  Element.prototype.scrollIntoView = () => undefined;
});

/** Fifty rows take a busy machine more than a moment. */
const shown = (words: string | RegExp) => screen.findByText(words, {}, { timeout: 10_000 });

it("shows who has an account, page by page", async () => {
  stage.answers["GET /admin/users"] = { status: 200, body: page(0, 50) };
  stage.answers[`GET /admin/users?after=${person(49).id}`] = { status: 200, body: [person(50, { suspended: true })] };
  show(<PeoplePage />);
  expect(await shown("50 shown")).toBeTruthy();
  fireEvent.click(screen.getByTestId("show-more"));
  expect(await shown("51 shown")).toBeTruthy();
  expect(screen.getByText("suspended, confirmed")).toBeTruthy();
  expect(screen.queryByTestId("show-more")).toBeNull();
});

it("keeps what is shown when the next page cannot be had, says why, and can be asked again", async () => {
  stage.answers["GET /admin/users"] = { status: 200, body: page(0, 50) };
  show(<PeoplePage />);
  await shown("50 shown");
  stage.offline = true;
  fireEvent.click(screen.getByTestId("show-more"));
  expect(await shown(/cannot be reached/)).toBeTruthy();
  expect(screen.getByText("50 shown")).toBeTruthy();
  stage.offline = false;
  stage.answers[`GET /admin/users?after=${person(49).id}`] = { status: 200, body: [person(50)] };
  fireEvent.click(screen.getByTestId("show-more"));
  expect(await shown("51 shown")).toBeTruthy();
});

it("looks for a part of an address, keeps it in the field, and says when nobody has it", async () => {
  stage.answers["GET /admin/users"] = { status: 200, body: page(0, 2) };
  stage.answers["GET /admin/users?q=captain"] = { status: 200, body: [] };
  show(<PeoplePage />);
  await screen.findByText("2 shown");
  type("Part of an e-mail address", " captain ");
  submit("Look for people");
  expect(await screen.findByText("Nobody has such an address.")).toBeTruthy();
  expect(valueOf("Part of an e-mail address")).toBe(" captain ");
});

it("suspends somebody and lets them in again, and gives another role, each after it was asked", async () => {
  const { id } = person(1);
  stage.answers["GET /admin/users"] = { status: 200, body: [person(1)] };
  stage.answers[`PUT /admin/users/${id}/suspension`] = { status: 200, body: person(1, { suspended: true }) };
  stage.answers[`PUT /admin/users/${id}/role`] = { status: 200, body: person(1, { role: "teacher" }) };
  show(<PeoplePage />);
  const suspend = await screen.findByRole("button", { name: "Suspend: singer-1@orlow.example" });
  stage.answers["GET /admin/users"] = { status: 200, body: [person(1, { suspended: true })] };
  fireEvent.click(suspend);
  expect(screen.getByRole("group", { name: "Suspend singer-1@orlow.example?" })).toBeTruthy();
  fireEvent.click(screen.getByTestId("remove-confirmed"));
  expect(await screen.findByRole("button", { name: "Let in again: singer-1@orlow.example" })).toBeTruthy();
  expect(screen.queryByTestId("remove-asked")).toBeNull();
  fireEvent.change(screen.getByRole("combobox", { name: "Role of singer-1@orlow.example" }), {
    target: { value: "teacher" },
  });
  fireEvent.click(screen.getByText("Make them a teacher"));
  await waitFor(() => expect(stage.sent(`PUT /admin/users/${id}/role`)).toEqual([{ role: "teacher" }]));
  expect(stage.sent(`PUT /admin/users/${id}/suspension`)).toEqual([{ suspended: true }]);
});

it("makes nobody an administrator by an arrow key alone, and goes back to the list of roles", async () => {
  const { id } = person(1);
  stage.answers["GET /admin/users"] = { status: 200, body: [person(1)] };
  show(<PeoplePage />);
  const role = await screen.findByRole<HTMLSelectElement>("combobox", { name: "Role of singer-1@orlow.example" });
  act(() => role.focus());
  fireEvent.change(role, { target: { value: "admin" } });
  expect(screen.getByRole("group", { name: "Make singer-1@orlow.example an administrator?" })).toBe(
    document.activeElement,
  );
  fireEvent.click(screen.getByText("Leave it"));
  expect(screen.queryByTestId("remove-asked")).toBeNull();
  expect(document.activeElement).toBe(role);
  expect(role.value).toBe("singer");
  expect(stage.sent(`PUT /admin/users/${id}/role`)).toEqual([]);
});

it("says that nothing was changed where the server refuses", async () => {
  const { id } = person(1);
  stage.answers["GET /admin/users"] = { status: 200, body: [person(1)] };
  stage.answers[`PUT /admin/users/${id}/suspension`] = refusal(409, "own-account", "Leave your own account to others.");
  show(<PeoplePage />);
  fireEvent.click(await screen.findByText("Suspend"));
  fireEvent.click(screen.getByTestId("remove-confirmed"));
  expect(await screen.findByText(/Nothing was changed.*Leave your own account/)).toBeTruthy();
});

it("says that the people could not be listed, with a way to try again", async () => {
  stage.offline = true;
  show(<PeoplePage />);
  expect((await screen.findByRole("alert")).textContent).toMatch(/could not be listed/);
  stage.offline = false;
  stage.answers["GET /admin/users"] = { status: 200, body: [] };
  fireEvent.click(screen.getByText("Try again"));
  expect(await screen.findByText("Nobody has such an address.")).toBeTruthy();
});
