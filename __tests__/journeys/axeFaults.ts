import { readFileSync } from "node:fs";
import type { Page } from "playwright-core";

const axe = readFileSync(require.resolve("axe-core/axe.min.js"), "utf8");

/** What axe finds wrong with the page as it stands: each rule with the elements that break it. */
export async function axeFaults(page: Page): Promise<string[]> {
  await page.evaluate(axe);
  return page.evaluate(
    "axe.run({ resultTypes: ['violations'] }).then((r) => r.violations.map(({ id, nodes }) => id + ': ' + nodes.map(({ target }) => target.join(' ')).join(', ')))",
  );
}
