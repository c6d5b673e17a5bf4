import type { TakeReport } from "@/shared/voice/takeReport";
import { createGuidedListener } from "./guidedListener";
import type { FromGuidedWorker } from "./guidedProtocol";

function open(judge = (pcm: Float32Array) => ({ durationS: pcm.length }) as unknown as TakeReport) {
  const told: FromGuidedWorker[] = [];
  const port = { onmessage: null as ((event: { data: unknown }) => void) | null, close: jest.fn() };
  const tell = createGuidedListener({
    createTracker: () => ({ push: () => [] }),
    judge,
    post: (m) => void told.push(m),
  });
  const begin = () => tell({ kind: "begin", sampleRate: 1000, sound: port as unknown as MessagePort });
  const block = (pcm: Float32Array) => port.onmessage?.({ data: { kind: "block", pcm } });
  return { told, port, tell, begin, block };
}

test("tells what it hears some thirty times a second and judges the sound of this try only", () => {
  const { told, port, tell, begin, block } = open();
  begin();
  for (let k = 0; k < 6; k += 1) block(new Float32Array(10).fill(0.5));
  expect(told).toHaveLength(2);
  expect(told[0]).toMatchObject({ kind: "heard", seconds: 0.03, peak: 0.5 });
  tell({ kind: "judge" });
  expect(told[2]).toMatchObject({ kind: "judged", report: { durationS: 60 } });
  begin();
  block(new Float32Array(30));
  tell({ kind: "judge" });
  expect(told.at(-1)).toMatchObject({ kind: "judged", report: { durationS: 30 } });
  expect(port.close).toHaveBeenCalledTimes(2);
});

test("sound after the end of a try is not listened to, and a try that goes on for ever is cut", () => {
  const { told, tell, begin, block } = open();
  begin();
  block(new Float32Array(20_000));
  tell({ kind: "judge" });
  expect(told.at(-1)).toMatchObject({ report: { durationS: 8000 } });
  const before = told.length;
  block(new Float32Array(100));
  tell({ kind: "judge" });
  expect(told).toHaveLength(before);
});

test("a fault of the engine is told, not swallowed", () => {
  const { told, tell, begin } = open(() => {
    throw new RangeError("odd rate");
  });
  begin();
  tell({ kind: "judge" });
  expect(told).toEqual([{ kind: "broken", reason: "RangeError: odd rate" }]);
});
