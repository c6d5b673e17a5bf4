import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Page } from "playwright-core";
import { demoSongs } from "../../shared/songs/demoSongs";
import { songLength } from "../../shared/sheets/stageSong";
import { axeFaults } from "./axeFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");
const folder = mkdtempSync(join(tmpdir(), "larkspan-sheet-"));

/** The page of a song of the demonstration that Maren has. */
async function songOf(page: Page, title: string): Promise<string> {
  await page.goto("/songs");
  await page
    .getByRole("link", { name: new RegExp(title) })
    .first()
    .click();
  await page.waitForURL(/\/songs\/[0-9a-f-]{36}$/);
  return new URL(page.url()).pathname;
}

/** The lines of words on each page of the preview, without blanks. */
function linesOnScreen(page: Page): Promise<string[][]> {
  return page
    .getByTestId("paper")
    .getByTestId("paper-page")
    .evaluateAll((pages) =>
      pages.map((sheet) =>
        [...sheet.querySelectorAll(":scope > text")].map((text) => (text.textContent ?? "").replace(/\s/g, "")),
      ),
    );
}

function textOf(pdf: string): string[] {
  const text = execFileSync("pdftotext", ["-layout", pdf, "-"], { encoding: "utf8" });
  return text
    .split("\f")
    .slice(0, -1)
    .map((page) => page.replace(/\s/g, ""));
}

/** Share of dark pixels in a window of a page, in parts of its width and height; rendered at 50 dots an inch. */
function inkIn(pdf: string, page: number, box: { x: number; y: number; width: number; height: number }): number {
  const stem = join(folder, `render${page}`);
  execFileSync("pdftoppm", ["-r", "50", "-gray", "-f", String(page), "-l", String(page), "-singlefile", pdf, stem]);
  const bytes = readFileSync(`${stem}.pgm`);
  const [, w = "", h = ""] = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(bytes.subarray(0, 40).toString("latin1")) ?? [];
  const [wide, high] = [Number(w), Number(h)];
  const data = bytes.subarray(bytes.length - wide * high);
  let [dark, all] = [0, 0];
  for (let y = Math.floor(box.y * high); y < (box.y + box.height) * high; y += 1)
    for (let x = Math.floor(box.x * wide); x < (box.x + box.width) * wide; x += 1) {
      all += 1;
      if (data[y * wide + x]! < 160) dark += 1;
    }
  return dark / all;
}

test("print and PDF hold exactly what the screen promises: the same lines on the same pages, and the grids", async () => {
  const { page, errors } = await stage.open("none", "wide");
  await signInAsMaren(page, "/songs");
  const song = await songOf(page, "Half-Past-Nine");
  await page.getByTestId("to-sheet").first().click();
  await page.getByTestId("sheet-way").waitFor();
  // Large letters with numbers, so that there is a break between pages.
  await page.getByTestId("sheet-letters").selectOption("large");
  await page.getByTestId("sheet-numbers").getByText("Over the chords").click();
  const shown = await linesOnScreen(page);
  expect(shown.length).toBeGreaterThan(1);
  expect(await axeFaults(page)).toEqual([]);

  const download = page.waitForEvent("download");
  await page.getByTestId("sheet-pdf").click();
  const file = await download;
  expect(file.suggestedFilename()).toBe("The Half-Past-Nine Ferry.pdf");
  const made = join(folder, "made.pdf");
  await file.saveAs(made);
  const printed = join(folder, "printed.pdf");
  writeFileSync(printed, await page.pdf({ preferCSSPageSize: true, printBackground: true }));

  for (const pdf of [made, printed]) {
    const pages = textOf(pdf);
    expect(pages).toHaveLength(shown.length);
    shown.forEach((lines, k) => {
      const words = lines.filter((line) => line.length > 8);
      expect(words.length).toBeGreaterThan(5);
      // Nor does any line of words stand on another page.
      const others = words.filter(
        (line) => !shown.some((all, n) => n !== k && all.some((each) => each.includes(line))),
      );
      for (const line of others)
        expect(pages.flatMap((text, n) => (n !== k && text.includes(line) ? [line] : []))).toEqual([]);
      for (const line of words) expect(pages[k]).toContain(line);
    });
    // The aside of the first page, where the grids stand; there is nothing on the last page.
    expect(inkIn(pdf, 1, { x: 0.73, y: 0.18, width: 0.2, height: 0.2 })).toBeGreaterThan(0.02);
    expect(inkIn(pdf, shown.length, { x: 0.73, y: 0.3, width: 0.2, height: 0.2 })).toBe(0);
    const info = execFileSync("pdfinfo", [pdf], { encoding: "utf8" });
    expect(info).toMatch(/Page size: +59[45](?:\.\d+)? x 84[12]/);
  }
  const fonts = execFileSync("pdffonts", [made], { encoding: "utf8" }).trim().split("\n").slice(2);
  expect(fonts.length).toBeGreaterThan(3);
  for (const font of fonts) expect(font).toMatch(/ yes yes yes /);
  expect([song, errors]).toEqual([song, []]);
}, 90_000);

