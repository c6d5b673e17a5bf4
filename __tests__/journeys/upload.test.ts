import { execFileSync } from "node:child_process";
import { readFileSync, truncateSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import type { Page } from "playwright-core";
import { glyphs, noteName } from "../../shared/music/pitch";
import type { Profile, Viewport } from "./browser";
import { speech } from "../sound/noSinging";
import { writeWav } from "../sound/wavFile";
import { makeMicrophones } from "./microphone";
import { setStage } from "./stage";

const microphones = makeMicrophones();
const voice = microphones.voice(55);
const stage = setStage("kept");
afterAll(microphones.remove);

const at = (name: string) => join(microphones.folder, name);

/** The sung phrase as another kind of file. */
function encoded(kind: string, ...how: string[]): string {
  const path = at(`song.${kind}`);
  execFileSync("ffmpeg", ["-v", "error", "-y", "-i", voice.wav, ...how, path]);
  return path;
}

async function open(viewport: Viewport = "phone") {
  const profile = await stage.open("none", viewport);
  await profile.page.goto("/voice/sing");
  await profile.page.getByTestId("sing-upload").click();
  await profile.page.getByTestId("upload-choose").waitFor();
  return profile;
}

const choose = (page: Page, path: string) => page.getByTestId("upload-file").setInputFiles(path);
const heard = `Voice heard from ${glyphs(noteName(voice.lowestMidi))} to ${glyphs(noteName(voice.highestMidi))}.`;

test.each([
  ["wav", ["-ac", "2", "-ar", "44100"]],
  ["mp3", ["-b:a", "128k"]],
  ["ogg", ["-c:a", "libvorbis"]],
  ["webm", ["-c:a", "libopus"]],
  ["flac", []],
  ["m4a", ["-c:a", "aac"]],
] as const)("a recording as %s gives the true lowest and highest notes, and can be kept", async (kind, how) => {
  const path = encoded(kind, ...how);
  const { context, page, errors } = await open();
  await choose(page, path);
  const ladder = page.getByRole("img", { name: /^Voice heard from/ });
  expect(await ladder.getAttribute("aria-label")).toContain(heard);
  await page.getByTestId("sing-keep").click();
  await page.waitForURL("**/voice");
  await page.getByTestId("take-row").waitFor();
  expect(errors).toEqual([]);
  await context.close();
});

describe("what cannot be used is refused with the reason", () => {
  const files: [string, string, () => string, RegExp][] = [
    [
      "a text that is named wav",
      "not-a-sound",
      () => {
        writeFileSync(at("words.wav"), "Salt on the window, rain in the lane,\n".repeat(40));
        return at("words.wav");
      },
      /whatever its name says/,
    ],
    [
      "a broken mp3",
      "unreadable-file",
      () => {
        const noise = Buffer.from(Array.from({ length: 4000 }, (_, k) => (k * 7919) % 251));
        writeFileSync(at("broken.mp3"), Buffer.concat([readFileSync(encoded("mp3")).subarray(0, 8), noise]));
        return at("broken.mp3");
      },
      /begins like an mp3 file/,
    ],
    [
      "more than 20 MB",
      "too-large",
      () => {
        writeFileSync(at("large.wav"), readFileSync(voice.wav));
        truncateSync(at("large.wav"), 20 * 1024 * 1024 + 1);
        return at("large.wav");
      },
      /up to 20 MB/,
    ],
    [
      "more than 10 minutes",
      "too-long",
      () => {
        const path = at("long.mp3");
        const tone = [
          "-f",
          "lavfi",
          "-i",
          "sine=220:duration=605",
          "-ac",
          "1",
          "-b:a",
          "32k",
          "-compression_level",
          "9",
        ];
        execFileSync("ffmpeg", ["-v", "error", "-y", ...tone, path]);
        return path;
      },
      /up to 10 minutes/,
    ],
    [
      "nothing",
      "empty-file",
      () => {
        writeFileSync(at("empty.wav"), "");
        return at("empty.wav");
      },
      /no sound in it/,
    ],
  ];

  // One page for all: the way on from each refusal leads to the next file.
  let profile: Profile | null = null;
  afterAll(() => profile?.context.close());

  test.each(files)("%s: %s", async (_what, kind, make, words) => {
    const path = make();
    profile ??= await open();
    const { page } = profile;
    await choose(page, path);
    expect(await page.getByTestId(`take-failure-${kind}`).textContent()).toMatch(words);
    // The way on leads to another file.
    await page.getByTestId("sing-again").click();
    await page.getByTestId("upload-choose").waitFor();
  });

  test.each(["wav", "mp3"])("a shout that the microphone cut off is told as such in a %s too", async (kind) => {
    const shout = join(microphones.folder, "shout.wav");
    const said = speech("The ferry leaves the quay at half past nine, and the lanterns are lit before it comes back.");
    if (!said) throw new Error("espeak-ng is missing: apt-get install espeak-ng");
    writeWav(
      shout,
      said.pcm.map((x) => Math.max(-1, Math.min(1, 20 * x))),
      said.sampleRate,
    );
    // Another rate and another code round the flat tops off.
    const path = at(`shout-48.${kind}`);
    execFileSync("ffmpeg", ["-v", "error", "-y", "-i", shout, "-ar", "48000", path]);
    const { context, page } = await open();
    await choose(page, path);
    await page.getByTestId("take-failure-clipped").waitFor();
    await context.close();
  });

  test("a recording without singing gets the same refusal as a take", async () => {
    const path = microphones.silence();
    const { context, page } = await open();
    await choose(page, path);
    await page.getByTestId("take-failure-too-quiet").waitFor();
    await context.close();
  });
});

test("a long recording says what is being done, and can be given up", async () => {
  const path = at("ten-minutes.mp3");
  const many = [
    "-stream_loop",
    "70",
    "-i",
    voice.wav,
    "-t",
    "590",
    "-ac",
    "1",
    "-b:a",
    "64k",
    "-compression_level",
    "9",
  ];
  execFileSync("ffmpeg", ["-v", "error", "-y", ...many, path]);
  const { context, page } = await open("wide");
  await choose(page, path);
  // The three steps, and how far the last one is.
  await page.getByText("Reading the file: done").waitFor();
  await page.getByText("Turning it into sound: done").waitFor({ timeout: 60_000 });
  await page.getByText(/^Listening: (\d+ min )?\d+ s of 9 min \d+ s$/).waitFor();
  const share = () => page.getByRole("progressbar").getAttribute("aria-valuenow").then(Number);
  const first = await share();
  await page.waitForFunction(
    (before) => Number(document.querySelector('[role="progressbar"]')?.getAttribute("aria-valuenow")) > before,
    first,
  );
  await page.getByTestId("upload-cancel").click();
  await page.getByTestId("upload-choose").waitFor();
  // The worker that was busy is gone: another recording is read at once.
  await choose(page, voice.wav);
  await page.getByTestId("comfort-notes").waitFor();
  await context.close();
}, 120_000);
