import type { Page } from "playwright-core";
import { axeFaults } from "./axeFaults";
import type { Viewport } from "./browser";
import { pageTasks } from "./pageTasks";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

const pasted = `[Verse 1]
G        C   G
Low tide and the harbour
D               G
lamps along the wall

[Chorus] x2
C         G
slack water, slow water
N.C.  | D | % |`;

/** The row of text that the chord stands in, and how far it is from the left edge of its syllable, in pixels. */
async function offSyllable(page: Page, chord: string, words: string): Promise<number> {
  return page.evaluate(
    ([sign, start]) => {
      const cells = [...document.querySelectorAll('[data-testid="chart"] [data-mono] > div')];
      for (const cell of cells) {
        const over = [...cell.querySelectorAll("div > span")].find((node) => node.textContent === sign);
        const text = cell.lastElementChild!;
        const at = text.textContent!.indexOf(start!);
        if (!over || at < 0) continue;
        const range = document.createRange();
        range.setStart(text.firstChild!, at);
        range.setEnd(text.firstChild!, at + 1);
        return over.getBoundingClientRect().left - range.getBoundingClientRect().left;
      }
      return NaN;
    },
    [chord, words],
  );
}

const chart = (page: Page) => page.getByTestId("song-chart").inputValue();
const kept = (page: Page) =>
  page
    .getByTestId("kept-words")
    .getByText(/^Kept \d\d:\d\d$/)
    .waitFor();
const mode = (page: Page, name: string) => page.getByRole("radio", { name, exact: true }).click();

async function writeSong(page: Page, viewport: Viewport): Promise<void> {
  await page.goto("/songs/new");
  // The line over a whole song is its title.
  await page.getByTestId("song-chart").fill(`Slack Water\n\n${pasted}`);
  expect(await page.getByTestId("song-title").inputValue()).toBe("Slack Water");
  expect(await chart(page)).toBe(pasted);
  const preview = page.getByTestId("preview");
  await preview.getByText("slack").first().waitFor();
  await preview.getByRole("heading", { name: /Chorus/ }).waitFor();
  // Every chord over its syllable, here and on a very narrow page.
  expect(Math.abs(await offSyllable(page, "C", "and"))).toBeLessThan(2);
  if (viewport === "phone") {
    await page.setViewportSize({ width: 320, height: 700 });
    expect(Math.abs(await offSyllable(page, "G", "wall"))).toBeLessThan(2);
    expect(await page.evaluate("document.documentElement.scrollWidth")).toBe(320);
    await page.setViewportSize({ width: 390, height: 844 });
  }
  await page.getByTestId("save-song").click();
  await page.getByRole("heading", { level: 1, name: "Slack Water" }).waitFor();
}

async function placeByTouch(page: Page): Promise<void> {
  await mode(page, "Place chords");
  await page.getByRole("button", { name: "“har” of harbour, line 3" }).click();
  await page.getByTestId("palette").getByRole("button", { name: "D, V" }).click();
  await page.getByTestId("place-words").getByText("D over “har” of harbour, line 3").waitFor();
  await page.getByTestId("undo").click();
  await page.getByRole("button", { name: "“har” of harbour, line 3" }).waitFor();
  await page.getByTestId("redo").click();
  await page.getByRole("button", { name: "D over “har” of harbour, line 3" }).waitFor();
  expect(await axeFaults(page)).toEqual([]);
  await mode(page, "Type");
}

