import { enoughHoldS, fellSilent, holdNow, longestTryS, readTry, type Asked } from "./guidedHold";
import type { FromGuidedWorker, ToGuidedWorker } from "./guidedProtocol";
import type { GuidedEvent } from "../guidedSteps";
import { openGuidedWorker } from "./openGuidedWorker";
import { createEar } from "../../recorder/ear";
import { hear, silence, type LiveSound } from "../../recorder/liveSound";
import { createReferenceTone, type ReferenceTone } from "./referenceTone";

/** The room gives the tone back for a moment after it has ended. */
const roomMs = 180;

export interface GuidedSession {
  open(): Promise<void>;
  sound(midi: number): Promise<void>;
  listen(): void;
  judge(asked: Asked | null): void;
  close(): void;
}

/** Joins tone, microphone and worker, and tells the machine what happens. One microphone for the whole way. */
export function createGuidedSession(emit: (event: GuidedEvent) => void, live: LiveSound): GuidedSession {
  const ear = createEar(emit, live);
  let tone: ReferenceTone | null = null;
  let worker: Worker | null = null;
  let asked: Asked | null = null;
  let listening = false;
  let round = 0;

  const tell = (message: ToGuidedWorker, transfer: Transferable[] = []) => worker?.postMessage(message, transfer);
  const endListening = () => {
    listening = false;
    ear.rest();
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
    ear.release();
    worker?.terminate();
    worker = null;
  };

  return {
    async open() {
      release();
      tone = createReferenceTone();
      worker = openGuidedWorker();
      worker.onmessage = ({ data }: MessageEvent<FromGuidedWorker>) => receive(data);
      worker.onerror = () => emit({ kind: "broken" });
      if (await ear.open()) emit({ kind: "opened" });
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
      const { microphone } = ear;
      if (!microphone) return;
      silence(live);
      const { port1, port2 } = new MessageChannel();
      tell({ kind: "begin", sampleRate: microphone.sampleRate, sound: port2 }, [port2]);
      ear.listen(port1);
      listening = true;
    },
    judge(wanted) {
      endListening();
      asked = wanted;
      tell({ kind: "judge" });
    },
    close: release,
  };
}
