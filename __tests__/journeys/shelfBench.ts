// Measures a shelf of 2,000 songs in the real product: npm run bench:shelf
import { randomUUID } from "node:crypto";
import type { Page } from "playwright-core";
import { launchBrowser, viewports, type Viewport } from "./browser";
import { typeCredentials } from "./signIn";
import { startProduct } from "./product";
import { createRandom } from "../sound/random";

const count = Number(process.env.SHELF_SONGS ?? 2000);
const email = "shelf@orlow-quay.example";
const password = "two thousand songs";
const things =
  "anchor bell buoy crane drift ebb ferry gull harbour kettle lantern mast net oar pier quay rope sail tide".split(" ");
const tonics = ["C", "D", "Eb", "E", "F", "G", "A", "Bb"];

interface Access {
  address: string;
  token: string;
}

async function main(): Promise<void> {
  const product = await startProduct();
  const browser = await launchBrowser("none");
  try {
    const access = await signUp(product.address);
    const began = performance.now();
    await fill(access);
    say("songs put through the API", `${count} in ${seconds(performance.now() - began)}`);
    for (const viewport of ["phone", "wide"] as const) {
      const context = await browser.newContext({ baseURL: product.address, viewport: viewports[viewport] });
      await measure(await context.newPage(), viewport);
      await context.close();
    }
  } finally {
    await browser.close();
    await product.stop();
  }
}

async function signUp(address: string): Promise<Access> {
  const answer = await fetch(`${address}/api/auth/sign-up`, {
    method: "POST",
    headers: { "Content-Type": "application/json", Origin: address },
    body: JSON.stringify({ email, password }),
  });
  const { accessToken } = (await answer.json()) as { accessToken: string };
  return { address, token: accessToken };
}

async function fill({ address, token }: Access): Promise<void> {
  const { next: random } = createRandom(20);
  const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)]!;
  const put = async (path: string, id: string, body: object) => {
    const answer = await fetch(`${address}/api/${path}/${id}`, {
      method: "PUT",
      headers: { "Content-Type": "application/json", Authorization: `Bearer ${token}`, Origin: address },
      body: JSON.stringify({ id, ...body }),
    });
    if (!answer.ok) throw new Error(`${answer.status} ${await answer.text()}`);
  };
  const band = { lowMidi: 52, highMidi: 72 };
  await put("voices", randomUUID(), {
    name: "Maren",
    byHand: { range: band, comfort: { lowMidi: 55, highMidi: 67 } },
    createdAt: new Date().toISOString(),
  });
  for (let index = 0; index < count; index += 1) {
    const home = pick(tonics);
    const line = () => `${home}     G\n${pick(things)} and ${pick(things)} by the ${pick(things)}`;
    const notes = Array.from({ length: 90 }, (_, at) => ({
      start: at,
      duration: 1,
      midi: 55 + Math.floor(random() * 18),
    }));
    await put("songs", randomUUID(), {
      title: `${pick(things)} ${pick(things)} ${index}`,
      chart: Array.from({ length: 16 }, line).join("\n"),
      writtenKey: { tonic: home, mode: "major" },
      tune: random() < 0.8 ? { kind: "melody", notes, home } : null,
      beatsPerBar: 4,
      tempo: 90,
      demo: null,
      tags: [pick(things), `set ${index % 40}`].filter((tag, at, all) => all.indexOf(tag) === at),
      archivedAt: null,
      playedAt: null,
      createdAt: new Date(Date.UTC(2026, 0, 1) + index * 60_000).toISOString(),
      revision: 0,
    });
  }
}

const first = '[data-testid="songs"] a[data-testid^="song-"]';

