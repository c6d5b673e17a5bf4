import type { TakeReport, Verdict } from "@/shared/voice/takeReport";
import type { Refusal, SoundKind } from "./sound/soundFile";
import { longestTakeS, type TakePart } from "./takeProtocol";

/** Why there is no microphone to listen to. */
export type Unavailable = "refused" | "no-microphone" | "insecure" | "busy" | "unsupported";
/** What broke a take off before the singer stopped it. */
export type Interruption = "taken" | "unplugged" | "muted" | "hidden" | "stalled" | "reloaded";
/** "file": nobody stopped it, it is a recording. */
export type StoppedBy = "singer" | "full" | "file" | Interruption;
export type FailureKind = Unavailable | Refusal | Exclude<Verdict, "heard"> | "interrupted" | "broken";

/** Kinds of sound processing that the browser kept on although it was asked not to. */
export type Processing = "echo cancellation" | "noise suppression" | "automatic gain";

/** A part of a take that was judged instead of the whole; `whole` is what the whole was judged to be. */
interface JudgedPart extends TakePart {
  whole: TakeReport;
}

/** A judged take that nobody has kept yet. The sound stays on this device. */
export interface HeardTake {
  id: string;
  sungAt: string;
  report: TakeReport;
  /** the whole sound, also where only a part was judged */
  pcm: Float32Array<ArrayBuffer>;
  sampleRate: number;
  part?: JudgedPart;
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
  /** what the file is, where one could be told */
  file?: SoundKind | null;
}

export type RecorderState =
  | { step: "idle" }
  | { step: "asking" }
  /** the microphone is open, and the singer is counted in */
  | { step: "counting"; left: number }
  /** a file is read, so many bytes of it; then it is turned into sound, and `share` is null */
  | { step: "reading"; name: string; share: number | null }
  | ({ step: "listening"; seconds: number } & Sung)
  | ({ step: "stopping"; stoppedBy: StoppedBy; seconds: number } & Sung)
  /** `listened` is the share that the engine has been through, 0 to 1 */
  | ({ step: "judging"; stoppedBy: StoppedBy; seconds: number; listened: number } & Sung)
  /** `judgingPart` while the worker reads a part of the take, `refusedPart` where too little was in it */
  | { step: "result"; take: HeardTake; judgingPart: boolean; refusedPart: string | null }
  | { step: "failure"; failure: Failure };

export type RecorderEvent =
  | { kind: "ask" }
  | { kind: "beat"; left: number }
  | ({ kind: "opened" } & Sung)
  | { kind: "unavailable"; why: Unavailable }
  /** `mostS` where this take may be longer than others */
  | { kind: "heard"; seconds: number; mostS?: number }
  | { kind: "stop" }
  | { kind: "interrupted"; cause: Interruption }
  | { kind: "flushed" }
  | {
      kind: "judged";
      report: TakeReport;
      pcm: Float32Array<ArrayBuffer>;
      sampleRate: number;
      part: TakePart | null;
    }
  | { kind: "broken" }
  | { kind: "restored"; take: HeardTake }
  | { kind: "rejudging"; id: string; sungAt: string; seconds: number }
  | { kind: "read"; name: string }
  | { kind: "bytes"; share: number | null }
  | { kind: "listened"; share: number }
  | { kind: "decoded"; id: string; sungAt: string; seconds: number }
  | { kind: "unusable"; why: Refusal; file: SoundKind | null }
  | { kind: "judgePart" }
  | { kind: "judgeWhole" }
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
    case "counting":
      return beforeListening(state, event);
    case "reading":
      return whileReading(state, event);
    case "listening":
      return whileListening(state, event);
    case "stopping":
      if (event.kind === "flushed") return { ...state, step: "judging", listened: 0 };
      return event.kind === "broken" ? failed({ kind: "broken", seconds: state.seconds }) : state;
    case "judging":
      if (event.kind === "judged") return afterJudging(state, event);
      if (event.kind === "listened") return { ...state, listened: event.share };
      return event.kind === "broken" ? failed({ kind: "broken", seconds: state.seconds }) : state;
    case "result":
      return afterResult(state, event);
  }
}

