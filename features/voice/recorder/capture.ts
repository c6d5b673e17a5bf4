import { newId } from "@/features/api/newId";
import { createEar } from "./ear";
import { hear, silence, type LiveSound } from "./liveSound";
import { openTakeWorker } from "./worker/openTakeWorker";
import type { HeardTake, RecorderEvent } from "./recorder";
import { FileRefused, readSoundFile } from "./sound/soundFile";
import type { FromTakeWorker, TakePart, ToTakeWorker } from "./takeProtocol";
import { beginUnkept, markTakeOfThisTab, type CutOffTake } from "./unkeptTake";

/** The page learns the time five times a second; the trail has its own, faster way. */
const ticksPerS = 5;

export interface Capture {
  /** Starts the worker before it is needed. */
  warmUp(): void;
  start(counted: boolean): Promise<void>;
  stop(): Promise<void>;
  /** Reads and judges a recording. */
  read(file: File): Promise<void>;
  judgeKept(cutOff: CutOffTake): void;
  judgePart(take: HeardTake, part: TakePart): void;
  /** Lets go of the microphone and of the take. */
  drop(): void;
  /** Ends the worker too, whatever it is doing. */
  close(): void;
}

/** What is not as in a usual take. */
interface CaptureWays {
  /** how long a take may be */
  mostS?: number;
  /** under which the tab remembers its take */
  mark?: string;
}

/** Joins the microphone and the worker, and tells the recorder what happens. */
export function createCapture(
  emit: (event: RecorderEvent) => void,
  live: LiveSound,
  { mark, ...length }: CaptureWays = {},
): Capture {
  let worker: Worker | null = null;
  const ear = createEar(emit, live);
  let reading = 0;
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
    if (message.kind === "judged" || message.kind === "listened") emit(message);
    else if (message.kind === "broken") emit({ kind: "broken" });
    else if (ear.microphone) {
      hear(live, message, performance.now());
      const now = Math.floor(message.seconds * ticksPerS);
      if (now !== tick) emit({ kind: "heard", seconds: message.seconds, ...length });
      tick = now;
    }
  };
  const release = () => {
    reading += 1;
    ear.release();
  };

  return {
    warmUp: () => tell({ kind: "warmUp" }),
    async start(counted) {
      release();
      silence(live);
      tick = 0;
      const opened = await ear.open();
      const here = () => opened !== null && ear.microphone === opened;
      if (opened && counted) await opened.countIn((left) => here() && emit({ kind: "beat", left }));
      if (!opened || !here()) return;
      const take = { id: newId(), sungAt: new Date().toISOString() };
      markTakeOfThisTab(take.id, mark);
      void beginUnkept({ ...take, sampleRate: opened.sampleRate }).catch(() => undefined);
      const { port1, port2 } = new MessageChannel();
      tell({ kind: "begin", sampleRate: opened.sampleRate, sound: port2, keepAs: take.id, ...length }, [port2]);
      ear.listen(port1);
      emit({ kind: "opened", ...take, processed: opened.processed });
    },
    async stop() {
      const endIsComing = await ear.finish();
      if (endIsComing === null) return;
      emit({ kind: "flushed" });
      tell({ kind: "judge", endIsComing });
    },
    async read(file) {
      release();
      const mine = reading;
      try {
        const { pcm, sampleRate } = await readSoundFile(
          file,
          (share) => mine === reading && emit({ kind: "bytes", share }),
        );
        if (mine !== reading) return;
        const sungAt = new Date(Math.min(Date.now(), file.lastModified)).toISOString();
        const take = { id: newId(), sungAt };
        markTakeOfThisTab(take.id, mark);
        emit({ kind: "decoded", ...take, seconds: pcm.length / sampleRate });
        tell({ kind: "judgeKept", sampleRate, pcm, part: null }, [pcm.buffer]);
      } catch (fault) {
        if (mine !== reading) return;
        if (fault instanceof FileRefused) emit({ kind: "unusable", why: fault.why, file: fault.kind });
        else emit({ kind: "broken" });
      }
    },
    judgeKept({ sampleRate, pcm }) {
      tell({ kind: "judgeKept", sampleRate, pcm, part: null }, [pcm.buffer]);
    },
    judgePart({ pcm, sampleRate }, part) {
      const sound = pcm.slice(Math.round(part.startS * sampleRate), Math.round(part.endS * sampleRate));
      tell({ kind: "judgeKept", sampleRate, pcm: sound, part }, [sound.buffer]);
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
