import type { Page } from "playwright-core";

/** Signs in as Maren of the demonstration, who has a voice, songs and decided keys, and goes on to `next`. */
export function signInAsMaren(page: Page, next: string): Promise<void> {
  return signInAs(page, "maren@orlow-quay.example", next);
}

/** Signs in as Ruth of the demonstration, who teaches the evening class, and goes on to `next`. */
export function signInAsRuth(page: Page, next: string): Promise<void> {
  return signInAs(page, "ruth@orlow-quay.example", next);
}

async function signInAs(page: Page, email: string, next: string): Promise<void> {
  await page.goto(`/account/sign-in?next=${encodeURIComponent(next)}`);
  await typeCredentials(page, email, "slipway lantern");
  await page.waitForURL(`**${next}`);
}

/** On the page to sign in or up: types both, and sends. */
export async function typeCredentials(page: Page, email: string, password: string): Promise<void> {
  await page.getByTestId("email").fill(email);
  await page.getByTestId("password").fill(password);
  await page.getByTestId("send").click();
}
