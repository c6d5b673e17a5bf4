import type { TakeReport } from "@/shared/voice/takeReport";
import { createTakeListener } from "./takeListener";
import type { FromTakeWorker, TakeSound, ToTakeWorker } from "../takeProtocol";

const rate = 1000;
const report = { verdict: "heard" } as TakeReport;

function setUp({ frameEvery = 1, ...faults }: { push?: boolean; judge?: boolean; frameEvery?: number } = {}) {
  let pushed = 0;
  const posted: FromTakeWorker[] = [];
  const parts: { id: string; index: number; length: number }[] = [];
  const judgedLengths: number[] = [];
  const tell = createTakeListener({
    createTracker: () => ({
      push(pcm) {
        if (faults.push) throw new RangeError("bad block");
        pushed += 1;
        return pushed % frameEvery > 0 ? [] : [{ t: 0, hz: 220, clarity: 1, levelDb: pcm.length }];
      },
      measured: () => null,
      ahead: () => [{ t: 0.01, hz: 222, clarity: 1, levelDb: -20 }],
    }),
    judge(pcm) {
      if (faults.judge) throw new RangeError("bad take");
      judgedLengths.push(pcm.length);
      return report;
    },
    keepPart: (id, index, pcm) => parts.push({ id, index, length: pcm.length }),
    warmUp: () => undefined,
    post: (message) => posted.push(message),
  });
  const begin = (): ((sound: TakeSound) => void) => {
    const port = { close: jest.fn(), onmessage: null as ((event: { data: TakeSound }) => void) | null };
    tell({
      kind: "begin",
      sampleRate: rate,
      sound: port as unknown as MessagePort,
      keepAs: "take-1",
    } satisfies ToTakeWorker);
    return (data) => port.onmessage?.({ data });
  };
  return { tell, begin, posted, parts, judgedLengths };
}

const block = (length: number, value = 0.5): TakeSound => ({
  kind: "block",
  pcm: new Float32Array(length).fill(value),
});

it("answers every block with its frames, the time so far and the loudness", () => {
  const { begin, posted } = setUp();
  const play = begin();
  play(block(100));
  play(block(100, 1));
  expect(posted).toHaveLength(2);
  expect(posted[0]).toMatchObject({ kind: "heard", seconds: 0.1, peak: 0.5, ahead: [{ hz: 222 }] });
  expect(posted[1]).toMatchObject({ kind: "heard", seconds: 0.2, peak: 1 });
  // AES17: a full-scale square wave is 3.01 dB above a full-scale sine.
  expect((posted[1] as { levelDb: number }).levelDb).toBeCloseTo(3.01, 2);
});

it("tells a new frame at once, and gathers blocks that bring none", () => {
  const { begin, posted } = setUp({ frameEvery: 3 });
  const play = begin();
  play(block(5, 0.9));
  play(block(5, 0.1));
  expect(posted).toHaveLength(0);
  play(block(5, 0.1));
  expect(posted).toHaveLength(1);
  expect(posted[0]).toMatchObject({ kind: "heard", seconds: 0.015, frames: [{ hz: 220 }] });
  expect((posted[0] as { peak: number }).peak).toBeCloseTo(0.9, 6);
  play(block(20));
  expect(posted.at(-1)).toMatchObject({ seconds: 0.035, frames: [] });
});

it("waits for the blocks that are still on their way before it judges", () => {
  const { begin, tell, posted, judgedLengths } = setUp();
  const play = begin();
  play(block(100));
  tell({ kind: "judge", endIsComing: true });
  expect(judgedLengths).toEqual([]);
  play(block(40));
  play({ kind: "end" });
  expect(judgedLengths).toEqual([140]);
  expect(posted.at(-1)).toMatchObject({ kind: "judged", report, sampleRate: rate });
});

it("judges at once what there is where the sound broke off without an end", () => {
  const { begin, tell, judgedLengths } = setUp();
  begin()(block(100));
  tell({ kind: "judge", endIsComing: false });
  expect(judgedLengths).toEqual([100]);
});

it("stores each whole second on the device as it is sung", () => {
  const { begin, parts } = setUp();
  const play = begin();
  for (let k = 0; k < 5; k += 1) play(block(500));
  expect(parts).toEqual([
    { id: "take-1", index: 0, length: 1000 },
    { id: "take-1", index: 1, length: 1000 },
  ]);
});

it("takes no more than 20 s", () => {
  const { begin, tell, judgedLengths } = setUp();
  const play = begin();
  for (let k = 0; k < 25; k += 1) play(block(1000));
  tell({ kind: "judge", endIsComing: false });
  expect(judgedLengths).toEqual([20_000]);
});

it("judges sound that was kept before a reload, and forgets a dropped take", () => {
  const { begin, tell, judgedLengths } = setUp();
  const play = begin();
  tell({ kind: "drop" });
  play(block(100));
  tell({ kind: "judge", endIsComing: false });
  expect(judgedLengths).toEqual([]);
  tell({ kind: "judgeKept", sampleRate: rate, pcm: new Float32Array(3000), part: null });
  expect(judgedLengths).toEqual([3000]);
});

it.each([{ push: true }, { judge: true }])("says so when the engine fails: %o", (faults) => {
  const { begin, tell, posted } = setUp(faults);
  begin()(block(100));
  tell({ kind: "judge", endIsComing: false });
  expect(posted.some(({ kind }) => kind === "broken")).toBe(true);
});
