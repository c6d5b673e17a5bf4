import { useCallback, useEffect, useReducer, useRef, useState } from "react";
import type { TuningPlan } from "@/shared/instruments/stringTuning";
import type { CreateTunerEar, TunerEar } from "./hearing/tunerEar";
import type { FromTunerWorker, ToTunerWorker } from "./hearing/tunerProtocol";
import { startTuner, tuner, type TunerEvent, type TunerState } from "./tunerState";

/** What the microphone does. */
export type TunerMicrophone =
  { step: "off" | "asking" } | { step: "on"; room: "quiet" | "noisy" | "sounding" } | { step: "failure"; why: string };

const noisyDb = -32;
/** The room gives a tone back for a moment. */
const deafMs = 300;

/** Joins microphone, worker and the machine of steps. While a tone sounds nothing is read. */
export function useTuner(plan: TuningPlan, a4: number, createEar: CreateTunerEar) {
  const [state, send] = useReducer((now: TunerState, event: TunerEvent) => tuner(plan, now, event), plan, startTuner);
  const [microphone, setMicrophone] = useState<TunerMicrophone>({ step: "off" });
  const parts = useRef<{ ear: TunerEar; worker: Worker } | null>(null);
  const deafUntil = useRef(0);

  const stop = useCallback(() => {
    parts.current?.ear.release();
    parts.current?.worker.terminate();
    parts.current = null;
    setMicrophone({ step: "off" });
  }, []);
  useEffect(() => stop, [stop]);

  const listen = useCallback(async () => {
    stop();
    setMicrophone({ step: "asking" });
    const live = { atMs: performance.now() };
    const fail = (why: string) => {
      stop();
      setMicrophone({ step: "failure", why });
    };
    const ear = createEar((event) => fail(event.kind === "unavailable" ? event.why : "interrupted"), live);
    const worker = new Worker("/worklets/tunerWorker.js");
    parts.current = { ear, worker };
    worker.onerror = () => fail("broken");
    worker.onmessage = ({ data }: MessageEvent<FromTunerWorker>) => {
      live.atMs = performance.now();
      if (data.kind === "broken") return fail("broken");
      const room = data.roomDb > noisyDb ? "noisy" : data.levelDb > data.roomDb + 8 ? "sounding" : "quiet";
      setMicrophone((now) => (now.step === "on" && now.room === room ? now : { step: "on", room }));
      if (data.readings.length > 0 && live.atMs > deafUntil.current)
        send({ kind: "heard", readings: data.readings, a4 });
    };
    const opened = await ear.open();
    if (!opened || parts.current?.ear !== ear) return;
    const { port1, port2 } = new MessageChannel();
    worker.postMessage({ kind: "begin", sampleRate: opened.sampleRate, sound: port2 } satisfies ToTunerWorker, [port2]);
    ear.listen(port1);
    setMicrophone({ step: "on", room: "quiet" });
  }, [a4, createEar, stop]);

  const hush = useCallback((forS: number) => {
    deafUntil.current = performance.now() + 1000 * forS + deafMs;
  }, []);
  return { state, send, microphone, listen, stop, hush };
}
