import type { Page } from "playwright-core";
import { axeFaults } from "./axeFaults";
import type { Viewport } from "./browser";
import { scrollsSideways } from "./screenFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

/** Maren of the demonstration: two phrases and a guided hold. */
async function openVoice(viewport: Viewport) {
  const profile = await stage.open("none", viewport);
  const { page } = profile;
  await signInAsMaren(page, "/voice");
  await page.getByTestId("voice-range").waitFor();
  return profile;
}

const said = (page: Page) =>
  Promise.all([page.getByTestId("voice-range").textContent(), page.getByTestId("comfort-notes").textContent()]);

test("rating a take changes the comfortable notes, and taking the rating back restores them exactly", async () => {
  const { page, context } = await openVoice("phone");
  const row = page.getByTestId("take-row").nth(1);
  await row.getByTestId("take-felt").click();
  const before = await said(page);
  await row.getByRole("radio", { name: "5", exact: true }).click();
  await row.getByText(/felt 5 of 5, straining/).waitFor();
  await page.waitForFunction(
    (words) => document.querySelector('[data-testid="comfort-notes"]')?.textContent !== words,
    before[1],
  );
  await row.getByRole("radio", { name: "2", exact: true }).click();
  await row.getByText(/felt 2 of 5/).waitFor();
  await page.waitForFunction(
    (words) => document.querySelector('[data-testid="comfort-notes"]')?.textContent === words,
    before[1],
  );
  await page.reload();
  await page.getByTestId("voice-range").waitFor();
  expect(await said(page)).toEqual(before);
  await context.close();
}, 60_000);

test("the notes answer why they are what they are, and the picture over time stands as a table too", async () => {
  const { page, errors, context } = await openVoice("wide");
  await page.getByTestId("why-high").click();
  expect(await page.getByTestId("why-high-answer").textContent()).toMatch(
    /^You held C5 for 1\.0 s in the guided hold of Saturday,? 28 November, \d\d:\d\d\./,
  );
  await page.getByRole("img", { name: /^3 takes from 12 Nov to 28 Nov\./ }).waitFor();
  await page.getByTestId("trend-as-table").click();
  const table = page.getByRole("table", { name: "Takes over time" });
  expect(await table.getByRole("row").count()).toBe(4);
  expect(await table.textContent()).toContain("guided hold, warmed up, 3 of 5, some work");
  expect(errors).toEqual([]);
  await context.close();
}, 60_000);

test.each(["phone", "wide"] as const)(
  "the profile with everything open is accessible on the %s in both colours",
  async (viewport) => {
    const { page, context } = await openVoice(viewport);
    const inBoth = async () => {
      for (const colorScheme of ["light", "dark"] as const) {
        await page.emulateMedia({ colorScheme });
        expect(await axeFaults(page)).toEqual([]);
      }
    };
    await page.getByTestId("why-comfort").click();
    await page.getByTestId("trend-as-table").click();
    await page.getByTestId("take-felt").first().click();
    await page.getByTestId("take-erase").nth(1).click();
    await inBoth();
    await page.goto("/voice/guided");
    await page.getByTestId("guided-start").waitFor();
    await inBoth();
    expect(await scrollsSideways(page)).toBe(false);
    await context.close();
  },
  60_000,
);

test("erasing a take asks first and says what will be left, and exactly that is left", async () => {
  const { page, context } = await openVoice("phone");
  const row = page.getByTestId("take-row").first();
  await row.getByTestId("take-erase").click();
  const promised = /Without it you can hold (.*), comfortably (.*)\. This/.exec((await row.textContent()) ?? "");
  expect(promised).not.toBeNull();
  await page.getByTestId("take-erase-confirm").click();
  await page.waitForFunction(() => document.querySelectorAll('[data-testid="take-row"]').length === 2);
  const [range, comfort] = await said(page);
  expect(range).toBe(`You can hold: ${promised?.[1]}.`);
  expect(comfort).toContain(promised?.[2]);
  await context.close();
}, 60_000);
