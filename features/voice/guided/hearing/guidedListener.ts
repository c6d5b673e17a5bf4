import type { LiveFrame } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";
import { longestTryS } from "./guidedHold";
import type { FromGuidedWorker, ToGuidedWorker } from "./guidedProtocol";
import type { TakeSound } from "../../recorder/takeProtocol";

export interface GuidedTools {
  createTracker(sampleRate: number): { push(pcm: Float32Array): LiveFrame[] };
  judge(pcm: Float32Array, sampleRate: number): TakeReport;
  post(message: FromGuidedWorker): void;
}

interface Try {
  sampleRate: number;
  sound: MessagePort;
  tracker: ReturnType<GuidedTools["createTracker"]>;
  pcm: Float32Array<ArrayBuffer>;
  length: number;
}

/** The pages draw some thirty times a second; blocks come far more often. */
const toldEveryS = 0.03;

/** The whole behaviour of the worker of guided holds, apart from being a worker. Its sound is forgotten with each try. */
export function createGuidedListener(tools: GuidedTools): (message: ToGuidedWorker) => void {
  let open: Try | null = null;
  const guarded = (work: () => void) => {
    try {
      work();
    } catch (fault) {
      tools.post({ kind: "broken", reason: String(fault) });
    }
  };
  const begin = ({ sampleRate, sound }: ToGuidedWorker & { kind: "begin" }) => {
    open?.sound.close();
    const own: Try = {
      sampleRate,
      sound,
      tracker: tools.createTracker(sampleRate),
      pcm: new Float32Array(Math.ceil(sampleRate * (longestTryS + 1))),
      length: 0,
    };
    const toTell = createTeller(own, tools);
    sound.onmessage = ({ data }: MessageEvent<TakeSound>) => {
      if (open === own && data.kind === "block") guarded(() => toTell(data.pcm));
    };
    open = own;
  };
  const judge = () => {
    if (!open) return;
    const { pcm, length, sampleRate, sound } = open;
    open = null;
    sound.close();
    tools.post({ kind: "judged", report: tools.judge(pcm.subarray(0, length), sampleRate) });
  };
  return (message) => guarded(() => (message.kind === "begin" ? begin(message) : judge()));
}

function createTeller(own: Try, tools: GuidedTools): (block: Float32Array) => void {
  let frames: LiveFrame[] = [];
  let peak = 0;
  let power = 0;
  let samples = 0;
  return (block) => {
    const pcm = block.subarray(0, own.pcm.length - own.length);
    own.pcm.set(pcm, own.length);
    own.length += pcm.length;
    frames.push(...own.tracker.push(pcm));
    for (const sample of pcm) {
      peak = Math.max(peak, Math.abs(sample));
      power += sample * sample;
    }
    samples += pcm.length;
    if (samples < toldEveryS * own.sampleRate) return;
    // AES17: a full-scale sine is 0 dBFS; the floor keeps silence finite.
    const levelDb = Math.max(-120, 10 * Math.log10((2 * power) / samples + 1e-12));
    tools.post({ kind: "heard", frames, seconds: own.length / own.sampleRate, peak, levelDb });
    frames = [];
    peak = 0;
    power = 0;
    samples = 0;
  };
}
