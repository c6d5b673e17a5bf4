import type { Page } from "playwright-core";

/** Signs in as Maren of the demonstration, who has a voice, songs and decided keys, and goes on to `next`. */
export async function signInAsMaren(page: Page, next: string): Promise<void> {
  await page.goto(`/account/sign-in?next=${encodeURIComponent(next)}`);
  await page.getByTestId("email").fill("maren@orlow-quay.example");
  await page.getByTestId("password").fill("slipway lantern");
  await page.getByTestId("send").click();
  await page.waitForURL(`**${next}`);
}
