import { fireEvent, screen, waitFor } from "@testing-library/react";
import { field, refusal, setAccountStage, show, submit, type, valueOf } from "@/__tests__/client/accountStage";
import { ChangePassword } from "./ChangePassword";

const stage = setAccountStage({ signedIn: true });
const asks = "POST /account/password";

async function unfold() {
  show(<ChangePassword />);
  fireEvent.click(screen.getByTestId("change-password"));
  await waitFor(() => expect(document.activeElement).toBe(field("Present password")));
}

it("unfolds on wish, changes the password, folds up again and says what has ended", async () => {
  stage.answers[asks] = { status: 204 };
  await unfold();
  type("Present password", "tide tables 1907");
  type("New password", "harbour wall at seven");
  submit("Change the password");
  expect((await screen.findByTestId("password-changed")).textContent).toMatch(/all other sessions have ended/);
  expect(stage.sent(asks)).toEqual([{ present: "tide tables 1907", next: "harbour wall at seven" }]);
  expect(screen.queryByLabelText("New password")).toBeNull();
  await waitFor(() => expect(document.activeElement).toBe(screen.getByTestId("change-password")));
});

it("says at the present password that it is wrong, and keeps both passwords", async () => {
  stage.answers[asks] = refusal(403, "wrong-password", "This is not your password.", "password");
  await unfold();
  type("Present password", "not the one");
  type("New password", "harbour wall at seven");
  submit("Change the password");
  expect(await screen.findByText("This is not your password.")).toBeTruthy();
  expect(field("Present password").getAttribute("aria-invalid")).toBe("true");
  expect([valueOf("Present password"), valueOf("New password")]).toEqual(["not the one", "harbour wall at seven"]);
});

it("says at the new password that it is easy to guess", async () => {
  stage.answers[asks] = refusal(422, "invalid", "This password is easy to guess.", "next");
  await unfold();
  type("Present password", "tide tables 1907");
  type("New password", "password1234");
  submit("Change the password");
  expect(await screen.findByText("This password is easy to guess.")).toBeTruthy();
  expect(field("New password").getAttribute("aria-invalid")).toBe("true");
});

it("keeps everything over a lost connection", async () => {
  stage.offline = true;
  await unfold();
  type("Present password", "tide tables 1907");
  type("New password", "harbour wall at seven");
  submit("Change the password");
  expect(await screen.findByText(/What you typed is still here/)).toBeTruthy();
  expect(valueOf("New password")).toBe("harbour wall at seven");
});

it("folds up without sending anything", async () => {
  await unfold();
  fireEvent.click(screen.getByText("Not now"));
  expect(screen.queryByLabelText("New password")).toBeNull();
  expect(stage.sent(asks)).toEqual([]);
});
