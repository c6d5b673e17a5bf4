import type { LiveSound } from "./liveSound";
import { MicrophoneUnavailable, openMicrophone, type Microphone } from "./microphone";
import type { Interruption, Unavailable } from "./recorder";

/** No block for so long means that the sound has stopped without a word. */
const stallMs = 3000;
const lookEveryMs = 500;

export type EarEvent = { kind: "interrupted"; cause: Interruption } | { kind: "unavailable"; why: Unavailable };

/** One microphone at a time, opened, listened to and let go. */
export interface Ear {
  /** the one that is open now */
  readonly microphone: Microphone | null;
  /** The opened microphone; null where there is none, which is told, or where it was let go of meanwhile. */
  open(): Promise<Microphone | null>;
  /** From here on the sound flows into `sound`, and its stopping without a word is told. */
  listen(sound: MessagePort): void;
  /** Its stopping means nothing any more. */
  rest(): void;
  /** Lets the last block through, then lets go. False where the sound had broken off without an end; null where another has taken its place. */
  finish(): Promise<boolean | null>;
  release(): void;
}

export function createEar(emit: (event: EarEvent) => void, live: Pick<LiveSound, "atMs">): Ear {
  let microphone: Microphone | null = null;
  let round = 0;
  let watchdog: ReturnType<typeof setInterval> | null = null;
  const rest = () => {
    if (watchdog) clearInterval(watchdog);
    watchdog = null;
  };
  const release = () => {
    round += 1;
    rest();
    microphone?.close();
    microphone = null;
  };
  return {
    get microphone() {
      return microphone;
    },
    async open() {
      release();
      const mine = round;
      try {
        const opened = await openMicrophone((cause) => mine === round && emit({ kind: "interrupted", cause }));
        if (mine !== round) {
          opened.close();
          return null;
        }
        microphone = opened;
        return opened;
      } catch (fault) {
        const why = fault instanceof MicrophoneUnavailable ? fault.why : "unsupported";
        if (mine === round) emit({ kind: "unavailable", why });
        return null;
      }
    },
    listen(sound) {
      rest();
      microphone?.listen(sound);
      live.atMs = performance.now();
      watchdog = setInterval(() => {
        if (performance.now() - live.atMs > stallMs) emit({ kind: "interrupted", cause: "stalled" });
      }, lookEveryMs);
    },
    rest,
    async finish() {
      const open = microphone;
      rest();
      const ended = (await open?.finish()) ?? false;
      if (open !== microphone) return null;
      microphone = null;
      return ended;
    },
    release,
  };
}
