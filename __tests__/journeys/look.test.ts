import type { Page } from "playwright-core";
import { answered } from "./answered";
import type { Viewport } from "./browser";
import { faultsInEveryLook, type Screen } from "./screenFaults";
import { signInAsMaren } from "./signIn";
import { setStage } from "./stage";

const stage = setStage("kept");

/** A profile signed in as one of the demonstration's singers, who has a voice, songs and decided keys. */
async function asMaren(viewport: Viewport) {
  const profile = await stage.open("none", viewport);
  const { page } = profile;
  await signInAsMaren(page, "/songs");
  await page.getByText("Lantern on the Slipway").waitFor();
  const songs = await answered<{ id: string; title: string }[]>(page, "/songs");
  const ferry = songs.find(({ title }) => title === "The Half-Past-Nine Ferry");
  if (!ferry) throw new Error("The demonstration has no ferry.");
  return { ...profile, ferry: ferry.id };
}

/** Every screen with something on it. */
function screens(ferry: string): Screen[] {
  const heading = (page: Page) => page.getByRole("heading", { level: 1 }).first().waitFor();
  return [
    ["/", heading],
    ["/voice", (page) => page.getByTestId("take-row").first().waitFor()],
    ["/voice/sing", (page) => page.getByTestId("sing-start").waitFor()],
    ["/voice/guided", heading],
    ["/voice/upload", (page) => page.getByTestId("upload-choose").waitFor()],
    ["/voice/by-hand", (page) => page.getByTestId("by-hand-lowest").waitFor()],
    ["/songs", (page) => page.getByText("Lantern on the Slipway").waitFor()],
    ["/songs/new", (page) => page.getByTestId("song-chart").waitFor()],
    [`/songs/${ferry}`, (page) => page.getByTestId("chart").waitFor()],
    [`/songs/${ferry}/edit`, (page) => page.getByTestId("written-key").waitFor()],
    [`/songs/${ferry}/history`, (page) => page.getByRole("heading", { name: "Earlier versions" }).first().waitFor()],
    [`/songs/${ferry}/melody`, (page) => page.getByTestId("note-list").waitFor()],
    [`/songs/${ferry}/recording`, (page) => page.getByTestId("tap-beat").waitFor()],
    ["/songs/import", (page) => page.getByTestId("import-choose").waitFor()],
    [`/songs/${ferry}/keys`, (page) => page.getByText("The Half-Past-Nine Ferry").first().waitFor()],
    [`/songs/${ferry}/together`, (page) => page.getByTestId("together-empty").waitFor()],
    [`/songs/${ferry}/compare?keys=-7,-8,-6`, (page) => page.getByTestId("compare").waitFor()],
    [`/songs/${ferry}/try?key=C&shift=-7`, (page) => page.getByTestId("sing-start").waitFor()],
    [`/songs/${ferry}/ways`, (page) => page.getByTestId("ways").waitFor()],
    ["/instruments", (page) => page.getByText("Ukuleles").first().waitFor()],
    ["/account", (page) => page.getByTestId("account-email").waitFor()],
    ["/nowhere", heading],
  ];
}

/** The same product before anything was done in it. */
const strangersScreens: Screen[] = [
  ["/voice", (page) => page.getByRole("link", { name: "Sing a few seconds" }).waitFor()],
  ["/songs", (page) => page.getByText("Lantern on the Slipway").waitFor()],
  ["/account", (page) => page.getByTestId("to-sign-up").waitFor()],
  ["/account/sign-in", (page) => page.getByTestId("email").waitFor()],
  ["/account/sign-up", (page) => page.getByTestId("email").waitFor()],
];

test("every screen of a stranger is accessible, throws nothing and does not scroll sideways, in every look", async () => {
  const { page, errors, context } = await stage.open("none");
  expect(await faultsInEveryLook(page, strangersScreens)).toEqual({});
  expect(errors).toEqual([]);
  await context.close();
}, 180_000);

test("every screen of a singer is accessible, throws nothing and does not scroll sideways, in every look", async () => {
  const { page, errors, context, ferry } = await asMaren("phone");
  expect(await faultsInEveryLook(page, screens(ferry))).toEqual({});
  expect(errors).toEqual([]);
  await context.close();
}, 300_000);

test("♯ and ♭ are drawn from the shipped music font, in text and in charts", async () => {
  const { context, page, ferry } = await asMaren("wide");
  await page.goto(`/songs/${ferry}/keys`);
  await page.getByRole("table").getByText("♭").first().waitFor();
  const session = await context.newCDPSession(page);
  await session.send("DOM.enable");
  await session.send("CSS.enable");
  await session.send("DOM.getDocument");
  const { searchId, resultCount } = await session.send("DOM.performSearch", { query: "//*[text()='♯' or text()='♭']" });
  expect(resultCount).toBeGreaterThan(4);
  const { nodeIds } = await session.send("DOM.getSearchResults", { searchId, fromIndex: 0, toIndex: resultCount });
  for (const nodeId of nodeIds) {
    const { fonts } = await session.send("CSS.getPlatformFontsForNode", { nodeId });
    expect(fonts.map(({ familyName, isCustomFont }) => [familyName, isCustomFont])).toEqual([["Noto Music", true]]);
  }
  await context.close();
}, 60_000);

test("an address that nothing stands at answers 404 and says so", async () => {
  const { context, page } = await stage.open("none", "phone");
  expect((await page.goto("/nowhere"))?.status()).toBe(404);
  await page.getByText("Nothing stands at this address").waitFor();
  expect((await page.goto("/songs"))?.status()).toBe(200);
  await context.close();
});