async function measure(page: Page, viewport: Viewport): Promise<void> {
  page.setDefaultTimeout(60_000);
  await page.goto("/account/sign-in?next=%2Faccount");
  await typeCredentials(page, email, password);
  await page.waitForURL("**/account");
  await page.waitForLoadState("networkidle");

  await page.goto("/songs", { waitUntil: "commit" });
  const shown = await seen(page, `document.querySelector('${first}') && performance.now()`);
  say(`${viewport}: opening the page to first rows`, milliseconds(shown));
  await page.waitForLoadState("networkidle");

  const typing: number[] = [];
  for (const word of ["lantern", "kettle by", "oar"]) typing.push(await typed(page, word));
  say(`${viewport}: last letter of a search to its rows`, typing.map(milliseconds).join(", "));
  await page.getByTestId("song-search").fill("");
  await page.getByText(`${count} songs`, { exact: true }).waitFor();

  const { longest, over, worst, rows } = await scrolled(page);
  say(
    `${viewport}: longest task while scrolling`,
    `${milliseconds(longest)}; ${over} over 100 ms; worst frame ${milliseconds(worst)}`,
  );
  say(`${viewport}: rows in the page at the end`, String(rows));

  await page.evaluate("scrollTo(0, 0)");
  const began = performance.now();
  await page.getByTestId("song-sort").selectOption("fit");
  await page.waitForURL(/sort=fit/);
  await seen(page, `document.querySelector('[data-testid="shelf-found"]')?.textContent === "${count} songs"`);
  await page.getByText("the notes are being read").waitFor();
  await page.getByText("the notes are being read").waitFor({ state: "detached" });
  say(`${viewport}: order by fit, every song judged by its notes`, seconds(performance.now() - began));
}

/** Looks in every frame until an expression gives something, and gives that back. */
function seen(page: Page, expression: string): Promise<number> {
  return page.evaluate<number>(
    `new Promise((done) => { const look = () => { const value = ${expression}; if (value) done(value); else requestAnimationFrame(look); }; look(); })`,
  );
}

/** From the last letter to the rows of the new search. */
async function typed(page: Page, word: string): Promise<number> {
  const field = page.getByTestId("song-search");
  await field.fill(word.slice(0, -1));
  await seen(page, `/found$/.test(document.querySelector('[data-testid="shelf-found"]')?.textContent ?? "")`);
  await page.evaluate(
    `addEventListener("input", () => { window.typedAt = performance.now(); }, { once: true, capture: true })`,
  );
  const words = `document.querySelector('[data-testid="shelf-found"]')?.textContent ?? ""`;
  await field.press("End");
  await field.pressSequentially(word.slice(-1));
  return seen(
    page,
    `new URLSearchParams(location.search).get("q") === ${JSON.stringify(word)} && /found$/.test(${words}) && performance.now() - window.typedAt`,
  );
}

async function scrolled(page: Page) {
  await page.evaluate(`
    window.seen = { longest: 0, over: 0, worst: 0, running: true };
    new PerformanceObserver((list) => {
      for (const { duration } of list.getEntries()) {
        seen.longest = Math.max(seen.longest, duration);
        if (duration > 100) seen.over += 1;
      }
    }).observe({ entryTypes: ["longtask"] });
    let last = performance.now();
    const frame = (now) => {
      seen.worst = Math.max(seen.worst, now - last);
      last = now;
      if (seen.running) requestAnimationFrame(frame);
    };
    requestAnimationFrame(frame);
  `);
  await page.mouse.move(200, 500);
  for (let step = 0; step < 150; step += 1) {
    await page.mouse.wheel(0, 700);
    await page.waitForTimeout(16);
  }
  await page.waitForLoadState("networkidle");
  const figures = await page.evaluate<{ longest: number; over: number; worst: number }>(`seen.running = false; seen`);
  return { ...figures, rows: await page.locator(first).count() };
}

const milliseconds = (ms: number) => `${Math.round(ms)} ms`;
const seconds = (ms: number) => `${(ms / 1000).toFixed(1)} s`;

function say(what: string, figure: string): void {
  console.log(`${what.padEnd(60)} ${figure}`);
}

void main();
