import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";

/** What the page tells the worker of guided holds; each try is begun anew and comes through a port of its own. */
export type ToGuidedWorker = { kind: "begin"; sampleRate: number; sound: MessagePort } | { kind: "judge" };

export type FromGuidedWorker =
  | { kind: "heard"; frames: LiveFrame[]; seconds: number; peak: number; levelDb: number }
  | { kind: "judged"; report: TakeReport }
  | { kind: "broken"; reason: string };
