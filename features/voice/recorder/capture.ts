import { newId } from "@/features/api/newId";
import { hear, silence, type LiveSound } from "./liveSound";
import { MicrophoneUnavailable, openMicrophone, type Microphone } from "./microphone";
import { openTakeWorker } from "./openTakeWorker";
import type { RecorderEvent } from "./recorder";
import type { FromTakeWorker, ToTakeWorker } from "./takeProtocol";
import { beginUnkept, markTakeOfThisTab, type CutOffTake } from "./unkeptTake";

/** No block for so long means that the sound has stopped without a word. */
const stallMs = 3000;
/** The page learns the time five times a second; the trail has its own, faster way. */
const ticksPerS = 5;

export interface Capture {
  start(): Promise<void>;
  stop(): Promise<void>;
  judgeKept(cutOff: CutOffTake): void;
  /** Lets go of the microphone and of the take. */
  drop(): void;
  /** Ends the worker too. */
  close(): void;
}

/** Joins the microphone and the worker, and tells the recorder what happens. */
export function createCapture(emit: (event: RecorderEvent) => void, live: LiveSound): Capture {
  let worker: Worker | null = null;
  let microphone: Microphone | null = null;
  let watchdog: ReturnType<typeof setInterval> | null = null;
  let round = 0;
  let tick = 0;

  const tell = (message: ToTakeWorker, transfer: Transferable[] = []) => {
    worker ??= connect(openTakeWorker());
    worker.postMessage(message, transfer);
  };
  const connect = (fresh: Worker) => {
    fresh.onmessage = ({ data }: MessageEvent<FromTakeWorker>) => receive(data);
    fresh.onerror = () => {
      worker = null;
      release();
      emit({ kind: "broken" });
    };
    return fresh;
  };
  const receive = (message: FromTakeWorker) => {
    if (message.kind === "judged") emit(message);
    else if (message.kind === "broken") emit({ kind: "broken" });
    else if (microphone) {
      hear(live, message, performance.now());
      const now = Math.floor(message.seconds * ticksPerS);
      if (now !== tick) emit({ kind: "heard", seconds: message.seconds });
      tick = now;
    }
  };
  const release = () => {
    round += 1;
    if (watchdog) clearInterval(watchdog);
    watchdog = null;
    microphone?.close();
    microphone = null;
  };

  return {
    async start() {
      release();
      silence(live);
      tick = 0;
      const mine = round;
      const { port1, port2 } = new MessageChannel();
      try {
        const opened = await openMicrophone(port1, (cause) => emit({ kind: "interrupted", cause }));
        if (mine !== round) {
          opened.close();
          return;
        }
        microphone = opened;
        const take = { id: newId(), sungAt: new Date().toISOString() };
        markTakeOfThisTab(take.id);
        void beginUnkept({ ...take, sampleRate: opened.sampleRate }).catch(() => undefined);
        tell({ kind: "begin", sampleRate: opened.sampleRate, sound: port2, keepAs: take.id }, [port2]);
        live.atMs = performance.now();
        watchdog = setInterval(() => {
          if (performance.now() - live.atMs > stallMs) emit({ kind: "interrupted", cause: "stalled" });
        }, 1000);
        emit({ kind: "opened", ...take, processed: opened.processed });
      } catch (fault) {
        if (mine !== round) return;
        emit({ kind: "unavailable", why: fault instanceof MicrophoneUnavailable ? fault.why : "unsupported" });
      }
    },
    async stop() {
      const open = microphone;
      if (watchdog) clearInterval(watchdog);
      const endIsComing = (await open?.finish()) ?? false;
      if (open !== microphone) return;
      microphone = null;
      emit({ kind: "flushed" });
      tell({ kind: "judge", endIsComing });
    },
    judgeKept({ sampleRate, pcm }) {
      tell({ kind: "judgeKept", sampleRate, pcm }, [pcm.buffer]);
    },
    drop() {
      release();
      if (worker) tell({ kind: "drop" });
    },
    close() {
      release();
      worker?.terminate();
      worker = null;
    },
  };
}
