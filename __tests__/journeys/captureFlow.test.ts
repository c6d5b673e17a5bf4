import type { Page, Request } from "playwright-core";
import { makeMicrophones } from "./microphone";
import { typeCredentials } from "./signIn";
import { setStage } from "./stage";
import { singFor, sungUpTo } from "./singing";

const microphones = makeMicrophones();
const song = { wav: microphones.longVoice(55).wav };
const stage = setStage("kept");
afterAll(microphones.remove);

test("the count-in is off until it is wanted, is counted for the eyes too, and is remembered", async () => {
  const { context, page } = await stage.open(song, "phone");
  await page.goto("/voice/sing");
  const wanted = page.getByTestId("count-in");
  expect(await wanted.getAttribute("aria-checked")).toBe("false");
  await wanted.press("Space");
  await page.reload();
  expect(await wanted.getAttribute("aria-checked")).toBe("true");
  await page.evaluate(() => {
    const seen: string[] = [];
    Object.assign(window, { seen });
    new MutationObserver(() => {
      const now = document.querySelector('[data-testid="count-left"]')?.textContent ?? "";
      if (now !== "" && seen.at(-1) !== now) seen.push(now);
    }).observe(document, { subtree: true, childList: true, characterData: true });
  });
  await page.getByTestId("sing-start").click();
  await page.getByTestId("count-left").waitFor();
  await page.getByTestId("count-cancel").click();
  await page.getByTestId("sing-start").click();
  await sungUpTo(page, 6);
  expect((await page.evaluate(() => (window as unknown as { seen: string[] }).seen)).slice(-4)).toEqual([
    "4",
    "3",
    "2",
    "1",
  ]);
  await page.getByTestId("sing-stop").click();
  await page.getByTestId("comfort-notes").waitFor();
  await context.close();
});

/** How far the moving layer of the trail is shifted. */
const shiftOf = (page: Page) =>
  page.evaluate(() => {
    const trail = document.querySelector('[data-testid="playing-trail"]');
    const layer = [...(trail?.querySelectorAll<HTMLElement>("div") ?? [])].find(({ style }) => style.transform !== "");
    return layer?.style.transform ?? "";
  });

test("a take is played back with its trail moving along, trimmed by keys and by hand, and made whole again", async () => {
  const { context, page, errors } = await stage.open(song, "phone");
  await page.goto("/voice/sing");
  await singFor(page, 9);
  const whole = await page.getByTestId("comfort-notes").textContent();
  await page.getByTestId("take-play").click();
  await page.getByTestId("playing-trail").waitFor();
  const first = await shiftOf(page);
  await page.waitForFunction((before) => {
    const trail = document.querySelector('[data-testid="playing-trail"]');
    const layer = [...(trail?.querySelectorAll<HTMLElement>("div") ?? [])].find(({ style }) => style.transform !== "");
    const px = (text: string) => Number.parseFloat(text.replace("translateX(", ""));
    return layer !== undefined && px(layer.style.transform) < px(before) - 30;
  }, first);
  await page.getByTestId("take-play").click();

  // Only the last, low notes stay.
  const start = page.getByTestId("trim-start");
  for (let k = 0; k < 6; k += 1) await start.press("PageUp");
  await page.getByText(/^From 6\.0 to/).waitFor();
  expect(await page.getByTestId("comfort-notes").textContent()).not.toBe(whole);
  await page.getByTestId("take-whole").click();
  expect(await page.getByTestId("comfort-notes").textContent()).toBe(whole);

  const end = page.getByTestId("trim-end");
  await end.scrollIntoViewIfNeeded();
  const box = await end.boundingBox();
  if (!box) throw new Error("The handle is not on the page.");
  await page.mouse.move(box.x + box.width / 2, box.y + 40);
  await page.mouse.down();
  await page.mouse.move(box.x - 60, box.y + 40, { steps: 5 });
  await page.mouse.up();
  await page.getByText(/^From 0\.0 to [5-8]\.\d s of/).waitFor();
  expect(errors).toEqual([]);
  await context.close();
});

test("nothing of the sound leaves the page: while it is sung, heard, played, trimmed and kept", async () => {
  const { context, page } = await stage.open(song, "phone");
  await page.goto("/account/sign-up");
  await typeCredentials(page, "quiet.singer@example.org", "kettle rain window");
  await page.waitForURL((url) => !url.pathname.endsWith("/sign-up"));

  const requests: Request[] = [];
  const sockets: string[] = [];
  context.on("request", (request) => requests.push(request));
  page.on("websocket", (socket) => sockets.push(socket.url()));
  await page.goto("/voice/sing");
  await singFor(page, 9);
  await page.getByTestId("comfort-notes").waitFor();
  await page.getByTestId("take-play").click();
  await page.getByTestId("playing-trail").waitFor();
  await page.getByTestId("take-play").click();
  await page.getByTestId("trim-start").press("PageUp");
  await page.getByText(/^From 1\.0 to/).waitFor();
  const told = () => requests.filter((request) => request.postDataBuffer() !== null);
  expect(told().map((request) => `${request.method()} ${request.url()}`)).toEqual([]);

  await page.getByTestId("sing-keep").click();
  await page.waitForURL("**/voice");
  await page.getByTestId("take-row").waitFor();
  expect(sockets).toEqual([]);
  // Addresses carry nothing either, and all stay with this server or in the page itself.
  for (const request of requests) {
    const { protocol, origin, search } = new URL(request.url());
    expect(protocol === "blob:" || origin === new URL(page.url()).origin).toBe(true);
    expect(search.length).toBeLessThan(40);
  }
  const sent = told().map((request) => ({
    path: new URL(request.url()).pathname.replace(/[0-9a-f-]{36}/, ":id"),
    body: request.postDataJSON() as Record<string, unknown>,
  }));
  expect(sent.map(({ path }) => path).sort()).toEqual(["/api/takes/:id", "/api/voices/:id"]);
  const take = sent.find(({ path }) => path.startsWith("/api/takes"))?.body ?? {};
  const numbers = take.notes as Record<string, unknown>[];
  expect(numbers.length).toBeLessThan(60);
  for (const note of numbers) {
    expect(Object.keys(note).sort()).toEqual(["clear", "end", "midi", "start", "steadinessCents", "sustained"]);
  }
  // Everything that is kept of nine seconds is less than a tenth of a second of the worst telephone line.
  expect(JSON.stringify({ ...take, notes: [] }).length).toBeLessThan(2500);
  for (const [name, value] of Object.entries(take)) {
    if (name !== "notes" && name !== "reasons") expect(Array.isArray(value)).toBe(false);
  }
  await context.close();
}, 60_000);
