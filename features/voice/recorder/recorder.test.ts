import type { TakeReport } from "@/shared/voice/takeReport";
import { idle, recorder, type RecorderEvent, type RecorderState } from "./recorder";

const sung = { id: "take-1", sungAt: "2026-11-05T19:20:00.000Z", processed: [] };
const pcm = new Float32Array(8);
const heard = {
  verdict: "heard",
  sentence: "You sang from F3 to C5.",
  nextStep: "Try it in a song.",
  range: { lowMidi: 53, highMidi: 72 },
  comfort: { lowMidi: 55, highMidi: 69 },
  estimate: { lowMidi: 51, highMidi: 74 },
} as TakeReport;
const silent = {
  ...heard,
  verdict: "too-quiet",
  sentence: "Hardly any sound.",
  nextStep: "Move closer.",
  range: null,
} as TakeReport;

const after = (events: RecorderEvent[], from: RecorderState = idle) => events.reduce(recorder, from);
const listening: RecorderEvent[] = [{ kind: "ask" }, { kind: "opened", ...sung }, { kind: "heard", seconds: 4.2 }];
const judged = (report: TakeReport): RecorderEvent => ({ kind: "judged", report, pcm, sampleRate: 48_000, part: null });

it("goes from the press to the result", () => {
  expect(after(listening.slice(0, 1)).step).toBe("asking");
  expect(after(listening)).toMatchObject({ step: "listening", seconds: 4.2, id: "take-1" });
  expect(after([...listening, { kind: "stop" }])).toMatchObject({ step: "stopping", stoppedBy: "singer" });
  const result = after([...listening, { kind: "stop" }, { kind: "flushed" }, judged(heard)]);
  expect(result).toMatchObject({
    step: "result",
    take: { id: "take-1", stoppedBy: "singer", warmedUp: null, effort: null },
  });
});

it("stops by itself at 20 s", () => {
  expect(after([...listening, { kind: "heard", seconds: 19.98 }]).step).toBe("listening");
  expect(after([...listening, { kind: "heard", seconds: 20.01 }])).toMatchObject({
    step: "stopping",
    stoppedBy: "full",
    seconds: 20,
  });
});

it.each(["refused", "no-microphone", "insecure", "busy", "unsupported"] as const)(
  "says that there is no microphone: %s",
  (why) => {
    expect(after([{ kind: "ask" }, { kind: "unavailable", why }])).toEqual({
      step: "failure",
      failure: { kind: why, report: null, seconds: 0, stoppedBy: null },
    });
  },
);

it("keeps what was sung before an interruption", () => {
  const events: RecorderEvent[] = [...listening, { kind: "interrupted", cause: "taken" }, { kind: "flushed" }];
  expect(after([...events, judged(heard)])).toMatchObject({ step: "result", take: { stoppedBy: "taken" } });
});

it("calls a take interrupted, not too quiet, where the interruption left too little of it", () => {
  const events: RecorderEvent[] = [...listening, { kind: "interrupted", cause: "unplugged" }, { kind: "flushed" }];
  expect(after([...events, judged(silent)])).toMatchObject({
    step: "failure",
    failure: { kind: "interrupted", stoppedBy: "unplugged", seconds: 4.2 },
  });
});

it("passes on the engine's verdict and words where nothing was heard", () => {
  expect(after([...listening, { kind: "stop" }, { kind: "flushed" }, judged(silent)])).toMatchObject({
    step: "failure",
    failure: { kind: "too-quiet", report: { sentence: "Hardly any sound.", nextStep: "Move closer." } },
  });
});

it("judges what a reload cut off, or shows what was already judged", () => {
  const rejudged = after([{ kind: "rejudging", id: "take-1", sungAt: sung.sungAt, seconds: 7 }, judged(heard)]);
  expect(rejudged).toMatchObject({ step: "result", take: { id: "take-1", stoppedBy: "reloaded" } });
  if (rejudged.step !== "result") throw new Error("no result");
  expect(after([{ kind: "restored", take: rejudged.take }])).toEqual(rejudged);
});

