import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";

/** A take ends by itself after this many seconds. */
export const longestTakeS = 20;
/** A tune that is sung into a song, as a whole. */
export const longestTuneS = 60;
/** A song that is tried in a key is longer. */
export const longestTryS = 240;
/** From here on a take usually carries a range. */
export const enoughTakeS = 5;

/** The part of a take between two moments, in seconds from its start. */
export interface TakePart {
  startS: number;
  endS: number;
}

/** What the page tells the worker. */
export type ToTakeWorker =
  /** Begin a take; sound comes through the port as `TakeSound`. `keepAs` names the take in the device's own storage; it is as long as a take may be unless `mostS` says otherwise. */
  | { kind: "begin"; sampleRate: number; sound: MessagePort; keepAs: string; mostS?: number }
  /** Judge the take: behind its end mark where one is on its way, at once where the sound broke off without one. */
  | { kind: "judge"; endIsComing: boolean }
  /** Judge sound that is there already: kept before a reload, read from a file, or a part of a take. */
  | { kind: "judgeKept"; sampleRate: number; pcm: Float32Array<ArrayBuffer>; part: TakePart | null }
  /** Get ready for a take. */
  | { kind: "warmUp" }
  /** Forget this take. */
  | { kind: "drop" };

/** What the worklet writes to its port. */
export type TakeSound = { kind: "block"; pcm: Float32Array<ArrayBuffer> } | { kind: "end" };

/** What the worker answers. */
export type FromTakeWorker =
  /** About every 10 ms while listening. `ahead` is what was measured and not yet decided, `peak` is the largest absolute sample since the last message, `levelDb` its RMS in dBFS. */
  | { kind: "heard"; frames: LiveFrame[]; ahead: LiveFrame[]; seconds: number; levelDb: number; peak: number }
  /** So much of sound that came as a whole was listened to, 0 to 1. */
  | { kind: "listened"; share: number }
  | { kind: "judged"; report: TakeReport; pcm: Float32Array<ArrayBuffer>; sampleRate: number; part: TakePart | null }
  /** The engine stopped with a fault. */
  | { kind: "broken"; reason: string };
