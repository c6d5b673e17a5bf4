import { Secret, TOTP } from "otpauth";
import { tokenFor } from "./mailbox";
import { typeCredentials } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");
const first = "kettle rain window";
const second = "harbour wall at seven";

test.each(["phone", "wide"] as const)(
  "on the %s a forgotten password is replaced by the mail, codes are switched on, and signing in asks for one",
  async (size) => {
    const { context, page, errors } = await stage.open("none", size);
    const email = `wayback.${size}@orlow.example`;
    await page.goto("/account/sign-up?next=%2Faccount");
    await typeCredentials(page, email, first);
    await page.getByTestId("unconfirmed").waitFor();
    await page.getByTestId("sign-out").click();
    await page.getByTestId("to-sign-in").click();

    await page.getByTestId("to-forgotten").click();
    await page.getByTestId("email").fill(email);
    await page.getByTestId("send").click();
    await page.getByTestId("link-sent").waitFor();
    await page.goto(`/account/reset#${await tokenFor(page, email, "/account/reset")}`);
    await page.getByTestId("password").fill(second);
    await page.waitForURL(/\/account\/reset$/);
    await page.getByTestId("send").click();
    await page.getByTestId("reset-done").waitFor();

    // The link has shown that the address is one's own, so codes can be switched on.
    await page.goto("/account/sign-in?next=%2Faccount%2Fsecurity");
    await typeCredentials(page, email, second);
    await page.getByTestId("codes-on").click();
    await page.getByTestId("codes-password").fill(second);
    await page.getByTestId("codes-begin").click();
    const secret = Secret.fromBase32((await page.getByTestId("secret").textContent())!.replaceAll(" ", ""));
    const codeAt = (timestamp: number) => new TOTP({ secret }).generate({ timestamp });
    await page.getByTestId("first-code").fill(codeAt(Date.now()));
    await page.getByTestId("codes-confirm").click();
    await page.getByTestId("recovery-codes").waitFor();
    expect(await page.getByTestId("recovery-codes").getByRole("listitem").count()).toBe(10);
    await page.getByTestId("codes-kept").click();

    await page.goto("/account/sessions");
    await page.getByTestId("end-all").click();
    await page.getByTestId("to-sign-in").click();
    await typeCredentials(page, email, second);
    await page.getByTestId("code").fill("000000");
    await page.getByTestId("send").click();
    await page.locator('[data-testid="code"][aria-invalid="true"]').waitFor();
    // The code of the next half minute: the first one is used up.
    await page.getByTestId("code").fill(codeAt(Date.now() + 30_000));
    await page.getByTestId("send").click();
    await page.getByTestId("sessions").waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  120_000,
);
