import { createStringReader } from "@/shared/voice/pluckedString";
import type { FromTunerWorker, ToTunerWorker } from "./tunerProtocol";

interface WorkerScope {
  onmessage: ((event: MessageEvent<ToTunerWorker>) => void) | null;
  postMessage(message: FromTunerWorker): void;
}
const scope = globalThis as unknown as WorkerScope;
/** Blocks of the microphone are a few ms long; the reader is fed with more at once. */
const pieceS = 0.06;

scope.onmessage = ({ data: { sampleRate, sound } }) => {
  const reader = createStringReader(sampleRate);
  const piece = new Float32Array(Math.ceil(pieceS * sampleRate) + 4096);
  let filled = 0;
  sound.onmessage = ({ data }: MessageEvent<{ kind: string; pcm: Float32Array }>) => {
    if (data.kind !== "block") return;
    piece.set(data.pcm.subarray(0, piece.length - filled), filled);
    filled = Math.min(piece.length, filled + data.pcm.length);
    if (filled < pieceS * sampleRate) return;
    try {
      const readings = reader.push(piece.slice(0, filled));
      filled = 0;
      const { nowDb: levelDb, roomDb } = reader.level();
      scope.postMessage({ kind: "heard", readings, levelDb, roomDb });
    } catch {
      scope.postMessage({ kind: "broken" });
    }
  };
};
