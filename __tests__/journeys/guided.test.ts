import type { Page } from "playwright-core";
import { axeFaults } from "./axeFaults";
import type { Viewport } from "./browser";
import { followTones, hum, type FollowingSinger } from "./followingSinger";
import { setStage } from "./stage";

const stage = setStage("kept");

async function open(voice: FollowingSinger, viewport: Viewport = "phone") {
  const profile = await stage.open("none", viewport);
  await followTones(profile.page, voice);
  return profile;
}

/** Goes on with every miss until the way waits at one of these. */
async function goOn(page: Page, until: string): Promise<void> {
  for (let guard = 0; guard < 12; guard += 1) {
    await page.locator(`[data-testid="guided-again"], [data-testid="${until}"]`).first().waitFor({ timeout: 90_000 });
    if (await page.getByTestId(until).isVisible()) return;
    await page.getByTestId("guided-again").click();
  }
  throw new Error(`${until} does not come`);
}

test("a stranger hums, goes down and up by the tones, says what is for songs, and keeps the very ends", async () => {
  const { page, errors, context } = await open({ lowest: 50, highest: 60, hum: 55 });
  const sent: string[] = [];
  page.on("request", (request) => void (request.method() !== "GET" && sent.push(request.url())));
  await page.goto("/voice");
  await page.getByTestId("voice-guided").click();
  const cautions = await page.getByTestId("guided-cautions").textContent();
  for (const sign of [
    /hurts or burns/,
    /tickles and you have to cough/,
    /top notes are gone/,
    /hoarse/,
    /four weeks/,
    /2018/,
  ])
    expect(cautions).toMatch(sign);
  await page.getByTestId("guided-start").click();
  await page.getByText("Hum a comfortable note").first().waitFor();
  await hum(page);
  await goOn(page, "guided-turn");
  expect(await page.getByTestId("guided-turn").textContent()).toContain("D3");
  // A reload loses nothing: the way goes on from where it was.
  await page.reload();
  expect(await page.getByTestId("guided-paused").textContent()).toMatch(/loaded again.*D3 to G3/);
  await page.getByTestId("guided-resume").click();
  await goOn(page, "guided-result");
  expect(await page.getByTestId("guided-reach").textContent()).toBe("D3 to C4");
  expect(await page.getByTestId("guided-sing-high").textContent()).toBe("A3");
  await page.getByTestId("guided-sing-high-down").click();
  await page.reload();
  expect(await page.getByTestId("guided-reach").textContent()).toBe("D3 to C4");
  expect(await page.getByTestId("guided-sing-high").textContent()).toBe("A♭3");
  await page.getByRole("radio", { name: "2", exact: true }).click();
  await page.getByTestId("guided-keep").click();
  await page.waitForURL("**/voice");
  expect(await page.getByTestId("voice-range").textContent()).toBe("You can hold: D3 to C4.");
  expect(await page.getByTestId("take-row").textContent()).toMatch(/guided hold.*felt 2 of 5/);
  await page.getByTestId("why-high").click();
  expect(await page.getByTestId("why-high-answer").textContent()).toMatch(
    /^You held C4 for \d\.\d s in the guided hold of /,
  );
  expect(sent.filter((url) => !url.includes("/api/auth/"))).toEqual([]);
  expect(errors).toEqual([]);
  await context.close();
}, 240_000);

test("under 16 nothing is tried twice, and stopping early keeps what was held", async () => {
  const { page, context } = await open({ lowest: 58, highest: 80, hum: 62 }, "wide");
  await page.goto("/voice/guided");
  await page.getByRole("radio", { name: "Under 16" }).click();
  await page.getByTestId("guided-young").waitFor();
  await page.getByTestId("guided-start").click();
  await page.getByText("Hum a comfortable note").first().waitFor();
  await hum(page);
  await page
    .getByText(/^Now sing/)
    .first()
    .waitFor();
  expect(await axeFaults(page)).toEqual([]);
  await page.getByTestId("guided-turn").waitFor({ timeout: 90_000 });
  expect(await axeFaults(page)).toEqual([]);
  expect(await page.getByTestId("guided-turn").textContent()).toContain("B♭3");
  await page.getByTestId("guided-finish").click();
  await page.getByTestId("guided-week").waitFor();
  expect(await axeFaults(page)).toEqual([]);
  expect(await page.getByTestId("guided-result").textContent()).toContain("Only the low end was looked for.");
  await context.close();
}, 120_000);

test("a refused microphone is said so before anything sounds", async () => {
  const { context, page } = await stage.open("refused");
  await page.goto("/voice/guided");
  await page.getByTestId("guided-start").click();
  await page.getByTestId("guided-failed-refused").waitFor();
  await page.getByTestId("guided-restart").click();
  await page.getByTestId("guided-start").waitFor();
  await context.close();
}, 60_000);
