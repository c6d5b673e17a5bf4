import type { Page } from "playwright-core";

/** So much of the journeys' tune, in seconds, is enough for a range; the whole tune is 9 seconds long. */
export const enoughS = 5;

/** Presses start and sings for as long as the page itself counts. */
export async function singFor(page: Page, seconds: number): Promise<void> {
  await page.getByTestId("sing-start").click();
  await sungUpTo(page, seconds);
  await page.getByTestId("sing-stop").click();
}

/** Waits until the page shows that so many seconds were sung. */
export async function sungUpTo(page: Page, seconds: number): Promise<void> {
  await page.waitForFunction(
    (wanted) =>
      Number.parseInt(document.querySelector('[data-testid="take-seconds"]')?.textContent ?? "0", 10) >= wanted,
    seconds,
  );
}
