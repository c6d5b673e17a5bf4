import { midiToHz } from "../../shared/music/pitch";
import { pluckStrings } from "../sound/plucked";
import { makeMicrophones } from "./microphone";
import { setStage } from "./stage";

const sampleRate = 44_100;
const microphones = makeMicrophones();
const stage = setStage("kept");
afterAll(microphones.remove);

/** The A string of a box guitar let down to G: flat, the D string by mistake, then right; then the other two. */
const plucked = [
  { midi: 54.8, at: 0 },
  { midi: 61.99, at: 2 },
  { midi: 55.01, at: 4 },
  { midi: 59.99, at: 6.5 },
  { midi: 64.01, at: 9 },
].map(({ midi, at }) => ({ hz: midiToHz(midi), startS: at + 1, lengthS: 1.9, inharmonicity: 2e-4, decayS: 4 }));

test.each([["phone"], ["wide"]] as const)(
  "on the %s a flat string is told and corrected, a wrong one is named, and the walk goes on by itself",
  async (viewport) => {
    const pcm = pluckStrings(plucked, { sampleRate, durationS: 13, seed: 4, noiseDb: -36 });
    const wav = microphones.sound("strings", pcm, sampleRate);
    const { context, page, errors } = await stage.open({ wav }, viewport);
    await page.goto("/instruments/tune?instrument=box-adf&retune=-2");
    await page.getByRole("heading", { name: "Let the A3 string down to G3" }).waitFor();
    await page.getByTestId("tuner-listen").click();
    const reading = page.getByTestId("tuner-reading");
    await reading.getByText(/^(19|20|21) cents low$/).waitFor();
    await reading.getByText("Turn the peg up.").waitFor();
    await reading.getByText("That is the D4 string").waitFor();
    await page.getByTestId("tune-that").waitFor();
    await page.getByRole("heading", { name: "Let the D4 string down to C4" }).waitFor();
    await page.getByRole("button", { name: "A3 string, A3 to G3, in tune" }).waitFor();
    await page.getByRole("heading", { name: "Let the F♯4 string down to E4" }).waitFor();
    await page.getByRole("heading", { level: 1, name: "Last check" }).waitFor();
    expect(errors).toEqual([]);
    await context.close();
  },
  60_000,
);

test("without a microphone the strings are tuned by ear, and a retune that would snap them is refused", async () => {
  const { context, page } = await stage.open("refused", "phone");
  await page.goto("/instruments/tune?instrument=banjo&capo=2");
  await page.getByTestId("tuner-listen").click();
  await page.getByTestId("tuner-failure").getByText("The microphone is not allowed here").waitFor();
  await page.getByTestId("hear-tone").click();
  await page.getByText("Stop the tone").waitFor();
  for (let k = 0; k < 5; k += 1) await page.getByTestId("tuner-next").click();
  await page.getByText("give it its own stop at fret 7").waitFor();
  await page.getByTestId("clamped").click();
  await page.getByRole("heading", { name: "Capo on: check the D3 string at E3" }).waitFor();
  await page.goto("/instruments/tune?instrument=guitar&retune=4");
  await page.getByTestId("tuner-unsafe").waitFor();
  await context.close();
}, 60_000);
