import type { Page } from "playwright-core";

/** The token in the newest mail to an address whose link leads to this page; waits until one is there that is not `before`. */
export async function tokenFor(page: Page, email: string, path: string, before?: string): Promise<string> {
  const until = Date.now() + 20_000;
  while (Date.now() < until) {
    const mails = (await (await page.request.get("/dev/inbox/mails.json")).json()) as { to: string; text: string }[];
    const link = mails.find(({ to, text }) => to === email && text.includes(`${path}#`))?.text;
    const token = new RegExp(`${path}#([\\w-]+)`).exec(link ?? "")?.[1];
    if (token !== undefined && token !== before) return token;
    await page.waitForTimeout(250);
  }
  throw new Error(`No mail with ${path} came to ${email}.`);
}
