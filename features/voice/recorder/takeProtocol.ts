import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";

/** A take ends by itself after this many seconds. */
export const longestTakeS = 20;
/** From here on a take usually carries a range. */
export const enoughTakeS = 5;

/** What the page tells the worker. */
export type ToTakeWorker =
  /** Begin a take; sound comes through the port as `TakeSound`. `keepAs` names the take in the device's own storage. */
  | { kind: "begin"; sampleRate: number; sound: MessagePort; keepAs: string }
  /** Judge the take: behind its end mark where one is on its way, at once where the sound broke off without one. */
  | { kind: "judge"; endIsComing: boolean }
  /** Judge sound that was kept before a reload. */
  | { kind: "judgeKept"; sampleRate: number; pcm: Float32Array<ArrayBuffer> }
  /** Forget this take. */
  | { kind: "drop" };

/** What the worklet writes to its port. */
export type TakeSound = { kind: "block"; pcm: Float32Array<ArrayBuffer> } | { kind: "end" };

/** What the worker answers. */
export type FromTakeWorker =
  /** About every 20 ms while listening. `peak` is the largest absolute sample of the block, `levelDb` its RMS in dBFS. */
  | { kind: "heard"; frames: LiveFrame[]; seconds: number; levelDb: number; peak: number }
  | { kind: "judged"; report: TakeReport; pcm: Float32Array<ArrayBuffer>; sampleRate: number }
  /** The engine stopped with a fault. */
  | { kind: "broken"; reason: string };
