import type { Page } from "playwright-core";
import { signInAsMaren } from "./signIn";

/** Signs in as Maren and opens the demonstration's ferry song; the address of it. */
export async function openFerry(page: Page): Promise<string> {
  await signInAsMaren(page, "/songs");
  await page.getByText("The Half-Past-Nine Ferry").first().click();
  await page.getByTestId("chart").waitFor();
  return page.url().replace(/\?.*$/, "");
}
