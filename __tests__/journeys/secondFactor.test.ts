import { Secret, TOTP } from "otpauth";
import { tokenFor } from "./mailbox";
import { typeCredentials } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");
const email = "codes@orlow.example";
const first = "kettle rain window";
const second = "harbour wall at seven";

test("an address is confirmed in another browser, codes end its session, a reset does not go round them, and all sessions end at once", async () => {
  const phone = await stage.open("none", "phone");
  const wide = await stage.open("none", "wide");
  const { page } = phone;
  await page.goto("/account/sign-up?next=%2Faccount%2Fsecurity");
  await typeCredentials(page, email, first);
  await page.getByText(/Confirm your e-mail address first/).waitFor();

  // The mail is opened where its owner is not signed in: the link waits for them.
  await wide.page.goto(`/account/confirm#${await tokenFor(page, email, "/account/confirm")}`);
  await wide.page.getByTestId("to-sign-in").click();
  await typeCredentials(wide.page, email, first);
  await wide.page.getByTestId("confirmed").waitFor();

  await page.reload();
  await page.getByTestId("codes-on").click();
  await page.getByTestId("codes-password").fill(first);
  await page.getByTestId("codes-begin").click();
  const secret = Secret.fromBase32((await page.getByTestId("secret").textContent())!.replaceAll(" ", ""));
  await page.getByTestId("first-code").fill(new TOTP({ secret }).generate());
  await page.getByTestId("codes-confirm").click();
  await page.getByTestId("codes-kept").waitFor();
  const codes = await page.getByTestId("recovery-codes").getByRole("listitem").allTextContents();
  await page.getByTestId("codes-kept").click();
  await wide.page.goto("/account");
  await wide.page.getByText(/Your session has ended/).waitFor();

  await wide.page.goto("/account/forgotten");
  await wide.page.getByTestId("email").fill(email);
  await wide.page.getByTestId("send").click();
  await wide.page.getByTestId("link-sent").waitFor();
  await wide.page.goto(`/account/reset#${await tokenFor(page, email, "/account/reset")}`);
  await wide.page.getByTestId("password").fill(second);
  await wide.page.getByTestId("send").click();
  await wide.page.getByTestId("reset-done").waitFor();

  // Both come back: the new password opens nothing without a code, here one of those for a lost phone.
  for (const [k, each] of [wide.page, page].entries()) {
    await each.goto("/account/sign-in?next=%2Faccount%2Fsessions");
    await typeCredentials(each, email, second);
    await each.getByTestId("code").fill(codes[k]!);
    await each.getByTestId("send").click();
    await each.getByTestId("sessions").waitFor();
  }
  await page.getByTestId("end-all").click();
  await page.getByTestId("to-sign-in").waitFor();
  await wide.page.reload();
  await wide.page.getByTestId("to-sign-in").waitFor();
  expect([...phone.errors, ...wide.errors]).toEqual([]);
  await phone.context.close();
  await wide.context.close();
}, 120_000);
