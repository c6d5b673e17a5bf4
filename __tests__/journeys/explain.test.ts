import { axeFaults } from "./axeFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "light"],
  ["wide", "dark"],
] as const)(
  "on the %s in %s colours a way is explained step by step, and a question is answered on the keys",
  async (viewport, scheme) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    await signInAsMaren(page, "/songs");
    await page.getByText("The Half-Past-Nine Ferry").first().click();
    await page.getByTestId("chart").waitFor();
    await page.goto(`${page.url().replace(/\?.*$/, "")}/ways`);
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
    expect(await page.evaluate("document.documentElement.scrollWidth > document.documentElement.clientWidth")).toBe(
      false,
    );
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);
