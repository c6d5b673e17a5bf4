import type { Browser } from "playwright-core";
import { launchBrowser, openProfile, type Microphone, type Profile, type Viewport } from "./browser";
import { startProduct, type Product } from "./product";

/** What the tests of one file play on: the product on a fresh database, and browsers that hear what they are told. */
export interface Stage {
  /** A fresh profile in a browser with this microphone. */
  open(microphone: Microphone, viewport?: Viewport, colorScheme?: "light" | "dark"): Promise<Profile>;
  /** Does something in the product's database that no page does. */
  query(sql: string): Promise<void>;
}

/**
 * Sets the stage for one test file by Jest's hooks.
 *
 * @param browsers "kept" keeps a browser for each microphone to the end of the file, "fresh" closes them after each test
 */
export function setStage(browsers: "kept" | "fresh"): Stage {
  let product: Product | undefined;
  const open = new Map<string, Browser>();
  const close = async () => {
    for (const browser of open.values()) await browser.close();
    open.clear();
  };
  beforeAll(async () => {
    product = await startProduct();
  }, 60_000);
  if (browsers === "fresh") afterEach(close);
  afterAll(async () => {
    await close();
    await product?.stop();
  });
  return {
    async open(microphone, viewport = "phone", colorScheme = "light") {
      if (!product) throw new Error("The product did not start.");
      const key = JSON.stringify(microphone);
      const browser = open.get(key) ?? (await launchBrowser(microphone));
      open.set(key, browser);
      return openProfile(browser, product.address, viewport, colorScheme);
    },
    async query(sql) {
      await product?.query(sql);
    },
  };
}
