import type { StringReading } from "@/shared/voice/pluckedString";

/** What the page tells the worker of the tuner; the sound comes through the port, in blocks. */
export interface ToTunerWorker {
  kind: "begin";
  sampleRate: number;
  sound: MessagePort;
}

/** Some ten times a second; `levelDb` is the sound's, `roomDb` what the room alone has. */
export type FromTunerWorker =
  { kind: "heard"; readings: StringReading[]; levelDb: number; roomDb: number } | { kind: "broken" };
