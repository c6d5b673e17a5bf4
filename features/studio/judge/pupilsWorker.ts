import { judgePupils, type PupilsQuestion } from "./judgePupils";
import type { PupilsAnswer } from "./askPupilKeys";

interface WorkerScope {
  onmessage: ((event: MessageEvent<PupilsQuestion>) => void) | null;
  postMessage(message: PupilsAnswer): void;
}
const scope = globalThis as unknown as WorkerScope;

scope.onmessage = ({ data }) => {
  try {
    scope.postMessage({ judged: judgePupils(data) });
  } catch (error) {
    scope.postMessage({ fault: (error as Error).message });
  }
};
