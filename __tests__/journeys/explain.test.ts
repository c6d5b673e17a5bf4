import { axeFaults } from "./axeFaults";
import { openFerry } from "./openFerry";
import { scrollsSideways } from "./screenFaults";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "light"],
  ["wide", "dark"],
] as const)(
  "on the %s in %s colours a way is explained step by step, and a question is answered on the keys",
  async (viewport, scheme) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    await page.goto(`${await openFerry(page)}/ways`);
    await page.getByTestId("way-to-why").click();

    await page.getByTestId("scales").waitFor();
    const keys = page.getByTestId("answer-keys").getByTestId(/^key-/);
    for (let k = 0; k < 12; k++) {
      await keys.nth(k).click();
      if ((await page.getByTestId("verdict").textContent())?.startsWith("Right.")) break;
    }
    expect(await page.getByTestId("verdict").textContent()).toMatch(/^Right\./);
    await page.getByTestId("step-next").click();
    await page.getByTestId("numbered-lines").waitFor();
    await page.reload();
    await page.getByTestId("numbered-lines").waitFor();
    expect(await axeFaults(page)).toEqual([]);
    expect(await scrollsSideways(page)).toBe(false);
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);
