import { listenToTake } from "@/shared/voice/listenToTake";
import { createLiveTracker, type LiveTracker } from "@/shared/voice/liveTracker";
import { createNoteGlimpse } from "@/shared/voice/noteGlimpse";
import { createTakeListener } from "./takeListener";
import type { FromTakeWorker, ToTakeWorker } from "../takeProtocol";
import { appendUnkept } from "../unkeptTake";

interface WorkerScope {
  onmessage: ((event: MessageEvent<ToTakeWorker>) => void) | null;
  postMessage(message: FromTakeWorker, transfer: Transferable[]): void;
}
const scope = globalThis as unknown as WorkerScope;

const tell = createTakeListener({
  createTracker,
  judge: (pcm, sampleRate, measured, onProgress) => listenToTake(pcm, sampleRate, { measured, onProgress }),
  // Full or forbidden storage only costs the safety against a reload, never the take.
  keepPart: (id, index, pcm) => void appendUnkept(id, index, pcm).catch(() => undefined),
  warmUp: () => warmUp(),
  post: (message, transfer = []) => scope.postMessage(message, transfer),
});

/** The tracker, with a quick look ahead of it for the eyes; what is measured and judged is the tracker's alone. */
function createTracker(sampleRate: number): LiveTracker {
  const tracker = createLiveTracker(sampleRate, { remember: true });
  const glimpse = createNoteGlimpse(sampleRate);
  return {
    push(pcm) {
      glimpse.push(pcm);
      return tracker.push(pcm);
    },
    ahead: () => glimpse.beyond(tracker.ahead()),
    measured: () => tracker.measured(),
  };
}

/**
 * Two seconds of something like singing, tracked once and judged several times: the browser compiles what it has seen at
 * work, and what it has seen often it compiles well. The first take is then judged nearly as fast as the second.
 */
function warmUp(): void {
  const rate = 48_000;
  const sung = Float32Array.from({ length: 2 * rate }, (_, k) => likeSinging(k / rate));
  const tracker = createTracker(rate);
  for (let from = 0; from < sung.length; from += rate / 4) {
    tracker.push(sung.subarray(from, from + rate / 4));
    tracker.ahead();
  }
  const measured = tracker.measured();
  for (let round = 0; round < 4; round++) listenToTake(sung, rate, { measured });
  listenToTake(sung.subarray(0, rate / 2), rate);
}

/** Notes of 0.4 s a whole tone and more apart, each of eight harmonics, with rests between, over a little noise. */
function likeSinging(t: number): number {
  const hz = 180 * (1 + 0.1 * Math.floor(2 * t));
  let voice = 0;
  for (let h = 1; h <= 8; h++) voice += Math.sin(2 * Math.PI * hz * h * t) / h;
  return (t % 0.5 < 0.4 ? 0.1 * voice : 0) + 0.002 * Math.sin(12_989.8 * t) * Math.sin(78_233 * t);
}

scope.onmessage = ({ data }) => tell(data);
