import { axeFaults } from "./axeFaults";
import { scrollsSideways } from "./screenFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "light", "C"],
  ["wide", "dark", "D"],
] as const)(
  "on the %s in %s colours a kept voice, a table figure and a typed singer find their key and decide it",
  async (viewport, scheme, tonic) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    await signInAsMaren(page, "/songs");
    await page.getByText("The Half-Past-Nine Ferry").first().click();
    await page.getByTestId("chart").waitFor();
    await page.goto(`${page.url().replace(/\?.*$/, "")}/keys`);
    await page.getByTestId("to-together").click();

    await page.getByTestId("together-empty").waitFor();
    await page
      .getByTestId(/^add-voice-/)
      .first()
      .click();
    await page.getByTestId("together-one").waitFor();
    await page.getByTestId("add-type-soprano").click();
    await page.getByTestId("singer-name").fill("Ben");
    await page.getByTestId("singer-lowest").fill("G2");
    await page.getByTestId("singer-highest").fill("E4");
    await page.getByTestId("singer-keep").click();
    await page.getByTestId("span-row").nth(2).waitFor();
    await page.getByTestId("adding").click();
    await page.getByTestId("add-singers").waitFor({ state: "detached" });
    await page
      .getByTestId("octaves")
      .getByText(/Ben sings it an octave lower\./)
      .waitFor();
    expect(await page.getByTestId("span-row").count()).toBe(3);

    const table = page.getByTestId("heat-table");
    expect(await table.getByRole("row").count()).toBe(6);
    expect(await table.getByRole("columnheader").count()).toBe(13);
    await page.getByTestId("group-order").selectOption("mean");
    await page.getByTestId(`pick-${tonic}`).focus();
    await page.keyboard.press("Enter");
    expect(await page.getByTestId(`pick-${tonic}`).getAttribute("aria-pressed")).toBe("true");
    expect(await axeFaults(page)).toEqual([]);
    expect(await scrollsSideways(page)).toBe(false);

    await page.getByTestId("take-shared-key").click();
    await page.getByTestId("shared-key-kept").waitFor();
    await page.reload();
    await page.getByTestId("fairest").waitFor();
    expect(await page.getByTestId("singer").count()).toBe(3);
    await page.getByTestId(`pick-${tonic}`).click();
    await page.getByTestId("shared-key-kept").waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);
