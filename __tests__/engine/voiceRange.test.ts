import { listenToTake } from "@/shared/voice/listenToTake";
import { renderChoir } from "../sound/choir";
import { strummedStrings } from "../sound/noSinging";
import { singPhrase, type PhraseOptions, type PhraseTruth } from "../sound/singer";
import { phraseFor, singers, type SingerName } from "./voiceSingers";

const conditions: Record<string, Partial<PhraseOptions>> = {
  clean: {},
  vibrato: { vibrato: { rateHz: 5.8, extentCents: 70 } },
  "laptop microphone": { thinMicHz: 320, noiseSnrDb: 28 },
  hum: { hum: { hz: 50, levelDb: -14 }, noiseSnrDb: 30 },
  "noise at 20 dB": { noiseSnrDb: 20 },
  "noise at 10 dB": { noiseSnrDb: 10 },
  fan: { noiseSnrDb: 14, noiseColour: "fan" },
  scoops: { scoopCents: 250 },
  "echo and everyday noise": {
    thinMicHz: 180,
    noiseSnrDb: 20,
    reverb: 0.25,
    vibrato: { rateHz: 5.5, extentCents: 35 },
  },
  clipped: { gainDb: 16 },
  "guitar at -20 dB": { underneath: { pcm: strummedStrings(3, 16000, 9), levelDb: -20 }, noiseSnrDb: 35 },
};

/** Frames well inside a note: within 50 cents, and off by whole octaves (or a twelfth down). */
function frameCounts(f0: readonly (number | null)[], truth: PhraseTruth) {
  const counts = { frames: 0, right: 0, octave: 0 };
  truth.f0.forEach((hz, k) => {
    if (hz === null || !truth.f0[k - 3] || !truth.f0[k + 3]) return;
    counts.frames++;
    const found = f0[k];
    if (!found) return;
    const cents = 1200 * Math.log2(found / hz);
    if (Math.abs(cents) <= 50) counts.right++;
    if ([1200, -1200, -1902, -2400].some((far) => Math.abs(cents - far) <= 50)) counts.octave++;
  });
  return counts;
}

const names = Object.keys(singers) as SingerName[];

describe.each(Object.entries(conditions))("%s", (_, condition) => {
  const heard = names.map((name, k) => {
    const { pcm, truth, sampleRate } = singPhrase({ ...phraseFor(name, k + 1), ...condition });
    return { name, truth, report: listenToTake(pcm, sampleRate) };
  });

  test.each(heard)("$name: both ends of the range within a semitone", ({ truth, report }) => {
    expect(report.verdict).toBe("heard");
    expect(Math.abs(report.range!.lowMidi - truth.lowestMidi)).toBeLessThanOrEqual(1);
    expect(Math.abs(report.range!.highMidi - truth.highestMidi)).toBeLessThanOrEqual(1);
  });

  test("pitch is right in at least 95 % of frames and an octave off in at most 0.5 %", () => {
    const counts = heard.map(({ report, truth }) => frameCounts(report.f0, truth));
    const sum = (key: "frames" | "right" | "octave") => counts.reduce((total, c) => total + c[key], 0);
    expect(sum("right") / sum("frames")).toBeGreaterThanOrEqual(0.95);
    expect(sum("octave") / sum("frames")).toBeLessThanOrEqual(0.005);
  });
});

describe("a sampled choir that owes nothing to our own synthesiser (Debian's fluidsynth with FluidR3)", () => {
  const steps = [0, 2, 4, 5, 7, 9, 7, 4, 0, 12, 7, 0];
  test.each([45, 55])("from MIDI %i up an octave", (base) => {
    const rendered = renderChoir(steps.map((step) => ({ midi: base + step, durationS: 0.5 })));
    if (rendered === null) {
      expect(rendered).toBeNull();
      return;
    }
    const { verdict, range } = listenToTake(rendered.pcm, rendered.sampleRate);
    expect(verdict).toBe("heard");
    expect(Math.abs(range!.lowMidi - base)).toBeLessThanOrEqual(1);
    expect(Math.abs(range!.highMidi - base - 12)).toBeLessThanOrEqual(1);
  });
});