function fromRest(state: RecorderState, event: RecorderEvent): RecorderState {
  if (event.kind === "ask") return { step: "asking" };
  if (event.kind === "read") return { step: "reading", name: event.name, share: 0 };
  if (event.kind === "restored") return resultOf(event.take);
  if (event.kind !== "rejudging") return state;
  return { ...judgingOf(event), stoppedBy: "reloaded" };
}

function beforeListening(state: RecorderState, event: RecorderEvent): RecorderState {
  switch (event.kind) {
    case "beat":
      return { step: "counting", left: event.left };
    case "opened":
      return { step: "listening", seconds: 0, ...sungOf(event) };
    case "unavailable":
      return failed({ kind: event.why });
    case "interrupted":
      return failed({ kind: "interrupted", stoppedBy: event.cause });
    case "stop":
      return idle;
    default:
      return event.kind === "broken" ? failed({ kind: "broken" }) : state;
  }
}

function whileReading(state: RecorderState & { step: "reading" }, event: RecorderEvent): RecorderState {
  switch (event.kind) {
    case "bytes":
      return { ...state, share: event.share };
    case "decoded":
      return { ...judgingOf(event), stoppedBy: "file" };
    case "unusable":
      return failed({ kind: event.why, stoppedBy: "file", file: event.file });
    case "broken":
      return failed({ kind: "broken", stoppedBy: "file" });
    default:
      return state;
  }
}

function afterResult(state: RecorderState & { step: "result" }, event: RecorderEvent): RecorderState {
  const { part, ...take } = state.take;
  switch (event.kind) {
    case "ask":
      return { step: "asking" };
    case "read":
      return { step: "reading", name: event.name, share: 0 };
    case "felt":
      return { ...state, take: { ...state.take, warmedUp: event.warmedUp, effort: event.effort } };
    case "judgePart":
      return { ...state, judgingPart: true, refusedPart: null };
    case "judgeWhole":
      return part ? resultOf({ ...take, report: part.whole }) : state;
    case "broken":
      return { ...state, judgingPart: false, refusedPart: "That part could not be read." };
    case "judged": {
      if (!state.judgingPart || !event.part) return state;
      const { report } = event;
      if (report.verdict !== "heard") return { ...state, judgingPart: false, refusedPart: report.sentence };
      return resultOf({ ...take, report, part: { ...event.part, whole: part?.whole ?? take.report } });
    }
    default:
      return state;
  }
}

function resultOf(take: HeardTake): RecorderState {
  return { step: "result", take, judgingPart: false, refusedPart: null };
}

function whileListening(state: RecorderState & { step: "listening" }, event: RecorderEvent): RecorderState {
  const stopping = (stoppedBy: StoppedBy): RecorderState => ({ ...state, step: "stopping", stoppedBy });
  switch (event.kind) {
    case "heard": {
      const { mostS = longestTakeS } = event;
      if (event.seconds >= mostS) return { ...stopping("full"), seconds: mostS } as RecorderState;
      return { ...state, seconds: event.seconds };
    }
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
    return resultOf(take);
  }
  const brokenOff = stoppedBy !== "singer" && stoppedBy !== "full" && stoppedBy !== "file";
  const { sentence, nextStep } = report;
  const kind = brokenOff ? "interrupted" : report.verdict;
  return failed({ kind, report: { sentence, nextStep }, seconds, stoppedBy });
}

function judgingOf({ id, sungAt, seconds }: { id: string; sungAt: string; seconds: number }) {
  return { step: "judging", seconds, listened: 0, id, sungAt, processed: [] as Processing[] } as const;
}

function failed(failure: Partial<Failure> & { kind: FailureKind }): RecorderState {
  return { step: "failure", failure: { report: null, seconds: 0, stoppedBy: null, ...failure } };
}

function sungOf({ id, sungAt, processed }: Sung): Sung {
  return { id, sungAt, processed };
}
