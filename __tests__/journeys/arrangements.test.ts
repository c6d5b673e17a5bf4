import { axeFaults } from "./axeFaults";
import { openFerry } from "./openFerry";
import { scrollsSideways } from "./screenFaults";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "dark"],
  ["wide", "light"],
] as const)(
  "on the %s in %s colours three arrangements are proposed; one is heard, changed on the neck and by eighths, kept, and stands on the sheet",
  async (viewport, scheme) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    const song = await openFerry(page);
    await page.goto(`${song}/ways`);
    await page.getByTestId("arrange").click();
    const open = page.getByTestId(/^open-/);
    await open.nth(2).waitFor();
    expect(await axeFaults(page)).toEqual([]);
    for (const compare of [0, 1])
      await page
        .getByTestId(/^compare-/)
        .nth(compare)
        .click();
    await page.getByTestId("to-compared").click();
    await open.first().click();

    // Heard: the desk counts while it plays.
    const hear = page.getByTestId(/^hear-/).first();
    await hear.click();
    await hear.getByText("Stop").waitFor();
    await hear.click();
    await hear.getByText("Hear it").waitFor();

    // Another shape for the open chord, from those that the neck has.
    const shapes = page.getByTestId("shapes").getByRole("radio");
    const others = await shapes.evaluateAll((all) =>
      all.flatMap((shape, at) => (shape.getAttribute("aria-checked") === "true" ? [] : [at])),
    );
    await shapes.nth(others[0]!).click();
    await page.waitForFunction(
      (at) =>
        document.querySelectorAll('[data-testid="shapes"] [role="radio"]')[at]?.getAttribute("aria-checked") === "true",
      others[0]!,
    );
    // And a stroke more in the bar.
    await page.getByTestId("change-pattern").click();
    const last = page.getByTestId("pattern-grid").getByRole("radiogroup").last().getByRole("radio");
    await last.nth(1).click();
    expect(await last.nth(1).getAttribute("aria-checked")).toBe("true");
    expect(await axeFaults(page)).toEqual([]);
    expect(await scrollsSideways(page)).toBe(false);

    // What is not kept yet survives a reload; then it is kept under a name of its own.
    await page.reload();
    await page.getByTestId("arrangement-name").fill("For the quay");
    await page.getByTestId("keep-arrangement").click();
    await page.getByTestId("arrangement-sheet").click();
    await page.waitForURL("**/sheet?**");
    if (viewport === "wide") {
      await page.getByTestId("paper").getByText("Right hand, each bar").first().waitFor();
      await page.getByTestId("paper").getByText("The tune in your voice").first().waitFor();
    } else await page.getByTestId("sheet-grids").waitFor();

    await page.goto(`${song}/ways`);
    await page.getByTestId("arrange").click();
    await page.getByRole("heading", { name: "Kept" }).waitFor();
    await page.getByRole("heading", { name: "For the quay" }).first().waitFor();
    // Taken away again, so that the other size begins without it.
    await open.first().click();
    await page.getByTestId("remove-arrangement").click();
    await page.getByTestId("remove-confirmed").click();
    await page.getByRole("heading", { name: "Proposed" }).waitFor();
    expect(await page.getByRole("heading", { name: "Kept" }).count()).toBe(0);
    expect(errors).toEqual([]);
    await context.close();
  },
  90_000,
);
