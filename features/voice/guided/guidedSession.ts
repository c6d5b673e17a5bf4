import { enoughHoldS, fellSilent, holdNow, longestTryS, readTry, type Asked } from "./guidedHold";
import type { FromGuidedWorker, ToGuidedWorker } from "./guidedProtocol";
import type { GuidedEvent } from "./guidedSteps";
import { openGuidedWorker } from "./openGuidedWorker";
import { hear, silence, type LiveSound } from "../recorder/liveSound";
import { MicrophoneUnavailable, openMicrophone, type Microphone } from "../recorder/microphone";
import { createReferenceTone, type ReferenceTone } from "./referenceTone";

/** The room gives the tone back for a moment after it has ended. */
const roomMs = 180;
/** No block for so long means that the sound has stopped without a word. */
const stallMs = 3000;

export interface GuidedSession {
  open(): Promise<void>;
  sound(midi: number): Promise<void>;
  listen(): void;
  judge(asked: Asked | null): void;
  close(): void;
}

/** Joins tone, microphone and worker, and tells the machine what happens. One microphone for the whole way. */
export function createGuidedSession(emit: (event: GuidedEvent) => void, live: LiveSound): GuidedSession {
  let tone: ReferenceTone | null = null;
  let microphone: Microphone | null = null;
  let worker: Worker | null = null;
  let watch: ReturnType<typeof setInterval> | null = null;
  let asked: Asked | null = null;
  let listening = false;
  let round = 0;

  const tell = (message: ToGuidedWorker, transfer: Transferable[] = []) => worker?.postMessage(message, transfer);
  const endListening = () => {
    listening = false;
    if (watch) clearInterval(watch);
    watch = null;
  };
  const receive = (message: FromGuidedWorker) => {
    if (message.kind === "broken") emit({ kind: "broken" });
    else if (message.kind === "judged") emit({ kind: "judged", outcome: readTry(message.report, asked) });
    else if (listening) {
      hear(live, { ...message, ahead: [] }, performance.now());
      const held = holdNow(live.frames)?.heldS ?? 0;
      if (held >= enoughHoldS || live.seconds >= longestTryS || fellSilent(live.frames)) {
        endListening();
        emit({ kind: "listened" });
      }
    }
  };
  const release = () => {
    round += 1;
    endListening();
    tone?.close();
    tone = null;
    microphone?.close();
    microphone = null;
    worker?.terminate();
    worker = null;
  };

  return {
    async open() {
      release();
      const mine = round;
      tone = createReferenceTone();
      worker = openGuidedWorker();
      worker.onmessage = ({ data }: MessageEvent<FromGuidedWorker>) => receive(data);
      worker.onerror = () => emit({ kind: "broken" });
      try {
        const opened = await openMicrophone((cause) => emit({ kind: "interrupted", cause }));
        if (mine !== round) {
          opened.close();
          return;
        }
        microphone = opened;
        emit({ kind: "opened" });
      } catch (fault) {
        if (mine !== round) return;
        release();
        emit({ kind: "unavailable", why: fault instanceof MicrophoneUnavailable ? fault.why : "unsupported" });
      }
    },
    async sound(midi) {
      const mine = round;
      endListening();
      silence(live);
      await tone?.play(midi);
      await new Promise((resolve) => setTimeout(resolve, roomMs));
      if (mine === round) emit({ kind: "toneEnded" });
    },
    listen() {
      if (!microphone) return;
      silence(live);
      const { port1, port2 } = new MessageChannel();
      tell({ kind: "begin", sampleRate: microphone.sampleRate, sound: port2 }, [port2]);
      microphone.listen(port1);
      live.atMs = performance.now();
      listening = true;
      watch = setInterval(() => {
        if (performance.now() - live.atMs > stallMs) emit({ kind: "interrupted", cause: "stalled" });
      }, 500);
    },
    judge(wanted) {
      endListening();
      asked = wanted;
      tell({ kind: "judge" });
    },
    close: release,
  };
}
