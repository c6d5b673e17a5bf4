import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Page } from "playwright-core";
import { setStage } from "./stage";
import { endlessScore, packedScore, twoTrackMidi } from "./tuneFiles";

const stage = setStage("kept");

/** Our own eight bars in D, from A3 up to B4. */
const abc = "X:1\nT:Quay steps\nM:4/4\nL:1/4\nK:D\nD E F A|B2 A2|G F E D|A,4|D E F A|B2 A F|G E F E|D4|]\n";

async function give(page: Page, file: string | { name: string; buffer: Buffer }): Promise<void> {
  const [chooser] = await Promise.all([
    page.waitForEvent("filechooser"),
    page.getByRole("button", { name: /Choose (a|another) file/ }).click(),
  ]);
  await chooser.setFiles(typeof file === "string" ? file : { mimeType: "application/octet-stream", ...file });
}

test.each(["phone", "wide"] as const)(
  "on the %s a melody comes from a file: voices with reasons, seen and heard, its words into the chart",
  async (viewport) => {
    const { context, page, errors } = await stage.open("none", viewport);
    await page.goto("/songs/new");
    await page.getByTestId("song-title").fill("Quay Steps");
    await page.getByRole("radio", { name: /^From a file/ }).click();

    await give(page, { name: "steps.mid", buffer: Buffer.from("no melody at all") });
    await page
      .getByTestId("melody-refusal")
      .getByText(/no MIDI file/)
      .waitFor();
    expect(await page.getByTestId("song-title").inputValue()).toBe("Quay Steps");

    // Two tracks: the voice is proposed, and the page says why.
    await give(page, { name: "lanterns.mid", buffer: twoTrackMidi() });
    await page.getByText(/11 notes, D4 to A4, from lanterns.mid, Voice/).waitFor();
    const voice = page.getByRole("radio", { name: /^Voice \(likely the sung one\)/ });
    expect(await voice.getAttribute("aria-checked")).toBe("true");
    await voice.getByText(/It has words\. It has one note at a time\. Its name says “Voice”\./).waitFor();
    await page
      .getByRole("radio", { name: /^Piano/ })
      .getByText(/Its name says “Piano”\.|several notes at once/)
      .waitFor();
    await page.getByRole("radio", { name: /^Piano/ }).click();
    await page.getByText(/from lanterns.mid, Piano/).waitFor();
    await voice.click();
    await page
      .getByRole("img", { name: /The tune.*: D4 Lan-, E4 terns, F♯4 on/ })
      .first()
      .waitFor();

    await page.getByTestId("melody-hear").click();
    await page.getByRole("button", { name: "Stop the melody" }).click();
    await page.getByRole("button", { name: "Hear the melody" }).waitFor();

    await page.getByRole("button", { name: "Put the words into the chart" }).click();
    await page.waitForFunction(() =>
      [...document.querySelectorAll("textarea")].some(
        (field) => field.value === "Lanterns on the quay, low tide away to sea.",
      ),
    );

    // Compressed MusicXML, then ABC; the last one is kept with the song.
    await give(page, { name: "quay.mxl", buffer: packedScore() });
    await page.getByText(/11 notes, D4 to A4, from quay.mxl/).waitFor();
    await give(page, { name: "steps.abc", buffer: Buffer.from(abc) });
    await page.getByText(/23 notes, A3 to B4/).waitFor();
    await page.getByTestId("save-song").click();
    await page.getByRole("heading", { level: 1, name: "Quay Steps" }).waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);

test("reading can be stopped, and the sound ends with the page", async () => {
  const { context, page, errors } = await stage.open("none", "phone");
  await page.addInitScript(() => {
    const opened: AudioContext[] = [];
    const Plain = window.AudioContext;
    Object.assign(window, {
      opened,
      AudioContext: class extends Plain {
        constructor(options?: AudioContextOptions) {
          super(options);
          opened.push(this);
        }
      },
    });
  });
  let letGo = () => {};
  const held = new Promise<void>((done) => (letGo = done));
  await context.route("**/songFileWorker.js", async (route) => {
    await held;
    await route.continue().catch(() => undefined);
  });
  await page.goto("/songs/new");
  await page.getByRole("radio", { name: /^From a file/ }).click();
  await give(page, { name: "quay.mxl", buffer: packedScore() });
  await page.getByRole("button", { name: "Stop reading" }).click();
  await page.getByText(/ABC, MIDI or MusicXML, at most 5 MB/).waitFor();
  expect(await page.evaluate(() => document.activeElement?.textContent)).toMatch(/Choose a file/);
  letGo();

  await give(page, { name: "steps.abc", buffer: Buffer.from(abc) });
  await page.getByText(/23 notes, A3 to B4/).waitFor();
  await page.getByTestId("melody-hear").click();
  await page.getByRole("button", { name: "Stop the melody" }).waitFor();
  await page.getByRole("link", { name: "Voice" }).click();
  await page.getByRole("heading", { level: 1, name: "Your voice" }).waitFor();
  await page.waitForFunction(() => {
    const { opened } = window as unknown as { opened: AudioContext[] };
    return opened.length > 0 && opened.every((sound) => sound.state === "closed");
  });
  expect(errors).toEqual([]);
  await context.close();
}, 60_000);

/** Longest stretch in ms for which the page answered to nothing while it read a file that is refused after long work. */
async function longestBlock(page: Page, path: string): Promise<number> {
  await page.evaluate(() => {
    const seen: number[] = [];
    Object.assign(window, { longTasks: seen });
    new PerformanceObserver((list) => seen.push(...list.getEntries().map((entry) => entry.duration))).observe({
      type: "longtask",
    });
  });
  await give(page, path);
  await page
    .getByTestId("melody-refusal")
    .getByText(/repeats|too many|larger/)
    .waitFor();
  return page.evaluate(() => Math.max(0, ...(window as unknown as { longTasks: number[] }).longTasks));
}

test("a file of 5 MB is read beside the page, which stays awake meanwhile", async () => {
  const folder = mkdtempSync(join(tmpdir(), "tune-"));
  // A file of the disk reaches the page as it would from a person; one from memory would keep the page busy itself.
  const path = join(folder, "endless.musicxml");
  writeFileSync(path, endlessScore());
  const { context, page, errors } = await stage.open("none", "phone");
  await page.goto("/songs/new");
  await page.getByRole("radio", { name: /^From a file/ }).click();
  // Other programs may disturb a single measurement; a page that reads by itself is blocked every time.
  const blocks: number[] = [];
  while (blocks.length < 3 && Math.min(...blocks, Infinity) >= 100) blocks.push(await longestBlock(page, path));
  expect(Math.min(...blocks)).toBeLessThan(100);
  expect(errors).toEqual([]);
  await context.close();
  rmSync(folder, { recursive: true, force: true });
}, 60_000);
