import { findWays } from "@/shared/ways/findWays";
import type { WaysQuestion } from "@/shared/ways/wayCandidates";
import type { WayAnswer } from "./waySearch";

interface WorkerScope {
  onmessage: ((event: MessageEvent<WaysQuestion>) => void) | null;
  postMessage(message: WayAnswer): void;
}
const scope = globalThis as unknown as WorkerScope;

scope.onmessage = ({ data }) => {
  try {
    scope.postMessage({ ways: findWays(data) });
  } catch (error) {
    scope.postMessage({ fault: (error as Error).message });
  }
};
scope.postMessage({ ready: true });
