import { axeFaults } from "./axeFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

test.each([
  ["phone", "dark", "Gulls on the Chandler's Roof", -3],
  ["wide", "light", "Pull the Shutters", -1],
] as const)(
  "on the %s a key is decided, changed, taken back, removed and brought back, and every page of the song tells it",
  async (viewport, scheme, title, toD) => {
    const { context, page, errors } = await stage.open("none", viewport, scheme);
    await signInAsMaren(page, "/songs");
    await page.getByText(title).first().click();
    await page.getByTestId("chart").waitFor();
    const song = page.url().replace(/[?#].*$/, "");
    const card = page.getByTestId("decided");
    const past = page.getByTestId("past-choice");
    const use = page.getByTestId("use-way");
    const decide = async (key: string, shift: number) => {
      await page.goto(`${song}/ways?key=${key}&shift=${shift}`);
      await use.click();
      await use.and(page.getByRole("button", { name: /^You use/ })).waitFor();
    };

    await page.goto(`${song}/keys`);
    await page.getByTestId("take-key").waitFor();
    expect(await card.count()).toBe(0);
    await decide("D", toD);
    await card.getByText("D", { exact: true }).waitFor();
    await page.getByTestId("key-history").click();
    await card.getByText("Nothing was decided before.").waitFor();
    await decide("C", toD - 2);
    await card.getByText("Your key", { exact: true }).waitFor();
    await card.getByText(/^since \d/).waitFor();
    await page.getByTestId("key-history").click();
    expect(await past.count()).toBe(1);
    expect(await past.textContent()).toMatch(/^D.*chords in/);
    expect(await axeFaults(page)).toEqual([]);

    await page.getByTestId("undo-key").click();
    await page.getByText("C is not your key any more.").waitFor();
    await card.getByText("Nothing was decided before.").waitFor();
    await page.getByTestId("bring-back").click();
    await past.waitFor();

    await page.goto(`${song}/keys`);
    await page.getByTestId("key-history").click();
    await past.waitFor();
    await page.getByTestId("remove-key").click();
    await card.waitFor({ state: "detached" });
    await page.getByTestId("bring-back").click();
    await card.waitFor();

    // It is kept, and told wherever the song is met.
    await page.goto(song);
    await card.getByText("Your key", { exact: true }).waitFor();
    await page.goto(`${song}/compare?keys=${toD - 2},${toD}`);
    await card.getByText("Your key", { exact: true }).waitFor();
    await page.goto("/songs");
    await page
      .getByRole(viewport === "wide" ? "row" : "listitem")
      .filter({ hasText: title })
      .filter({ hasText: /My key since \d+ \w+ \d+/ })
      .waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  90_000,
);
