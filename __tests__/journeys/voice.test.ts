import type { Page } from "playwright-core";
import { glyphs, noteName } from "../../shared/music/pitch";
import type { Microphone, Viewport } from "./browser";
import { makeMicrophones } from "./microphone";
import { setStage } from "./stage";
import { enoughS, singFor, sungUpTo } from "./singing";

const microphones = makeMicrophones();
const stage = setStage("fresh");
afterAll(microphones.remove);

async function open(microphone: Microphone, viewport: Viewport = "phone") {
  return stage.open(microphone, viewport);
}

/** From home to the result, as a stranger would. */
async function singUntilHeard(page: Page): Promise<void> {
  await page.goto("/");
  await page.getByRole("link", { name: "Sing a few seconds" }).click();
  await singFor(page, 9);
}

/** What the span ladder says to those who cannot see it. */
async function ladderWords(page: Page): Promise<string | null> {
  return page.getByRole("img", { name: /^Voice (heard|set) from/ }).getAttribute("aria-label");
}

const heardFrom = (lowestMidi: number, highestMidi: number) =>
  `Voice heard from ${glyphs(noteName(lowestMidi))} to ${glyphs(noteName(highestMidi))}.`;

describe("a sung phrase", () => {
  test.each([
    ["phone", 45],
    ["wide", 57],
  ] as const)("gives its true lowest and highest notes on the %s", async (viewport, lowest) => {
    const voice = microphones.voice(lowest);
    const { page, errors } = await open({ wav: voice.wav }, viewport);
    await singUntilHeard(page);
    expect(await ladderWords(page)).toContain(heardFrom(voice.lowestMidi, voice.highestMidi));
    expect(await page.getByTestId("take-clear").textContent()).toMatch(/^Heard clearly in \d+ of \d+ notes$/);
    expect(errors).toEqual([]);
  });

  test("by Debian's sampled choir gives its true lowest and highest notes", async () => {
    const choir = microphones.choir(60);
    if (!choir)
      throw new Error("FluidSynth or its sound font is missing: apt-get install fluidsynth fluid-soundfont-gm");
    const { page } = await open({ wav: choir.wav });
    await singUntilHeard(page);
    expect(await ladderWords(page)).toContain(heardFrom(choir.lowestMidi, choir.highestMidi));
  });

  test("is drawn while it is sung, can be played back, sung again, and survives a reload before it is kept", async () => {
    const voice = microphones.voice(57);
    const { page } = await open({ wav: voice.wav });
    await page.goto("/voice/sing");
    await page.getByTestId("sing-start").click();
    await page.getByTestId("pitch-trail").waitFor();
    await page.waitForFunction(() =>
      /^[A-G]/.test(document.querySelector('[data-testid="note-now"]')?.textContent ?? ""),
    );
    await sungUpTo(page, enoughS);
    await page.getByTestId("sing-stop").click();
    const summary = await ladderWords(page);
    await page.getByTestId("take-play").click();
    await page.getByRole("button", { name: "Stop playing" }).waitFor();
    await page.reload();
    expect(await ladderWords(page)).toBe(summary);
    await page.getByTestId("sing-again").click();
    await page.getByRole("button", { name: /Start singing|Stop/ }).waitFor();
  });
});

describe("when it cannot be heard", () => {
  test("a refused microphone is said so, and the notes can be set by hand", async () => {
    const { page } = await open("refused");
    await page.goto("/voice/sing");
    await page.getByTestId("sing-start").click();
    await page.getByTestId("take-failure-refused").waitFor();
    await page.getByTestId("sing-by-hand").click();
    await page.getByTestId("by-hand-lowest").fill("A2");
    await page.getByTestId("by-hand-highest").fill("H9");
    await page.getByTestId("by-hand-keep").click();
    await page.locator('[data-testid="by-hand-highest"][aria-invalid="true"]').waitFor();
    expect(await page.getByTestId("by-hand-lowest").inputValue()).toBe("A2");
    expect(await page.getByTestId("by-hand-highest").inputValue()).toBe("H9");
    await page.getByTestId("by-hand-highest").fill("E4");
    await page.getByTestId("by-hand-keep").click();
    await page.waitForURL("**/voice");
    expect(await ladderWords(page)).toContain("A2 to E4");
  });

  test("a missing microphone is said so", async () => {
    const { page } = await open("none");
    await page.goto("/voice/sing");
    await page.getByTestId("sing-start").click();
    await page.getByTestId("take-failure-no-microphone").waitFor();
  });

  test("silence is refused with the reason", async () => {
    const { page } = await open({ wav: microphones.silence() });
    await page.goto("/voice/sing");
    await singFor(page, 4);
    await page.getByTestId("take-failure-too-quiet").waitFor();
    await page.getByTestId("sing-again").waitFor();
  });
});
