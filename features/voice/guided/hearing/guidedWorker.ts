import { listenToTake } from "@/shared/voice/listenToTake";
import { createLiveTracker } from "@/shared/voice/liveTracker";
import { createGuidedListener } from "./guidedListener";
import type { FromGuidedWorker, ToGuidedWorker } from "./guidedProtocol";

interface WorkerScope {
  onmessage: ((event: MessageEvent<ToGuidedWorker>) => void) | null;
  postMessage(message: FromGuidedWorker): void;
}
const scope = globalThis as unknown as WorkerScope;

const tell = createGuidedListener({
  createTracker: createLiveTracker,
  judge: (pcm, sampleRate) => listenToTake(pcm, sampleRate, { hold: true }),
  post: (message) => scope.postMessage(message),
});
scope.onmessage = ({ data }) => tell(data);
