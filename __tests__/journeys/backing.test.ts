import { buildSync } from "esbuild";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { chordPitchClasses, parseChord } from "@/shared/music/chord";
import { demoSongs } from "@/shared/songs/demoSongs";
import type { BackingPlan, BackingWishes } from "@/shared/songs/backing/backingPlan";
import { planBacking } from "@/shared/songs/backing/planBacking";
import { launchBrowser } from "./browser";

interface PageOfSound {
  render(
    plan: BackingPlan,
    seconds: number,
    sampleRate: number,
  ): Promise<{
    onsets: number[];
    peak: number;
    rms: number;
    quietestClick: number;
    chromas: { name: string; chroma: number[] }[];
    renderedMs: number;
  }>;
  waitForPress(plan: BackingPlan): Promise<void>;
  goRound(plan: BackingPlan, loop: { at: number; end: number }): Promise<Record<string, number | null>>;
  pressed?: { preparedMs: number; startedMs: number; latencyMs: number; soundMs: number };
}

// Bars of the brief. A machine that does other work can only make the start later, so the best of a few trials counts.
const jitterBarMs = 5;
const startBarMs = 100;
const trials = 5;
const sampleRate = 48_000;

const say = (text: string) => process.stderr.write(`${text}\n`);
let browser: Browser;
let script: string;

beforeAll(async () => {
  const built = buildSync({
    entryPoints: [join(__dirname, "backingPage.ts")],
    bundle: true,
    write: false,
    format: "iife",
    tsconfig: join(__dirname, "..", "..", "tsconfig.json"),
  });
  script = built.outputFiles[0]!.text;
  browser = await launchBrowser("none");
}, 60_000);
afterAll(() => browser.close());

async function pageOfSound(): Promise<Page> {
  const page = await browser.newPage();
  await page.addScriptTag({ content: script });
  return page;
}

function nearest(onsets: readonly number[], at: number): number {
  return onsets.reduce((best, onset) => (Math.abs(onset - at) < Math.abs(best - at) ? onset : best), Infinity);
}

function decibels(level: number): string {
  return (20 * Math.log10(level)).toFixed(1);
}

function planOf(id: string, wishes: BackingWishes): BackingPlan {
  const song = demoSongs.find((each) => each.id === id)!;
  return planBacking(song, { tonic: song.writtenKey.tonic, shift: 0 }, wishes)!;
}

test.each([
  ["lantern", "strum"],
  ["ferry", "alternating-bass"],
  ["salt", "pluck-and-strum"],
] as const)(
  "half a minute of %s by %s sounds when its plan says, on the tones of its chords, neither clipped nor too soft",
  async (id, hand) => {
    const plan = planOf(id, { hand, countInBars: 2 });
    const page = await pageOfSound();
    const { onsets, peak, rms, quietestClick, chromas, renderedMs } = await page.evaluate(
      ([made, rate]) => (window as unknown as PageOfSound).render(made, 30, rate),
      [plan, sampleRate] as const,
    );
    await page.close();
    const struck = plan.events
      .filter(({ at, kind }) => at < 29 && kind !== "guide" && kind !== "bass")
      .map(({ at }) => at);
    const late = struck.map((at) => nearest(onsets, at) - at);
    const near = late.filter((seconds) => Math.abs(seconds) < 0.03);
    const middle = [...near].sort((a, b) => a - b)[near.length >> 1]!;
    const off = near.map((seconds) => 1000 * Math.abs(seconds - middle)).sort((a, b) => a - b);
    say(
      `${id} by ${hand}: ${near.length} of ${struck.length} strokes found, all ${(1000 * middle).toFixed(1)} ms behind the plan, ` +
        `jitter at most ${off.at(-1)!.toFixed(2)} ms (95 %: ${off[Math.floor(0.95 * off.length)]!.toFixed(2)} ms), peak ${peak.toFixed(2)}, rendered in ${(renderedMs / 1000).toFixed(1)} s`,
    );
    expect(near.length / struck.length).toBeGreaterThan(0.97);
    expect(off.at(-1)).toBeLessThan(jitterBarMs);
    expect(peak).toBeLessThan(1);
    const shares = chromas.map(({ name, chroma }) =>
      chordPitchClasses(parseChord(name)!).reduce((sum, pc) => sum + chroma[pc]!, 0),
    );
    say(
      `  ${plan.metre.name}: level ${decibels(rms)} dB, quietest click ${decibels(quietestClick)} dB at its peak; of the sound of ` +
        `${shares.length} chords at least ${(100 * Math.min(...shares)).toFixed(0)} % lies on their own tones`,
    );
    expect(rms).toBeGreaterThan(0.02);
    expect(quietestClick).toBeGreaterThan(rms);
    expect(shares.length).toBeGreaterThan(5);
    expect(Math.min(...shares)).toBeGreaterThan(0.8);
  },
  60_000,
);

test("the first sound follows the press within 100 ms", async () => {
  const plan = planOf("lantern", { guide: true });
  const all = [];
  do {
    const page = await pageOfSound();
    await page.evaluate((made) => (window as unknown as PageOfSound).waitForPress(made), plan);
    await page.getByRole("button", { name: "Play" }).click();
    const pressed = await page.waitForFunction(() => (window as unknown as PageOfSound).pressed);
    all.push((await pressed.jsonValue())!);
    await page.close();
  } while (all.at(-1)!.soundMs > startBarMs && all.length < trials);
  for (const { preparedMs, startedMs, latencyMs, soundMs } of all) {
    say(
      `Press to sound ${soundMs.toFixed(0)} ms (scheduled after ${startedMs.toFixed(0)} ms, device ${latencyMs.toFixed(0)} ms); ` +
        `strings rendered in ${preparedMs.toFixed(0)} ms when the page opened`,
    );
  }
  expect(Math.min(...all.map(({ soundMs }) => soundMs))).toBeLessThanOrEqual(startBarMs);
}, 60_000);

test("a stretch goes round, pauses where it is and goes on from there", async () => {
  const plan = planOf("lantern", {});
  const loop = { at: plan.countInS, end: plan.countInS + 0.6 };
  const page = await pageOfSound();
  const round = await page.evaluate(([made, stretch]) => (window as unknown as PageOfSound).goRound(made, stretch), [
    plan,
    loop,
  ] as const);
  await page.close();
  expect(round).toMatchObject({ silent: null, stopped: null });
  expect(round.least).toBeGreaterThanOrEqual(loop.at - 1e-6);
  expect(round.most).toBeLessThanOrEqual(loop.end + 1e-6);
  expect(round.resumedAt).toBeCloseTo(round.pausedAt!, 1);
}, 60_000);
