import { act, fireEvent, screen } from "@testing-library/react";
import { field, refusal, setAccountStage, show, submit, type, valueOf } from "@/__tests__/client/accountStage";
import { session } from "@/features/api/session";
import { ChangeEmail } from "./ChangeEmail";
import { ChangePassword } from "./ChangePassword";

const stage = setAccountStage({ signedIn: true });
const asks = "POST /account/email";

function unfold() {
  show(<ChangeEmail account={session.current().account!} />);
  fireEvent.click(screen.getByTestId("change-email"));
}

it("says where the link went, and that the address stays until it is opened", async () => {
  stage.answers[asks] = { status: 202 };
  unfold();
  type("New e-mail address", "maren@quay.example");
  type("Password", "tide tables 1907");
  submit("Change the e-mail address");
  expect((await screen.findByTestId("email-asked")).textContent).toMatch(/on its way to maren@quay\.example/);
  expect(screen.getByText(/maren@orlow\.example, confirmed/)).toBeTruthy();
  expect(stage.sent(asks)).toEqual([{ email: "maren@quay.example", password: "tide tables 1907" }]);
});

it("says what is missing before anything is sent, and shows a wrong password at its field", async () => {
  stage.answers[asks] = refusal(403, "wrong-password", "This is not your password.", "password");
  unfold();
  submit("Change the e-mail address");
  expect(await screen.findByText("Type your e-mail address.")).toBeTruthy();
  expect(screen.getByText("Type your password.")).toBeTruthy();
  expect(stage.sent(asks)).toEqual([]);
  type("New e-mail address", "maren@quay.example");
  type("Password", "not the one");
  submit("Change the e-mail address");
  expect(await screen.findByText("This is not your password.")).toBeTruthy();
  expect(valueOf("New e-mail address")).toBe("maren@quay.example");
});

it("leaves the focus in the form that was sent, though another one on the page has a fault", async () => {
  unfold();
  submit("Change the e-mail address");
  await screen.findByText("Type your e-mail address.");
  show(<ChangePassword />);
  fireEvent.click(screen.getByTestId("change-password"));
  act(() => field("New password").focus());
  submit("Change the password");
  await screen.findByText("Use at least 12 characters.");
  expect(document.activeElement).toBe(field("Present password"));
});
