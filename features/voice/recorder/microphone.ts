import { countIn } from "./countIn";
import type { Interruption, Processing, Unavailable } from "./recorder";

export class MicrophoneUnavailable extends Error {
  constructor(readonly why: Unavailable) {
    super(`The microphone is not available: ${why}`);
  }
}

export interface Microphone {
  sampleRate: number;
  /** what the browser does to the sound although it was asked not to */
  processed: Processing[];
  /** Counts the singer in; ends early where the microphone is closed. */
  countIn(onBeat: (left: number) => void): Promise<void>;
  /** From here on the sound flows into `sound`, as `TakeSound`. */
  listen(sound: MessagePort): void;
  /** Lets the last block through, then lets go of the microphone. False where the sound had broken off without an end. */
  finish(): Promise<boolean>;
  /** Lets go of the microphone at once. */
  close(): void;
}

const plainSound = { echoCancellation: false, noiseSuppression: false, autoGainControl: false } as const;
const names: Record<keyof typeof plainSound, Processing> = {
  echoCancellation: "echo cancellation",
  noiseSuppression: "noise suppression",
  autoGainControl: "automatic gain",
};
/** The worklet answers within a render quantum; a context that was taken away never answers. */
const flushMs = 500;

/**
 * Opens the microphone without voice processing. Its sound goes nowhere until `listen` says where to.
 *
 * @throws MicrophoneUnavailable with the reason
 */
export async function openMicrophone(onInterrupted: (cause: Interruption) => void): Promise<Microphone> {
  if (!window.isSecureContext) throw new MicrophoneUnavailable("insecure");
  if (!navigator.mediaDevices?.getUserMedia || typeof AudioWorkletNode === "undefined") {
    throw new MicrophoneUnavailable("unsupported");
  }
  const stream = await askFor();
  const track = stream.getAudioTracks()[0];
  if (!track) throw new MicrophoneUnavailable("no-microphone");
  const context = new AudioContext();
  const watch = new AbortController();
  const close = () => {
    watch.abort();
    for (const each of stream.getTracks()) each.stop();
    if (context.state !== "closed") void context.close().catch(() => undefined);
  };
  try {
    await context.audioWorklet.addModule("/worklets/takeTap.js");
    if (context.state === "suspended") await context.resume();
    const node = new AudioWorkletNode(context, "take-tap", {
      numberOfOutputs: 1,
      channelCount: 1,
      channelCountMode: "explicit",
      channelInterpretation: "speakers",
    });
    // Some browsers only pull nodes that lead to the speakers; the tap writes nothing there.
    context.createMediaStreamSource(stream).connect(node).connect(context.destination);
    watchFor(context, track, onInterrupted, watch.signal);
    return {
      sampleRate: context.sampleRate,
      processed: stillProcessed(track.getSettings()),
      countIn: (onBeat) => countIn(context, onBeat, watch.signal),
      listen: (sound) => node.port.postMessage({ kind: "connect", port: sound }, [sound]),
      close,
      finish: () => flush(node.port).finally(close),
    };
  } catch {
    close();
    throw new MicrophoneUnavailable("unsupported");
  }
}

async function askFor(): Promise<MediaStream> {
  try {
    return await navigator.mediaDevices.getUserMedia({ audio: { ...plainSound } });
  } catch (fault) {
    throw new MicrophoneUnavailable(reasonOf(fault));
  }
}

function reasonOf(fault: unknown): Unavailable {
  const name = fault instanceof DOMException ? fault.name : "";
  if (name === "NotAllowedError" || name === "SecurityError") return "refused";
  if (name === "NotFoundError" || name === "OverconstrainedError") return "no-microphone";
  return name === "NotReadableError" || name === "AbortError" ? "busy" : "unsupported";
}

function stillProcessed(settings: MediaTrackSettings): Processing[] {
  const kept = (key: keyof typeof plainSound) => settings[key] !== undefined && String(settings[key]) !== "false";
  return (Object.keys(names) as (keyof typeof plainSound)[]).filter(kept).map((key) => names[key]);
}

function watchFor(
  context: AudioContext,
  track: MediaStreamTrack,
  onInterrupted: (cause: Interruption) => void,
  signal: AbortSignal,
): void {
  const on = { signal };
  track.addEventListener("ended", () => onInterrupted("unplugged"), on);
  track.addEventListener("mute", () => onInterrupted("muted"), on);
  // "interrupted" (a call, another app) must not be resumed by the page: the take ends here.
  context.addEventListener("statechange", () => context.state !== "running" && onInterrupted("taken"), on);
  navigator.mediaDevices.addEventListener(
    "devicechange",
    () => track.readyState === "ended" && onInterrupted("unplugged"),
    on,
  );
  document.addEventListener("visibilitychange", () => document.hidden && onInterrupted("hidden"), on);
}

function flush(port: MessagePort): Promise<boolean> {
  return new Promise((resolve) => {
    const late = setTimeout(() => resolve(false), flushMs);
    port.onmessage = ({ data }: MessageEvent<{ kind: string }>) => {
      if (data.kind !== "finished") return;
      clearTimeout(late);
      resolve(true);
    };
    port.postMessage({ kind: "finish" });
  });
}
