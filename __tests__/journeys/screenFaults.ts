import type { Page } from "playwright-core";
import { axeFaults } from "./axeFaults";

/** What is wrong with one screen: axe's findings, and whether it scrolls sideways. */
export async function screenFaults(page: Page): Promise<string[]> {
  const said = await axeFaults(page);
  return (await scrollsSideways(page)) ? [...said, "scrolls sideways"] : said;
}

export function scrollsSideways(page: Page): Promise<boolean> {
  return page.evaluate("document.documentElement.scrollWidth > document.documentElement.clientWidth");
}