it("reads a recording instead, or says why not", () => {
  const reading = after([{ kind: "read", name: "evening.mp3" }]);
  expect(reading).toEqual({ step: "reading", name: "evening.mp3", share: 0 });
  expect(after([{ kind: "bytes", share: 0.5 }], reading)).toMatchObject({ share: 0.5 });
  expect(after([{ kind: "bytes", share: null }], reading)).toMatchObject({ share: null });
  const decoded: RecorderEvent = { kind: "decoded", id: "take-2", sungAt: sung.sungAt, seconds: 31 };
  expect(after([decoded, { kind: "listened", share: 0.25 }], reading)).toMatchObject({
    step: "judging",
    listened: 0.25,
  });
  expect(after([decoded, judged(heard)], reading)).toMatchObject({
    step: "result",
    take: { id: "take-2", stoppedBy: "file", processed: [] },
  });
  expect(after([decoded, judged(silent)], reading)).toMatchObject({
    failure: { kind: "too-quiet", stoppedBy: "file" },
  });
  expect(after([{ kind: "unusable", why: "too-long", file: "mp3" }], reading)).toMatchObject({
    step: "failure",
    failure: { kind: "too-long", stoppedBy: "file", file: "mp3" },
  });
  expect(after([{ kind: "leave" }, decoded], reading)).toEqual(idle);
});

it("judges a part, keeps the whole beside it, and ignores an answer that nobody waits for", () => {
  const result = after([...listening, { kind: "stop" }, { kind: "flushed" }, judged(heard)]);
  const answer: RecorderEvent = {
    kind: "judged",
    report: { ...heard, sentence: "A part." },
    pcm,
    sampleRate: 48_000,
    part: { startS: 1, endS: 4 },
  };
  expect(recorder(result, answer)).toBe(result);
  const part = after([{ kind: "judgePart" }, answer], result);
  expect(part).toMatchObject({ take: { report: { sentence: "A part." }, part: { startS: 1, whole: heard } } });
  const other = after([{ kind: "judgePart" }, { ...answer, part: { startS: 2, endS: 4 } }], part);
  expect(other).toMatchObject({ take: { part: { startS: 2, whole: heard } } });
  expect(after([{ kind: "judgeWhole" }], other)).toEqual(result);
});

it("counts in before it listens, and gives up on a stop", () => {
  const counting = after([{ kind: "ask" }, { kind: "beat", left: 4 }, { kind: "beat", left: 3 }]);
  expect(counting).toEqual({ step: "counting", left: 3 });
  expect(after([{ kind: "opened", ...sung }], counting).step).toBe("listening");
  expect(after([{ kind: "stop" }], counting)).toEqual(idle);
  expect(after([{ kind: "interrupted", cause: "taken" }], counting)).toMatchObject({
    failure: { kind: "interrupted" },
  });
});

it("remembers how it felt", () => {
  const result = after([
    ...listening,
    { kind: "stop" },
    { kind: "flushed" },
    judged(heard),
    { kind: "felt", warmedUp: true, effort: 2 },
  ]);
  expect(result).toMatchObject({ take: { warmedUp: true, effort: 2 } });
});

it("ignores what comes too late: a second stop, a late block, an answer after leaving", () => {
  const stopping = after([...listening, { kind: "stop" }]);
  expect(recorder(stopping, { kind: "stop" })).toBe(stopping);
  expect(recorder(stopping, { kind: "heard", seconds: 9 })).toBe(stopping);
  expect(recorder(stopping, { kind: "interrupted", cause: "hidden" })).toBe(stopping);
  expect(after([{ kind: "leave" }, judged(heard)], stopping)).toEqual(idle);
});

it.each([
  ["asking", [{ kind: "ask" }]],
  ["listening", listening],
  ["stopping", [...listening, { kind: "stop" }]],
  ["judging", [...listening, { kind: "stop" }, { kind: "flushed" }]],
] as [string, RecorderEvent[]][])("a fault while %s is a failure that can be tried again", (_step, events) => {
  const broken = after([...events, { kind: "broken" }]);
  expect(broken).toMatchObject({ step: "failure", failure: { kind: "broken" } });
  expect(recorder(broken, { kind: "ask" }).step).toBe("asking");
});
