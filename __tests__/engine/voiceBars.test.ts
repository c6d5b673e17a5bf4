import { listenToTake } from "@/shared/voice/listenToTake";
import { BARS, measureBar, type TaggedScore } from "../bench/bars";
import { resultOf } from "../bench/scoring";
import { corpus } from "../sound/corpus";

/**
 * The range engine's bars on a fixed part of the "held-out" half: every fifth recording of singing, all with a guitar
 * underneath, and the sounds without singing. They guard what is reached; failures of this half have been mended, so that
 * they do not judge. `npm run bench:voice -- --seed N` measures the whole on recordings nobody has seen, beside other tools.
 */
const scores = corpus("held-out")
  .filter(({ tags }, k) => k % 5 === 0 || tags.includes("bleed") || tags.includes("nonvoice"))
  .flatMap(({ name, tags, make }): (TaggedScore & { name: string })[] => {
    const sound = make();
    if (sound === null) return [];
    return [{ name, tags, truth: sound.truth, result: resultOf(listenToTake(sound.pcm, sound.sampleRate)) }];
  });

test("the part holds every condition that has a bar of its own", () => {
  for (const { tag } of BARS) if (tag !== null) expect(scores.flatMap(({ tags }) => tags)).toContain(tag);
  expect(scores.length).toBeGreaterThan(35);
});

test.each(BARS)("$name", (bar) => {
  const measured = measureBar(bar, scores);
  expect(measured).toEqual({ value: measured.value, met: true });
});

test.each(scores.filter(({ tags }) => tags.includes("nonvoice")))(
  "$name is not taken for singing",
  ({ truth, result }) => {
    expect(truth.expected.accept).toContain(result.verdict);
    expect(result.range).toBeNull();
  },
);
