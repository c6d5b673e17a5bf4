import type { Page } from "playwright-core";
import { faultsInEveryLook, type Screen } from "./screenFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

/** The page about signing in with all that unfolds, and a complaint at a field. */
async function securityUnfolded(page: Page): Promise<void> {
  await page.getByTestId("change-password").click();
  await page.getByTestId("send-password").click();
  await page.locator('[data-testid="present-password"][aria-invalid="true"]').waitFor();
  await page.getByTestId("change-email").click();
  await page.getByTestId("new-email").waitFor();
}

/** A profile of an administrator with codes on. */
async function asAdministrator() {
  const profile = await stage.open("none");
  const email = "warden@orlow-quay.example";
  const data = { email, password: "bell over the harbour" };
  expect((await profile.page.request.post("/api/auth/sign-up", { data })).status()).toBe(201);
  await stage.query(`
    WITH warden AS (UPDATE users SET role = 'admin', confirmed_at = now() WHERE email = '${email}' RETURNING id)
    INSERT INTO second_factors (user_id, secret, confirmed_at) SELECT id, 'unused', now() FROM warden`);
  // The page takes up the session that the cookie holds.
  await profile.context.addInitScript(
    "location.protocol === 'about:' || localStorage.setItem('larkspan.has-session', '1')",
  );
  return profile;
}

const administratorsScreens: Screen[] = [
  ["/admin", (page) => page.getByText("maren@orlow-quay.example").first().waitFor()],
  ["/admin/health", (page) => page.getByText("Mail, seven days").waitFor()],
  ["/admin/audit", (page) => page.getByText("Signed up").first().waitFor()],
  ["/account/security", (page) => page.getByTestId("codes-off").waitFor()],
];

const strangersScreens: Screen[] = [
  ["/account/forgotten", (page) => page.getByTestId("email").waitFor()],
  ["/account/reset#not-one-of-ours", (page) => page.getByTestId("password").waitFor()],
  ["/account/reset", (page) => page.getByTestId("link-not-valid").waitFor()],
  ["/account/confirm#not-one-of-ours", (page) => page.getByTestId("confirm-sign-in").waitFor()],
  ["/account/unsubscribe#not-one-of-ours", (page) => page.getByTestId("unsubscribe").waitFor()],
  ["/account/security", (page) => page.getByTestId("sign-in-first").waitFor()],
];

const singersScreens: Screen[] = [
  ["/account/security", securityUnfolded],
  ["/account/sessions", (page) => page.getByTestId("end-all").waitFor()],
  ["/account/mail", (page) => page.getByTestId("mail-weekly").waitFor()],
  [
    "/account/data",
    async (page) => {
      await page.getByTestId("birth-year").waitFor();
      await page.getByTestId("ask-erase").click();
      await page.getByTestId("erase-password").waitFor();
    },
  ],
  ["/admin", (page) => page.getByTestId("not-yours").waitFor()],
];

test("every screen of the account is accessible, throws nothing and does not scroll sideways, in every look", async () => {
  const stranger = await stage.open("none");
  const singer = await stage.open("none");
  await signInAsMaren(singer.page, "/account");
  const administrator = await asAdministrator();
  expect(await faultsInEveryLook(stranger.page, strangersScreens)).toEqual({});
  expect(await faultsInEveryLook(singer.page, singersScreens)).toEqual({});
  expect(await faultsInEveryLook(administrator.page, administratorsScreens)).toEqual({});
  expect([...stranger.errors, ...singer.errors, ...administrator.errors]).toEqual([]);
  for (const { context } of [stranger, singer, administrator]) await context.close();
}, 300_000);
