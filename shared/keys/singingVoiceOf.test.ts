import type { KeptTake } from "../voice/shownTake";
import { type KeptVoice, keyVoiceOf, singingVoiceOf } from "./singingVoiceOf";

const voice: KeptVoice = { id: "v1", byHand: null };
const take = (id: string, change: Partial<KeptTake> = {}): KeptTake => ({
  id,
  voiceId: "v1",
  kind: "phrase",
  shows: "both",
  sungAt: "2026-11-05T19:20:00.000Z",
  effort: null,
  range: { lowMidi: 53, highMidi: 72 },
  comfort: { lowMidi: 55, highMidi: 69 },
  estimate: { lowMidi: 51, highMidi: 74 },
  tuningCents: 0,
  certainty: 0.7,
  ...change,
});

it("knows nothing of a voice without takes", () => {
  expect(singingVoiceOf(voice, [])).toBeNull();
  expect(singingVoiceOf(voice, [take("t1", { voiceId: "another" })])).toBeNull();
});

it("says what the takes of this voice say, and only of this one", () => {
  const other = take("t2", { voiceId: "another", range: { lowMidi: 40, highMidi: 80 } });
  expect(singingVoiceOf(voice, [take("t1"), other])).toEqual({
    range: { lowMidi: 53, highMidi: 72 },
    comfort: { lowMidi: 55, highMidi: 69 },
  });
});

it("is again what it was when a take is erased", () => {
  const before = singingVoiceOf(voice, [take("t1")]);
  const wider = singingVoiceOf(voice, [take("t1"), take("t2", { range: { lowMidi: 50, highMidi: 74 } })]);
  expect(wider?.range.highMidi).toBeGreaterThan(72);
  expect(singingVoiceOf(voice, [take("t1")])).toEqual(before);
});

it("takes the singer's own tuning off, so that notes keep the names they had on the result", () => {
  const flat = take("t1", {
    tuningCents: -40,
    range: { lowMidi: 52.6, highMidi: 71.6 },
    comfort: { lowMidi: 54.6, highMidi: 68.6 },
  });
  const singing = singingVoiceOf(voice, [flat]);
  expect(singing?.range.lowMidi).toBeCloseTo(53, 10);
  expect(singing?.comfort.highMidi).toBeCloseTo(69, 10);
});

it("prefers notes set by hand, with comfort inside the range", () => {
  const byHand = { range: { lowMidi: 50, highMidi: 70 }, comfort: { lowMidi: 48, highMidi: 66 } };
  expect(singingVoiceOf({ ...voice, byHand }, [take("t1")])).toEqual({
    range: byHand.range,
    comfort: { lowMidi: 50, highMidi: 66 },
  });
});

describe("the voice that keys are judged by", () => {
  const phrase = take("t1", { range: { lowMidi: 55, highMidi: 69 }, estimate: { lowMidi: 53, highMidi: 71 } });

  it("reaches as far as a phrase makes probable, and keeps what was heard apart", () => {
    expect(keyVoiceOf(voice, [phrase])).toEqual({
      range: { lowMidi: 53, highMidi: 71 },
      comfort: phrase.comfort,
      heard: { lowMidi: 55, highMidi: 69 },
    });
  });

  it("ends where a guided hold has shown the end", () => {
    const hold = take("t2", { kind: "hold", shows: "high", range: { lowMidi: 60, highMidi: 70 }, certainty: 0.9 });
    const known = keyVoiceOf(voice, [phrase, hold]);
    expect(known?.range.highMidi).toBe(70);
    expect(known?.range.lowMidi).toBeLessThan(55);
    const both = take("t3", { kind: "hold", range: { lowMidi: 54, highMidi: 70 }, certainty: 0.9 });
    expect(keyVoiceOf(voice, [both])).toEqual(singingVoiceOf(voice, [both]));
  });

  it("is what was set by hand, nothing estimated", () => {
    const byHand = { range: { lowMidi: 50, highMidi: 70 }, comfort: { lowMidi: 52, highMidi: 66 } };
    expect(keyVoiceOf({ ...voice, byHand }, [phrase])).toEqual(byHand);
    expect(keyVoiceOf(voice, [])).toBeNull();
  });
});
