import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";

/** A song as it was sung in a key. */
export interface HeardTry {
  id: string;
  sungAt: string;
  report: TakeReport;
  /** what the browser did to the sound although it was asked not to */
  processed: readonly string[];
  /** what broke it off, in a sentence; null where the singer ended it */
  brokenOff: string | null;
}

type TryTakeState =
  | { step: "idle" | "asking" }
  | { step: "listening" | "stopping"; id: string; seconds: number }
  | { step: "judging"; seconds: number; listened: number }
  | { step: "heard"; take: HeardTry }
  | {
      step: "failure";
      words: { title: string; happened: string; safe: string; next: string };
      /** there was sound, and it was judged */
      heard: boolean;
    };

/** What is heard right now. */
export interface HeardNow {
  frames: readonly LiveFrame[];
  /** not decided yet */
  ahead: readonly LiveFrame[];
  levelDb: number;
  peak: number;
  /** seconds of the take */
  now: number;
}

/** The recorder that the page is given. */
export interface TryRecorder {
  state: TryTakeState;
  /** until it is known whether a take waits here */
  restoring: boolean;
  sing(): void;
  stop(): void;
  leave(): void;
  now(): HeardNow;
  listen(listener: () => void): () => void;
  /** the page's clock (performance.now) at second 0 of the take */
  startedMs(): number | null;
  playback: {
    playing: boolean;
    failed: boolean;
    play(part: { startS: number; endS: number }): Promise<void>;
    stop(): void;
    /** seconds of the take that sound right now */
    position(): number;
  };
}
