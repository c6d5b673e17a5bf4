import type { LiveFrame, LiveTracker } from "@/shared/voice/liveTracker";
import type { TakeReport } from "@/shared/voice/takeReport";
import { longestTakeS } from "../takeProtocol";
import type { FromTakeWorker, TakePart, TakeSound, ToTakeWorker } from "../takeProtocol";

const tellEveryS = 0.02;

/** What the listener needs of the engine and of the device; the worker passes the real ones. */
export interface TakeTools {
  createTracker(sampleRate: number): LiveTracker;
  /** `measured` while the take was sung; null for sound that came as a whole */
  judge(
    pcm: Float32Array,
    sampleRate: number,
    measured: ReturnType<LiveTracker["measured"]>,
    onProgress: (share: number) => void,
  ): TakeReport;
  /** stores one second of sound on the device, against a reload */
  keepPart(id: string, index: number, pcm: Float32Array<ArrayBuffer>): void;
  /** runs the engine once on nothing that matters, so that its first real work is not its slowest */
  warmUp(): void;
  post(message: FromTakeWorker, transfer?: Transferable[]): void;
}

interface OpenTake {
  id: string;
  sampleRate: number;
  tracker: ReturnType<TakeTools["createTracker"]>;
  pcm: Float32Array<ArrayBuffer>;
  length: number;
  kept: number;
  parts: number;
  /** decided frames and loudness that the page has not been told yet */
  pending: LiveFrame[];
  level: { peak: number; levelDb: number };
  told: number;
  sound: MessagePort;
  ended: boolean;
  judgeAtEnd: boolean;
}

/** The worker's whole behaviour, apart from being a worker. */
export function createTakeListener(tools: TakeTools): (message: ToTakeWorker) => void {
  let take: OpenTake | null = null;

  const judge = (
    pcm: Float32Array<ArrayBuffer>,
    sampleRate: number,
    part: TakePart | null = null,
    measured: ReturnType<LiveTracker["measured"]> = null,
  ) => {
    try {
      const report = tools.judge(pcm, sampleRate, measured, (share) => {
        if (measured === null) tools.post({ kind: "listened", share });
      });
      tools.post({ kind: "judged", report, pcm, sampleRate, part }, [pcm.buffer]);
    } catch (fault) {
      tools.post({ kind: "broken", reason: String(fault) });
    }
  };
  const finish = (open: OpenTake) => {
    take = null;
    open.sound.close();
    // Not copied: that alone would take a tenth of the time until the result stands.
    judge(open.pcm.subarray(0, open.length), open.sampleRate, null, open.tracker.measured());
  };
  const drop = () => {
    take?.sound.close();
    take = null;
  };

  return (message) => {
    switch (message.kind) {
      case "begin": {
        drop();
        const open = openTake(message, tools);
        open.sound.onmessage = ({ data }: MessageEvent<TakeSound>) => {
          if (take !== open) return;
          if (data.kind === "block") {
            listen(open, data.pcm, tools);
            return;
          }
          open.ended = true;
          if (open.judgeAtEnd) finish(open);
        };
        take = open;
        return;
      }
      case "judge":
        if (!take) return;
        // Blocks on their way through the other port belong to the take: wait for its end mark.
        if (take.ended || !message.endIsComing) finish(take);
        else take.judgeAtEnd = true;
        return;
      case "judgeKept":
        drop();
        judge(message.pcm, message.sampleRate, message.part);
        return;
      case "warmUp":
        if (!take) tools.warmUp();
        return;
      case "drop":
        drop();
    }
  };
}

function openTake(
  { sampleRate, sound, keepAs, mostS = longestTakeS }: ToTakeWorker & { kind: "begin" },
  tools: TakeTools,
): OpenTake {
  return {
    id: keepAs,
    sampleRate,
    sound,
    tracker: tools.createTracker(sampleRate),
    pcm: new Float32Array(Math.ceil(sampleRate * mostS)),
    length: 0,
    kept: 0,
    parts: 0,
    pending: [],
    level: { peak: 0, levelDb: -120 },
    told: 0,
    ended: false,
    judgeAtEnd: false,
  };
}

function listen(take: OpenTake, block: Float32Array<ArrayBuffer>, tools: TakeTools): void {
  const pcm = block.subarray(0, take.pcm.length - take.length);
  if (pcm.length === 0) return;
  take.pcm.set(pcm, take.length);
  take.length += pcm.length;
  try {
    take.pending.push(...take.tracker.push(pcm));
  } catch (fault) {
    tools.post({ kind: "broken", reason: String(fault) });
    return;
  }
  take.level = louder(take.level, loudness(pcm));
  // At once when there is a new frame, which is every 10 ms; before the first ones for the level alone.
  if (take.pending.length > 0 || take.length - take.told >= tellEveryS * take.sampleRate) {
    const { pending: frames, level } = take;
    const ahead = take.tracker.ahead();
    tools.post({ kind: "heard", frames, ahead, seconds: take.length / take.sampleRate, ...level });
    Object.assign(take, { pending: [], level: { peak: 0, levelDb: -120 }, told: take.length });
  }
  if (take.length - take.kept >= take.sampleRate) {
    tools.keepPart(take.id, take.parts, take.pcm.slice(take.kept, take.length));
    take.parts += 1;
    take.kept = take.length;
  }
}

function louder(a: OpenTake["level"], b: OpenTake["level"]): OpenTake["level"] {
  return { peak: Math.max(a.peak, b.peak), levelDb: Math.max(a.levelDb, b.levelDb) };
}

function loudness(pcm: Float32Array): { levelDb: number; peak: number } {
  let peak = 0;
  let power = 0;
  for (const sample of pcm) {
    peak = Math.max(peak, Math.abs(sample));
    power += sample * sample;
  }
  // AES17: a full-scale sine is 0 dBFS; the floor keeps silence finite.
  return { peak, levelDb: Math.max(-120, 10 * Math.log10((2 * power) / pcm.length + 1e-12)) };
}
