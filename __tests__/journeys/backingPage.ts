import { createBacking } from "@/features/keys/backing/createBacking";
import { createBackingSounds } from "@/features/keys/backing/backingSounds";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { findOnsets } from "./onsets";

interface Rendered {
  onsets: number[];
  peak: number;
  renderedMs: number;
}

/** Renders the beginning of a plan in an offline context, and tells when something is struck in it. */
async function render(plan: BackingPlan, seconds: number, sampleRate: number): Promise<Rendered> {
  const context = new OfflineAudioContext(1, seconds * sampleRate, sampleRate);
  createBacking(plan, context).start();
  const begun = performance.now();
  const pcm = (await context.startRendering()).getChannelData(0);
  const renderedMs = performance.now() - begun;
  return {
    onsets: findOnsets(pcm, sampleRate),
    peak: pcm.reduce((most, x) => Math.max(most, Math.abs(x)), 0),
    renderedMs,
  };
}

/** Puts a button on the page that plays the plan, and tells how long the first sound took from the press. */
async function waitForPress(plan: BackingPlan): Promise<void> {
  const context = new AudioContext({ latencyHint: "interactive" });
  const backing = createBacking(plan, context, createBackingSounds(context));
  const begun = performance.now();
  await backing.prepare();
  const preparedMs = performance.now() - begun;
  const button = document.body.appendChild(document.createElement("button"));
  button.textContent = "Play";
  button.onclick = ({ timeStamp }) => {
    const at = backing.start();
    const startedMs = performance.now() - timeStamp;
    const look = new MessageChannel();
    look.port1.onmessage = () => {
      if (context.currentTime < at) {
        look.port2.postMessage(null);
        return;
      }
      const latencyMs = 1000 * backing.latencyS();
      Object.assign(window, {
        pressed: { preparedMs, startedMs, latencyMs, soundMs: performance.now() - timeStamp + latencyMs },
      });
    };
    look.port2.postMessage(null);
  };
}

Object.assign(window, { render, waitForPress });
