import { axeFaults } from "./axeFaults";
import { openFerry } from "./openFerry";
import { scrollsSideways } from "./screenFaults";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "dark"],
  ["wide", "light"],
] as const)(
  "on the %s in %s colours players get their ways into one key, and a whistle moves the keys",
  async (viewport, scheme) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    const song = await openFerry(page);
    await page.goto(`${song}/everyone`);
    await page.getByTestId("player-name").fill("Ilse");
    await page.getByTestId("player-instrument").selectOption("guitar");
    await page.getByTestId("player-add").click();
    const ways = page.getByTestId("player-ways").getByRole("radio");
    await ways.nth(1).click();
    await page.getByTestId("player-name").fill("Tede");
    await page.getByTestId("player-instrument").selectOption("whistle-D");
    await page.getByTestId("player-add").click();
    await page.getByTestId(/^fixed-(fits|does-not-fit)$/).waitFor();
    expect(await axeFaults(page)).toEqual([]);

    await page.reload();
    await page.getByTestId("player").nth(1).waitFor();
    await ways.nth(1).waitFor();
    expect(await ways.nth(1).getAttribute("aria-checked")).toBe("true");
    expect(await scrollsSideways(page)).toBe(false);
    await page.goto(`${song}/keys`);
    await page
      .getByTestId("fixed-line")
      .getByText(/the whistle in D/)
      .waitFor();
    await page.getByTestId("to-why").waitFor();
    await page.goto(`${song}/everyone`);
    for (const left of [1, 0]) {
      await page.getByTestId("player-remove").first().click();
      await page.waitForFunction(`document.querySelectorAll("[data-testid=player]").length === ${left}`);
    }
    await page.waitForLoadState("networkidle");
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);
