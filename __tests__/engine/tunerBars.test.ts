import { createStringReader } from "../../shared/voice/pluckedString";
import { benchStrings, conditions, readPluck, stiffness } from "../bench/tunerCases";
import { missesOf, tunerBars } from "../bench/tunerScores";
import { pluckStrings } from "../sound/plucked";
import { createRandom } from "../sound/random";

describe.each(tunerBars)("$name", (bar) => {
  const condition = conditions.find(({ name }) => name === bar.condition)!;

  test("every string is read to a cent, and within 0.3 s of its pluck", () => {
    // Each string with one of the four stiffnesses; `npm run bench:tuner` plucks them all.
    const readings = benchStrings.map((string, s) =>
      readPluck(string, stiffness[(s + bar.name.length) % 4]!, condition, 500 + 13 * s),
    );
    expect(missesOf(bar, readings)).toEqual([]);
  });
});

const sampleRate = 16_000;

test("hum, noise and a quiet room are no strings", () => {
  for (const around of [{ humDb: -6 }, { noiseDb: -6 }, {}]) {
    const pcm = pluckStrings([], { sampleRate, durationS: 3, seed: 3, ...around });
    expect(createStringReader(sampleRate).push(pcm)).toEqual([]);
  }
});

test("talk-like bursts of noise are no strings", () => {
  const random = createRandom(5);
  const pcm = Float32Array.from({ length: 3 * sampleRate }, (_, i) =>
    Math.floor(i / 3200) % 2 ? 0.2 * (random.next() - 0.5) : 0.001 * random.next(),
  );
  expect(createStringReader(sampleRate).push(pcm)).toEqual([]);
});

test("a string that is turned while it rings is followed", () => {
  const pcm = new Float32Array(3 * sampleRate);
  let phase = 0;
  for (let i = sampleRate; i < pcm.length; i++) {
    const t = (i - sampleRate) / sampleRate;
    phase += (2 * Math.PI * 196 * 2 ** ((20 * Math.min(1, t)) / 1200)) / sampleRate;
    pcm[i] = Math.exp(-t) * (0.2 * Math.sin(phase) + 0.1 * Math.sin(2 * phase) + 0.06 * Math.sin(3 * phase));
  }
  const last = createStringReader(sampleRate).push(pcm).at(-1)!;
  expect(Math.abs(1200 * Math.log2(last.hz / 196) - 20)).toBeLessThan(1);
});

test("the pieces in which the sound comes change nothing", () => {
  const pcm = pluckStrings([{ hz: 110, startS: 0.4, lengthS: 1 }], {
    sampleRate,
    durationS: 1.4,
    seed: 9,
    noiseDb: -30,
  });
  const whole = createStringReader(sampleRate).push(pcm);
  const reader = createStringReader(sampleRate);
  const pieces = [];
  for (let from = 0; from < pcm.length; from += 777) pieces.push(...reader.push(pcm.subarray(from, from + 777)));
  expect(whole.length).toBeGreaterThan(20);
  const rounded = (readings: typeof whole) => readings.map(({ t, hz }) => [t, Math.round(hz * 1000)]);
  expect(rounded(pieces)).toEqual(rounded(whole));
});
