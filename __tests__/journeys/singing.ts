import type { Page } from "playwright-core";

/** Presses start and sings for as long as the page itself counts; 9 seconds hold the journeys' whole tune. */
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
