// Takes the README's pictures from the real product: npm run pictures
import { mkdirSync } from "node:fs";
import { join } from "node:path";
import type { Page } from "playwright-core";
import { launchBrowser, viewports, type Viewport } from "./browser";
import { makeMicrophones } from "./microphone";
import { startProduct } from "./product";
import { openFerry } from "./openFerry";
import { signInAsRuth } from "./signIn";
import { sungUpTo } from "./singing";

const folder = join(__dirname, "..", "..", "docs", "pictures");

async function main(): Promise<void> {
  mkdirSync(folder, { recursive: true });
  const microphones = makeMicrophones();
  const product = await startProduct();
  const browser = await launchBrowser({ wav: microphones.voice(53).wav });
  const open = async (viewport: Viewport) => {
    const size = { viewport: viewports[viewport], deviceScaleFactor: 1.5, reducedMotion: "reduce" } as const;
    return (await browser.newContext({ baseURL: product.address, colorScheme: "light", ...size })).newPage();
  };
  try {
    await sung(await open("phone"));
    for (const viewport of ["phone", "wide"] as const) await classSongs(await open(viewport), viewport);
    await roster(await open("wide"));
  } finally {
    await browser.close();
    await product.stop();
    microphones.remove();
  }
}

async function picture(page: Page, name: string): Promise<void> {
  await page.evaluate("document.fonts.ready");
  await page.screenshot({ path: join(folder, `${name}.png`) });
}

/** Home, listening, and what was heard, as a visitor sees them. */
async function sung(page: Page): Promise<void> {
  await page.goto("/");
  await page.getByRole("link", { name: "Sing a few seconds" }).waitFor();
  await picture(page, "phone-home");
  await page.goto("/voice/sing");
  await page.getByTestId("sing-start").click();
  await sungUpTo(page, 6);
  await picture(page, "phone-sing");
  await sungUpTo(page, 9);
  await page.getByTestId("sing-stop").click();
  await page.getByTestId("sing-keep").waitFor();
  await picture(page, "phone-result");
}

/** A song, its keys and its ways, as Maren of the demonstration sees them. */
async function classSongs(page: Page, viewport: Viewport): Promise<void> {
  const song = await openFerry(page);
  await page.getByTestId(viewport === "wide" ? "ways" : "my-key").waitFor();
  await picture(page, `${viewport}-song`);
  await page.goto(`${song}/keys`);
  await page.getByTestId(viewport === "wide" ? "take-key" : "key-card").waitFor();
  await page.waitForLoadState("networkidle");
  await picture(page, `${viewport}-keys`);
  await page.goto(`${song}/ways`);
  await page.getByTestId("ways").waitFor();
  await picture(page, `${viewport}-ways`);
  if (viewport === "phone") return;
  await page.goto(`${song}/sheet`);
  await page.getByTestId("paper").getByText("The tune in your voice").first().waitFor();
  await picture(page, "wide-sheet");
}

/** The evening class, as its teacher sees it. */
async function roster(page: Page): Promise<void> {
  await signInAsRuth(page, "/studio");
  await page.getByText("Tuesday evening class").first().click();
  await page.getByTestId("pupil").first().waitFor();
  await page.waitForLoadState("networkidle");
  await picture(page, "wide-roster");
}

void main();
