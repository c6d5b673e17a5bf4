import { axeFaults } from "./axeFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "dark", false],
  ["wide", "light", true],
] as const)(
  "on the %s shapes are ticked, wishes re-rank the ways at once, are kept, and a way is kept",
  async (viewport, scheme, signedIn) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    if (signedIn) await signInAsMaren(page, "/songs");
    else await page.goto("/songs");
    await page.getByText("Pull the Shutters").first().click();
    await page.getByTestId("chart").waitFor();
    const song = page.url().replace(/[?#].*$/, "");
    const ways = page.getByTestId("ways").getByRole("radio");
    const titles = () => page.getByTestId("ways").getByRole("radio").allInnerTexts();
    const wishes = page.getByTestId("wishes");
    await page.goto(`${song}/ways?key=C&shift=0`);
    await ways.first().waitFor();
    const before = await titles();

    await wishes.click();
    // Ways change places and shapes with every tick, so that the next one is looked for anew each time.
    const familiar = ways.filter({ hasText: "play the shapes you know" });
    const unticked = page.getByRole("button", { name: /^I know it: this shape/, pressed: false });
    for (;;) {
      await unticked.first().or(familiar.first()).first().waitFor();
      if ((await familiar.count()) > 0) break;
      await unticked.first().click();
    }
    expect(await axeFaults(page)).toEqual([]);

    await page.getByRole("button", { name: "No barre" }).click();
    await page.getByRole("button", { name: "Never retune on stage" }).click();
    // The list is there all the time: nothing is blank while the ways are weighed anew.
    expect(await ways.count()).toBeGreaterThan(0);
    for (let k = 0; k < 6; k += 1) await page.getByRole("button", { name: "Highest capo one fret lower" }).click();
    await page.getByText("Highest capo: fret 1").waitFor();
    await page.waitForFunction(
      () => !/Capo [2-9]/.test(document.querySelector("[data-testid=ways]")?.textContent ?? ""),
    );
    expect(await titles()).not.toEqual(before);

    await page.getByTestId("known-shapes").click();
    await page.getByText(/\d shapes? ticked/).waitFor();
    expect(await axeFaults(page)).toEqual([]);
    await page.goto(`${song}/ways?key=C&shift=0`);
    await page.getByText(/no barre, never retune on stage, \d+ shapes? you know, capo 1 or lower/).waitFor();
    await page.getByTestId("use-way").click();
    await page.getByRole("button", { name: /^You use/ }).waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  90_000,
);