test.each(["phone", "wide"] as const)(
  "on the %s a chart is pasted, chords are placed by touch, everything is kept by itself, and an earlier version comes back",
  async (viewport) => {
    const { context, page, errors } = await stage.open("none", viewport);
    await writeSong(page, viewport);
    await page.goto(`${page.url()}/edit`);
    await page.getByTestId("kept-words").waitFor();
    await placeByTouch(page);
    const placed = await chart(page);
    expect(placed).toContain("\nLow tide and the harbour\n");
    expect(placed.split("\n")[1]).toBe("G        C   G   D");
    await kept(page);
    await page.reload();
    await page.getByTestId("kept-words").waitFor();
    expect(await chart(page)).toBe(placed);
    // The way back outlives the reload too.
    await page.getByTestId("undo").click();
    expect(await chart(page)).toBe(pasted);
    await page.getByTestId("redo").click();
    expect(await chart(page)).toBe(placed);

    if (viewport === "phone") await mode(page, "Parts");
    await page.getByTestId("part-name-1").click();
    await page.getByTestId("once-more").click();
    expect(await axeFaults(page)).toEqual([]);
    if (viewport === "phone") await mode(page, "Type");
    expect(await chart(page)).toContain("\n[Chorus] x3\n");

    await page.getByTestId("song-title").fill("Slack Water, slower");
    await page.getByTestId("song-title").press("Control+z");
    expect(await page.getByTestId("song-title").inputValue()).toBe("Slack Water");
    await page.getByTestId("song-title").press("Control+y");
    await kept(page);

    await page.getByTestId("to-history").click();
    await page.getByTestId("version").first().waitFor();
    await page.getByTestId("look-at-version").last().click();
    await page.getByTestId("restore").waitFor();
    expect(await axeFaults(page)).toEqual([]);
    await page.getByTestId("restore").click();
    await page.getByTestId("restored").waitFor();
    await page.goto(page.url().replace(/history$/, "edit"));
    await page.getByTestId("kept-words").waitFor();
    expect(await chart(page)).toBe(pasted);
    expect(errors).toEqual([]);
    await context.close();
  },
  120_000,
);

test("two tabs at one song: the second is told, both changes go together, and nothing is lost", async () => {
  const { context, page, errors } = await stage.open("none", "wide");
  await signInAsMaren(page, "/songs");
  await page.getByText("Lantern on the Slipway").first().click();
  await page.getByTestId("edit-song").click();
  await page.getByTestId("song-chart").waitFor();
  const before = await chart(page);
  const other = await context.newPage();
  await other.goto(page.url());
  await other.getByTestId("song-chart").waitFor();

  await page.getByTestId("song-chart").fill(before.replace("burning low", "burning slow"));
  await kept(page);
  await other.getByTestId("song-chart").fill(`${before}\nand home again`);
  await other.getByTestId("clash").waitFor();
  expect(await axeFaults(other)).toEqual([]);
  expect(await other.getByTestId("clash").textContent()).toMatch(/Both changes fit together/);
  await other.getByTestId("clash-merge").click();
  await kept(other);
  const both = await chart(other);
  expect(both).toContain("burning slow");
  expect(both).toContain("and home again");

  await other.getByTestId("to-history").click();
  await other.getByTestId("version").nth(1).waitFor();
  expect(await other.getByTestId("version").first().textContent()).toContain("maren@orlow-quay.example");
  expect(errors).toEqual([]);
  await context.close();
}, 120_000);

/** A chart as long as one may be. */
const longest = (unit: string) => unit.repeat(Math.ceil(100_000 / unit.length)).slice(0, 99_990);

test.each([
  ["phone", "one line of words", longest("low tide and the harbour ")],
  ["wide", "two thousand verses", longest("[Verse 1]\nG        C   G\nLow tide and the harbour\n\n")],
] as const)(
  "on the %s %s, as long as a chart may be, are pasted and the field answers",
  async (viewport, _, text) => {
    const { context, page, errors } = await stage.open("none", viewport);
    await context.grantPermissions(["clipboard-read", "clipboard-write"]);
    await page.goto("/songs/new");
    await page.getByTestId("song-title").fill("All of it");
    await page.evaluate((long) => navigator.clipboard.writeText(long), text);
    await page.getByTestId("song-chart").focus();
    // By the clipboard, as a person does: typing 8,000 lines in one go keeps the browser itself busy for a minute.
    const [task = Infinity] = await pageTasks(page, async () => {
      await page.keyboard.press("Control+v");
      await page.getByTestId("preview").getByText("harbour").first().waitFor();
      await page.keyboard.type("!");
    });
    expect(await chart(page)).toBe(`${text}!`);
    // Processor time in ms; it was 12 s on the phone and minutes on the wide page.
    expect(task).toBeLessThan(2000);
    expect(errors).toEqual([]);
    await context.close();
  },
  90_000,
);
