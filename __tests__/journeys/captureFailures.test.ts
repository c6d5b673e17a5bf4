import type { Page } from "playwright-core";
import * as sounds from "../sound/noSinging";
import { singPhrase } from "../sound/singer";
import { makeMicrophones } from "./microphone";
import { setStage } from "./stage";
import { enoughS, singFor } from "./singing";

const rate = 44_100;
const microphones = makeMicrophones();
const stage = setStage("kept");
afterAll(microphones.remove);

async function open(wav: string) {
  return stage.open({ wav }, "phone");
}

/** Somebody reading aloud, brought to the microphones' rate; many times too loud where told so. */
function speaking(gain = 1): Float32Array {
  const said = sounds.speech(
    "The ferry leaves the quay at half past nine, and the lanterns are lit before it comes back. Bring your coat.",
  );
  if (!said) throw new Error("espeak-ng is missing: apt-get install espeak-ng");
  const pcm = new Float32Array(Math.floor((said.pcm.length * rate) / said.sampleRate));
  for (let k = 0; k < pcm.length; k += 1) {
    const at = (k * said.sampleRate) / rate;
    const before = said.pcm[Math.floor(at)] ?? 0;
    const after = said.pcm[Math.floor(at) + 1] ?? 0;
    pcm[k] = Math.max(-1, Math.min(1, gain * (before + (after - before) * (at % 1))));
  }
  return pcm;
}

/** A soft voice in a room with a roaring fan. */
function drowned(): Float32Array {
  const { pcm } = singPhrase({
    notes: [0, 4, 7, 9, 12].map((step) => ({ midi: 57 + step, durationS: 0.8 })),
    seed: 7,
    sampleRate: rate,
    padS: 1,
    tract: 1.1,
  });
  return sounds.fanNoise(1, rate, 10).map((x, k) => 6 * x + 0.1 * (pcm[k] ?? 0));
}

test.each([
  ["speech", "not-singing", () => speaking(), true],
  ["a shout that the microphone cuts off", "clipped", () => speaking(100), true],
  ["a strummed instrument", "not-singing", () => sounds.strummedStrings(1, rate, 8), true],
  ["a voice that the room drowns", "too-noisy", drowned, false],
] as const)("%s is refused as %s, with the reason and the ways on", async (name, verdict, make, padded) => {
  const { page, errors, context } = await open(microphones.sound(name.replaceAll(" ", "-"), make(), rate, padded));
  await page.goto("/voice/sing");
  await singFor(page, 6);
  const failure = page.getByTestId(`take-failure-${verdict}`);
  await failure.waitFor();
  expect((await failure.textContent())?.length).toBeGreaterThan(60);
  await page.getByTestId("sing-again").waitFor();
  await page.getByTestId("sing-by-hand").waitFor();
  await page.getByTestId("sing-upload").click();
  await page.getByTestId("upload-choose").waitFor();
  expect(errors).toEqual([]);
  await context.close();
});

/**
 * Takes the sound away as a browser does, at the very moment when the page has counted so many seconds: what the page is
 * told is the same, only the cause is the test.
 */
async function interruptAt(page: Page, seconds: number, how: Interruption): Promise<void> {
  await page.evaluate(
    ([at, cause]) => {
      const interrupt = () => {
        if (cause === "hidden") {
          Object.defineProperty(document, "hidden", { configurable: true, get: () => true });
          document.dispatchEvent(new Event("visibilitychange"));
          return;
        }
        const { heldTrack: track, heldContext: context } = window as unknown as {
          heldTrack: MediaStreamTrack;
          heldContext: AudioContext;
        };
        if (cause === "call") void context.suspend();
        else if (cause === "muted") track.dispatchEvent(new Event("mute"));
        else {
          track.stop();
          track.dispatchEvent(new Event("ended"));
        }
      };
      const watch = new MutationObserver(() => {
        const shown = document.querySelector('[data-testid="take-seconds"]')?.textContent ?? "0";
        if (Number.parseInt(shown, 10) < at) return;
        watch.disconnect();
        interrupt();
      });
      watch.observe(document, { subtree: true, childList: true, characterData: true });
    },
    [seconds, how] as const,
  );
}

type Interruption = "hidden" | "ended" | "muted" | "call";

async function holdTrack(page: Page): Promise<void> {
  await page.addInitScript(() => {
    const ask = navigator.mediaDevices.getUserMedia.bind(navigator.mediaDevices);
    navigator.mediaDevices.getUserMedia = async (wishes) => {
      const stream = await ask(wishes);
      Object.assign(window, { heldTrack: stream.getAudioTracks()[0] });
      return stream;
    };
    const connect = AudioContext.prototype.createMediaStreamSource;
    AudioContext.prototype.createMediaStreamSource = function (stream) {
      Object.assign(window, { heldContext: this });
      return connect.call(this, stream);
    };
  });
}

describe.each([
  ["hidden", "This page went into the background"],
  ["ended", "The microphone was unplugged or switched off"],
  ["muted", "The microphone was muted"],
  ["call", "A call or another program took the microphone"],
] as const)("a take that is interrupted (%s)", (how, words) => {
  test("keeps what was sung until then", async () => {
    const { page, context } = await open(microphones.voice(55).wav);
    await holdTrack(page);
    await page.goto("/voice/sing");
    await interruptAt(page, enoughS, how);
    await page.getByTestId("sing-start").click();
    expect(await page.getByTestId("take-broken-off").textContent()).toContain(words);
    await page.getByTestId("comfort-notes").waitFor();
    await page.getByTestId("sing-keep").click();
    await page.waitForURL("**/voice");
    await context.close();
  });
});

test("a take that is interrupted where too little was sung is called so", async () => {
  const { page, context } = await open(microphones.voice(55).wav);
  await holdTrack(page);
  await page.goto("/voice/sing");
  await interruptAt(page, 1, "hidden");
  await page.getByTestId("sing-start").click();
  expect(await page.getByTestId("take-failure-interrupted").textContent()).toContain(
    "This page went into the background",
  );
  await context.close();
});

test("sound processing that the browser keeps on is said so, with what it means", async () => {
  const { page, context } = await open(microphones.voice(55).wav);
  await page.addInitScript(() => {
    const told = MediaStreamTrack.prototype.getSettings;
    MediaStreamTrack.prototype.getSettings = function () {
      return { ...told.call(this), noiseSuppression: true };
    };
  });
  await page.goto("/voice/sing");
  await singFor(page, enoughS);
  const said = await page.getByTestId("take-processed").textContent();
  expect(said).toContain("kept noise suppression on");
  expect(said).toContain("soft notes");
  await context.close();
});
