import { listenToTake } from "@/shared/voice/listenToTake";
import { createLiveTracker } from "@/shared/voice/liveTracker";
import { createTakeListener } from "./takeListener";
import type { FromTakeWorker, ToTakeWorker } from "./takeProtocol";
import { appendUnkept } from "./unkeptTake";

interface WorkerScope {
  onmessage: ((event: MessageEvent<ToTakeWorker>) => void) | null;
  postMessage(message: FromTakeWorker, transfer: Transferable[]): void;
}
const scope = globalThis as unknown as WorkerScope;

const tell = createTakeListener({
  createTracker: createLiveTracker,
  judge: (pcm, sampleRate) => listenToTake(pcm, sampleRate),
  // Full or forbidden storage only costs the safety against a reload, never the take.
  keepPart: (id, index, pcm) => void appendUnkept(id, index, pcm).catch(() => undefined),
  post: (message, transfer = []) => scope.postMessage(message, transfer),
});
scope.onmessage = ({ data }) => tell(data);
