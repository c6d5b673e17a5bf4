import type { Page } from "playwright-core";
import { axeFaults } from "./axeFaults";
import { viewports } from "./browser";

/** What is wrong with one screen: axe's findings, and whether it scrolls sideways. */
export async function screenFaults(page: Page): Promise<string[]> {
  const said = await axeFaults(page);
  return (await scrollsSideways(page)) ? [...said, "scrolls sideways"] : said;
}

/** A screen's address, and how one knows that it is all there. */
export type Screen = readonly [path: string, ready: (page: Page) => Promise<unknown>];

/**
 * Opens screens one after the other and looks at each on the phone and wide, in both colours, and at its width on the
 * narrowest phone. What is wrong, by address and look; nothing where all is as it should be.
 */
export async function faultsInEveryLook(page: Page, screens: readonly Screen[]): Promise<Record<string, string[]>> {
  const findings: Record<string, string[]> = {};
  const note = (where: string, said: string[]) => said.length > 0 && (findings[where] = said);
  for (const [path, ready] of screens) {
    // A page that stands already would only be told another #.
    await page.goto("about:blank");
    await page.goto(path);
    await ready(page);
    for (const [name, size] of Object.entries(viewports)) {
      await page.setViewportSize(size);
      for (const colorScheme of ["light", "dark"] as const) {
        await page.emulateMedia({ colorScheme });
        await settled(page);
        note(`${path} ${name} ${colorScheme}`, await screenFaults(page));
      }
    }
    await page.setViewportSize({ width: 320, height: 640 });
    await settled(page);
    note(`${path} on 320 px`, (await scrollsSideways(page)) ? ["scrolls sideways"] : []);
  }
  return findings;
}

/** Waits until a change of size or colours is drawn and what it set in motion has come to rest. */
async function settled(page: Page): Promise<void> {
  await page.evaluate("new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done)))");
  await page.waitForFunction(
    "document.getAnimations().every((a) => a.playState !== 'running' || a.effect?.getComputedTiming().endTime === Infinity)",
  );
}

export function scrollsSideways(page: Page): Promise<boolean> {
  return page.evaluate("document.documentElement.scrollWidth > document.documentElement.clientWidth");
}
