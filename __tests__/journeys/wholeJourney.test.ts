import type { Page } from "playwright-core";
import type { Viewport } from "./browser";
import { makeMicrophones } from "./microphone";
import { setStage } from "./stage";
import { signInAsMaren } from "./signIn";
import { enoughS, singFor } from "./singing";

const microphones = makeMicrophones();
const voice = { wav: microphones.voice(55).wav };
const stage = setStage("kept");
afterAll(microphones.remove);

const chart = [
  "Verse 1",
  "D               G            D",
  "Salt on the window, rain in the lane,",
  "D             A        X&7   D",
  "kettle is singing the weather again.",
].join("\n");
const password = "kettle rain window";

async function singAndKeep(page: Page): Promise<void> {
  await page.goto("/");
  await page.getByRole("link", { name: "Sing a few seconds" }).click();
  await singFor(page, enoughS);
  await page.getByTestId("sing-keep").click();
  await page.waitForURL("**/voice");
  await page.getByTestId("take-row").waitFor();
}

async function addSong(page: Page): Promise<void> {
  await page.getByRole("link", { name: "Songs", exact: true }).click();
  await page.getByText("Lantern on the Slipway").waitFor();
  await page.getByText("The Half-Past-Nine Ferry").waitFor();
  await page.getByRole("link", { name: "Add a song" }).click();

  // an empty title is refused, and nothing typed is lost
  await page.getByTestId("song-chart").fill(chart);
  await page.getByTestId("save-song").click();
  await page.locator('[data-testid="song-title"][aria-invalid="true"]').waitFor();
  expect(await page.getByTestId("song-chart").inputValue()).toBe(chart);

  await page.getByTestId("song-title").fill("Salt on the Window");
  expect(await page.getByTestId("unread").textContent()).toMatch(/X&7/);
  expect(await page.getByTestId("written-key-name").textContent()).toBe("D major");
  await page.getByRole("radio", { name: /^By hand/ }).click();
  await page.getByTestId("tune-low").fill("A3");
  await page.getByTestId("tune-high").fill("X4");
  await page.getByTestId("save-song").click();
  await page.locator('[data-testid="tune-high"][aria-invalid="true"]').waitFor();
  expect(await page.getByTestId("tune-high").inputValue()).toBe("X4");

  // a reload in the middle of the form loses nothing
  await page.getByTestId("tune-high").fill("B4");
  await page.reload();
  await page.getByTestId("draft-restored").waitFor();
  expect(await page.getByTestId("song-title").inputValue()).toBe("Salt on the Window");
  expect(await page.getByTestId("song-chart").inputValue()).toBe(chart);
  expect(await page.getByTestId("tune-low").inputValue()).toBe("A3");
  expect(await page.getByTestId("tune-high").inputValue()).toBe("B4");
  await page.getByTestId("save-song").click();
  await page.getByRole("heading", { level: 1, name: "Salt on the Window" }).waitFor();
}

/** From the song to its keys and ways; returns the sentence of the way that was taken. */
async function chooseKeyAndWay(page: Page, viewport: Viewport): Promise<{ key: string; way: string }> {
  const songPage = page.url();
  await page.goto(`${songPage}/keys`);
  if (viewport === "wide") {
    const rows = page.getByRole("table").getByRole("row");
    await rows.nth(12).waitFor();
    expect(await rows.count()).toBe(13);
    const scores = await page.getByRole("table").locator("tbody [data-testid=key-score]").allTextContents();
    expect(scores.map(Number)).toEqual([...scores.map(Number)].sort((a, b) => b - a));
    await page.getByRole("link", { name: /^Ways to play/ }).click();
  } else {
    await page.getByTestId("key-card").first().waitFor();
    await page.getByTestId("all-keys").click();
    expect(await page.getByTestId("key-list").getByRole("listitem").count()).toBe(12);
    await page.getByTestId("take-key").click();
  }
  await page.waitForURL("**/ways?**");
  const key = new URL(page.url()).searchParams.get("key") ?? "";
  await page.getByTestId("instrument").click();
  await page.getByTestId("choose-ukulele").click();
  const cards = page.getByRole("radio");
  await cards.first().waitFor();
  expect(await cards.count()).toBeGreaterThan(1);
  // what could not be read stands in the moved chart as it was typed
  expect(await page.getByTestId("moved-chart").textContent()).toMatch(/Chart in .*window, rain in .*X&7/);
  await page.getByTestId("use-way").click();
  // the button says so when the way is kept
  await page
    .getByTestId("use-way")
    .and(page.getByRole("button", { name: /^You use/ }))
    .waitFor();
  await page.getByTestId("decided").getByText("Your key", { exact: true }).waitFor();
  const way = await chosenWay(page);
  await page.goto(songPage);
  await page
    .getByText(viewport === "wide" ? /^Your key$/ : /^My key/)
    .first()
    .waitFor();
  return { key, way };
}