test("a stranger opens a shared sheet, moves it to a ukulele, and finds it ended when its owner ends it", async () => {
  const owner = await stage.open("none", "wide");
  await signInAsMaren(owner.page, "/songs");
  await songOf(owner.page, "Half-Past-Nine");
  await owner.page.getByTestId("to-sheet").first().click();
  await owner.page.getByTestId("link-label").fill("For the band");
  await owner.page.getByTestId("make-link").click();
  const address = (await owner.page.getByTestId("link-address").textContent()) ?? "";
  expect(new URL(address).pathname).toMatch(/^\/shared\/[\w-]{32}$/);

  const stranger = await stage.open("none", "phone");
  await stranger.page.goto(address);
  await stranger.page.getByRole("heading", { name: "The Half-Past-Nine Ferry", level: 1 }).waitFor();
  const key = await stranger.page.getByTestId("sheet-key").inputValue();
  await stranger.page.getByTestId("instrument").click();
  await stranger.page.getByTestId("choose-ukulele").click();
  await stranger.page
    .getByText(/G-C-E-A/)
    .first()
    .waitFor();
  // The sounding key stays, whatever it is played on.
  expect(await stranger.page.getByTestId("sheet-key").inputValue()).toBe(key);
  expect(await stranger.page.getByTestId("sheet-reading").getByRole("img").count()).toBeGreaterThan(2);
  expect(await axeFaults(stranger.page)).toEqual([]);
  await stranger.page.getByTestId("to-stage").click();
  await stranger.page.getByTestId("stage").waitFor();
  await stranger.page.getByLabel("Leave stage view").click();
  await stranger.page.getByTestId("sheet-reading").waitFor();

  await owner.page.getByTestId("end-link").click();
  await owner.page.getByTestId("remove-confirmed").click();
  await owner.page.getByText(/Ended by you/).waitFor();
  const answer = await stranger.page.goto(address);
  expect(answer?.status()).toBe(410);
  await stranger.page.getByRole("heading", { name: "This link has ended" }).first().waitFor();
  expect([...owner.errors, ...stranger.errors]).toEqual([]);
}, 90_000);

test("the stage scrolls as steadily as the song goes, and a pedal starts it and turns pages", async () => {
  const { page, errors } = await stage.open("none", "phone");
  await page.goto("/songs");
  await songOf(page, "Half-Past-Nine");
  await page.getByTestId("to-sheet").first().click();
  await page.getByTestId("to-stage").click();
  const scroller = page.getByTestId("stage-scroll");
  await scroller.waitFor();
  expect(await page.getByRole("navigation").count()).toBe(0);
  const top = () => scroller.evaluate((node) => node.scrollTop);
  await page.keyboard.press("PageDown");
  const one = await top();
  expect(one).toBeGreaterThan(300);
  await page.keyboard.press("PageUp");
  expect(await top()).toBe(0);

  await page.keyboard.press("PageDown");
  await page.keyboard.press("Space");
  // Where the words stand at each of some hundred frames, by the browser's own clock.
  const seen = await scroller.evaluate(
    (node) =>
      new Promise<{ at: number; top: number }[]>((done) => {
        const all: { at: number; top: number }[] = [];
        const look = (at: number) => {
          all.push({ at, top: node.scrollTop });
          if (at - all[0]!.at < 6000) requestAnimationFrame(look);
          else done(all);
        };
        requestAnimationFrame(look);
      }),
  );
  await page.keyboard.press("Space");
  const stopped = await top();
  const speed = (from: number, to: number) => {
    const [a, b] = [seen[Math.floor(from * (seen.length - 1))]!, seen[Math.floor(to * (seen.length - 1))]!];
    return ((b.top - a.top) * 1000) / (b.at - a.at);
  };
  const whole = speed(0, 1);
  for (const third of [0, 1, 2]) expect(Math.abs(speed(third / 3, (third + 1) / 3) / whole - 1)).toBeLessThan(0.05);
  // 92 quarters a minute: the words of the whole song pass in the time of its bars.
  const height = await scroller
    .locator("[data-mono]")
    .first()
    .evaluate((node) => node.getBoundingClientRect().height);
  const ferry = demoSongs.find(({ title }) => title.includes("Half-Past-Nine"))!;
  const seconds = (songLength(ferry).quarters * 60) / 92;
  expect(Math.abs(whole / (height / seconds) - 1)).toBeLessThan(0.03);
  expect(await top()).toBe(stopped);

  // Who asks for less motion gets pages instead of a scroll: between two turns the words stand still.
  await page.emulateMedia({ reducedMotion: "reduce" });
  await page.keyboard.press("Space");
  const places = await scroller.evaluate(
    (node) =>
      new Promise<number>((done) => {
        const tops = new Set<number>();
        const until = performance.now() + 2500;
        const look = (at: number) => {
          tops.add(node.scrollTop);
          if (at < until) requestAnimationFrame(look);
          else done(tops.size);
        };
        requestAnimationFrame(look);
      }),
  );
  await page.keyboard.press("Space");
  expect(places).toBeLessThanOrEqual(2);
  expect(await axeFaults(page)).toEqual([]);
  expect(errors).toEqual([]);
}, 90_000);
