import type { TakeReport, Verdict } from "@/shared/voice/takeReport";
import { longestTakeS } from "./takeProtocol";

/** Why there is no microphone to listen to. */
export type Unavailable = "refused" | "no-microphone" | "insecure" | "busy" | "unsupported";
/** What broke a take off before the singer stopped it. */
export type Interruption = "taken" | "unplugged" | "muted" | "hidden" | "stalled" | "reloaded";
export type StoppedBy = "singer" | "full" | Interruption;
export type FailureKind = Unavailable | Exclude<Verdict, "heard"> | "interrupted" | "broken";

/** Kinds of sound processing that the browser kept on although it was asked not to. */
export type Processing = "echo cancellation" | "noise suppression" | "automatic gain";

/** A judged take that nobody has kept yet. The sound stays on this device. */
export interface HeardTake {
  id: string;
  sungAt: string;
  report: TakeReport;
  pcm: Float32Array<ArrayBuffer>;
  sampleRate: number;
  processed: Processing[];
  stoppedBy: StoppedBy;
  warmedUp: boolean | null;
  effort: number | null;
}

interface Sung {
  id: string;
  sungAt: string;
  processed: Processing[];
}

export interface Failure {
  kind: FailureKind;
  /** the engine's own words, where it has judged the sound */
  report: { sentence: string; nextStep: string } | null;
  /** seconds that were recorded, 0 if none */
  seconds: number;
  stoppedBy: StoppedBy | null;
}

export type RecorderState =
  | { step: "idle" }
  | { step: "asking" }
  | ({ step: "listening"; seconds: number } & Sung)
  | ({ step: "stopping"; stoppedBy: StoppedBy; seconds: number } & Sung)
  | ({ step: "judging"; stoppedBy: StoppedBy; seconds: number } & Sung)
  | { step: "result"; take: HeardTake }
  | { step: "failure"; failure: Failure };

export type RecorderEvent =
  | { kind: "ask" }
  | ({ kind: "opened" } & Sung)
  | { kind: "unavailable"; why: Unavailable }
  | { kind: "heard"; seconds: number }
  | { kind: "stop" }
  | { kind: "interrupted"; cause: Interruption }
  | { kind: "flushed" }
  | { kind: "judged"; report: TakeReport; pcm: Float32Array<ArrayBuffer>; sampleRate: number }
  | { kind: "broken" }
  | { kind: "restored"; take: HeardTake }
  | { kind: "rejudging"; id: string; sungAt: string; seconds: number }
  | { kind: "felt"; warmedUp: boolean | null; effort: number | null }
  | { kind: "leave" };

export const idle: RecorderState = { step: "idle" };

/**
 * The recorder as a pure machine: what happened goes in, what is shown and done next comes out. An event that makes no
 * sense in the present step (a late block, a second press on Stop) changes nothing.
 */
export function recorder(state: RecorderState, event: RecorderEvent): RecorderState {
  if (event.kind === "leave") return idle;
  switch (state.step) {
    case "idle":
    case "failure":
      return fromRest(state, event);
    case "asking":
      if (event.kind === "opened") return { step: "listening", seconds: 0, ...sungOf(event) };
      if (event.kind === "unavailable") return failed({ kind: event.why });
      if (event.kind === "interrupted") return failed({ kind: "interrupted", stoppedBy: event.cause });
      return event.kind === "broken" ? failed({ kind: "broken" }) : state;
    case "listening":
      return whileListening(state, event);
    case "stopping":
      if (event.kind === "flushed") return { ...state, step: "judging" };
      return event.kind === "broken" ? failed({ kind: "broken", seconds: state.seconds }) : state;
    case "judging":
      if (event.kind === "judged") return afterJudging(state, event);
      return event.kind === "broken" ? failed({ kind: "broken", seconds: state.seconds }) : state;
    case "result":
      if (event.kind === "ask") return { step: "asking" };
      if (event.kind !== "felt") return state;
      return { ...state, take: { ...state.take, warmedUp: event.warmedUp, effort: event.effort } };
  }
}

function fromRest(state: RecorderState, event: RecorderEvent): RecorderState {
  if (event.kind === "ask") return { step: "asking" };
  if (event.kind === "restored") return { step: "result", take: event.take };
  if (event.kind !== "rejudging") return state;
  const { id, sungAt, seconds } = event;
  return { step: "judging", stoppedBy: "reloaded", seconds, id, sungAt, processed: [] };
}

function whileListening(state: RecorderState & { step: "listening" }, event: RecorderEvent): RecorderState {
  const stopping = (stoppedBy: StoppedBy): RecorderState => ({ ...state, step: "stopping", stoppedBy });
  switch (event.kind) {
    case "heard":
      if (event.seconds >= longestTakeS) return { ...stopping("full"), seconds: longestTakeS } as RecorderState;
      return { ...state, seconds: event.seconds };
    case "stop":
      return stopping("singer");
    case "interrupted":
      return stopping(event.cause);
    case "broken":
      return failed({ kind: "broken", seconds: state.seconds });
    default:
      return state;
  }
}

function afterJudging(
  state: RecorderState & { step: "judging" },
  { report, pcm, sampleRate }: RecorderEvent & { kind: "judged" },
): RecorderState {
  const { stoppedBy, seconds } = state;
  if (report.verdict === "heard") {
    const take = { ...sungOf(state), report, pcm, sampleRate, stoppedBy, warmedUp: null, effort: null };
    return { step: "result", take };
  }
  const brokenOff = stoppedBy !== "singer" && stoppedBy !== "full";
  const { sentence, nextStep } = report;
  const kind = brokenOff ? "interrupted" : report.verdict;
  return failed({ kind, report: { sentence, nextStep }, seconds, stoppedBy });
}

function failed(failure: Partial<Failure> & { kind: FailureKind }): RecorderState {
  return { step: "failure", failure: { report: null, seconds: 0, stoppedBy: null, ...failure } };
}

function sungOf({ id, sungAt, processed }: Sung): Sung {
  return { id, sungAt, processed };
}
