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

/** Two seconds of a rising tone, tracked and judged: the browser compiles what it has seen at work. */
function warmUp(): void {
  const rate = 48_000;
  const tone = Float32Array.from(
    { length: 2 * rate },
    (_, k) => 0.3 * Math.sin((2 * Math.PI * 180 * k * (1 + k / rate)) / rate),
  );
  const tracker = createTracker(rate);
  for (let from = 0; from < tone.length; from += rate / 4) {
    tracker.push(tone.subarray(from, from + rate / 4));
    tracker.ahead();
  }
  listenToTake(tone, rate);
}

scope.onmessage = ({ data }) => tell(data);