async function chosenWay(page: Page): Promise<string> {
  return (await page.getByTestId("ways").getByRole("radio", { checked: true }).textContent()) ?? "";
}

async function signUp(page: Page, email: string): Promise<void> {
  await page.goto("/account/sign-up");
  await page.getByTestId("email").fill(email);
  await page.getByTestId("password").fill("short");
  await page.getByTestId("send").click();
  await page.locator('[data-testid="password"][aria-invalid="true"]').waitFor();
  expect(await page.getByTestId("email").inputValue()).toBe(email);
  await page.getByTestId("password").fill(password);
  await page.getByTestId("send").click();
  await page.waitForURL((url) => !url.pathname.endsWith("/sign-up"));
}

describe.each(["phone", "wide"] as const)("the whole journey on the %s", (viewport) => {
  const email = `singer.${viewport}@example.org`;

  test("sing, add a song, find a key and a way, sign up, and find it all on another device", async () => {
    const first = await stage.open(voice, viewport);
    const { page } = first;
    await singAndKeep(page);
    await addSong(page);
    const songAddress = new URL(page.url()).pathname;
    const { way } = await chooseKeyAndWay(page, viewport);
    await signUp(page, email);

    // signed in, the work is still there; signed out, the device shows none of it
    await page.goto(songAddress);
    await page.getByRole("heading", { level: 1, name: "Salt on the Window" }).waitFor();
    await page.goto("/account");
    expect(await page.getByTestId("account-email").textContent()).toBe(email);
    await page.getByTestId("sign-out").click();
    await page.getByTestId("to-sign-in").waitFor();
    await page.goto(songAddress);
    await page.getByTestId("no-such-song").waitFor();
    expect(first.errors).toEqual([]);
    await first.context.close();

    const second = await stage.open(voice, viewport);
    await second.page.goto(`/account/sign-in?next=${encodeURIComponent(songAddress)}`);
    await second.page.getByTestId("email").fill(email);
    await second.page.getByTestId("password").fill("not the password");
    await second.page.getByTestId("send").click();
    await second.page.getByTestId("form-problem").waitFor();
    expect(await second.page.getByTestId("email").inputValue()).toBe(email);
    await second.page.getByTestId("password").fill(password);
    await second.page.getByTestId("send").click();
    await second.page.getByRole("heading", { level: 1, name: "Salt on the Window" }).waitFor();
    await second.page
      .getByText(viewport === "wide" ? /^Your key$/ : /^My key/)
      .first()
      .waitFor();
    await second.page.goto(`${songAddress}/ways`);
    await second.page.getByRole("button", { name: /^You use/ }).waitFor();
    expect(await chosenWay(second.page)).toBe(way);
    await second.page.goto("/voice");
    await second.page.getByTestId("take-row").waitFor();
    expect(second.errors).toEqual([]);
    await second.context.close();

    // somebody else, by address: who may see it does not hang on the size
    if (viewport === "wide") return;
    const other = await stage.open(voice, viewport);
    await signInAsMaren(other.page, "/songs");
    const asked = other.page.waitForResponse((response) => response.url().endsWith(`/api${songAddress}`));
    await other.page.goto(songAddress);
    expect((await asked).status()).toBe(404);
    await other.page.getByTestId("no-such-song").waitFor();
    await other.context.close();
  }, 120_000);
});
