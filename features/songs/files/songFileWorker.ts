import { readMelodyFile, type MelodyFile } from "@/shared/songs/melodyFile";

interface WorkerScope {
  onmessage: ((event: MessageEvent<{ name: string; bytes: ArrayBuffer }>) => void) | null;
  postMessage(message: MelodyFile): void;
}
const scope = globalThis as unknown as WorkerScope;

scope.onmessage = ({ data }) => scope.postMessage(readMelodyFile(data.name, new Uint8Array(data.bytes)));
