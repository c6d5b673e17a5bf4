import { pluckString, type StringSound } from "@/shared/music/pluckedString";

/** How strings of steel and of nylon ring. */
const sounds = {
  steel: { decayS: 3, bright: 0.6, lengthS: 3 },
  nylon: { decayS: 1.8, bright: 0.28, lengthS: 2.2 },
} as const satisfies Record<string, StringSound>;

export type StringKind = keyof typeof sounds;

const level = 0.5;

export interface StringPlayer {
  /** Plucks a string now, or `inS` seconds from now. */
  pluck(midi: number, kind: StringKind, inS?: number): void;
  stop(): void;
  close(): void;
}

/** Opened with a press, because browsers let a page sound only then. Silent where the browser has no Web Audio. */
export function createStringPlayer(): StringPlayer {
  const context = typeof AudioContext === "undefined" ? null : new AudioContext();
  const sounding = new Set<AudioBufferSourceNode>();
  const stop = () => {
    for (const source of sounding) source.stop();
    sounding.clear();
  };
  return {
    pluck(midi, kind, inS = 0) {
      if (!context) return;
      if (context.state === "suspended") void context.resume().catch(() => undefined);
      const pcm = pluckString(midi, context.sampleRate, sounds[kind]);
      const buffer = context.createBuffer(1, pcm.length, context.sampleRate);
      buffer.copyToChannel(pcm, 0);
      const source = new AudioBufferSourceNode(context, { buffer });
      source.connect(new GainNode(context, { gain: level })).connect(context.destination);
      source.onended = () => sounding.delete(source);
      sounding.add(source);
      source.start(context.currentTime + 0.02 + inS);
    },
    stop,
    close() {
      stop();
      if (context && context.state !== "closed") void context.close().catch(() => undefined);
    },
  };
}
