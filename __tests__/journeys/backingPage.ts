import { createBacking } from "@/features/keys/backing/createBacking";
import { createBackingSounds } from "@/features/keys/backing/backingSounds";
import type { BackingPlan } from "@/shared/songs/backing/backingPlan";
import { chromaOf } from "./chroma";
import { findOnsets } from "./onsets";

interface Rendered {
  onsets: number[];
  peak: number;
  /** root of the mean square while the song is played, and the peak of the quietest click of the count-in */
  rms: number;
  quietestClick: number;
  /** pitch classes of the first chords as they sound, C first */
  chromas: { name: string; chroma: number[] }[];
  renderedMs: number;
}

const mostChords = 12;

interface Round {
  least: number;
  most: number;
  pausedAt: number;
  resumedAt: number;
  silent: number | null;
  stopped: number | null;
}

/** Renders the beginning of a plan in an offline context, and tells when something is struck in it. */
async function render(plan: BackingPlan, seconds: number, sampleRate: number): Promise<Rendered> {
  const context = new OfflineAudioContext(1, seconds * sampleRate, sampleRate);
  createBacking(plan, context).start();
  const begun = performance.now();
  const pcm = (await context.startRendering()).getChannelData(0);
  const renderedMs = performance.now() - begun;
  const cut = (fromS: number, endS: number) =>
    pcm.subarray(Math.round(fromS * sampleRate), Math.round(endS * sampleRate));
  const peakOf = (part: Float32Array) => part.reduce((most, x) => Math.max(most, Math.abs(x)), 0);
  const clicks = plan.events.filter(({ kind, at }) => kind === "click" && at < plan.countInS);
  const played = cut(plan.countInS, Math.min(seconds, plan.durationS));
  const chords = plan.chords.flatMap(({ at, name }, k) => {
    const end = plan.chords[k + 1]?.at ?? plan.durationS;
    return name !== null && end < seconds && end - at > 0.5
      ? [{ name, chroma: chromaOf(cut(at, end), sampleRate) }]
      : [];
  });
  return {
    onsets: findOnsets(pcm, sampleRate),
    peak: peakOf(pcm),
    rms: Math.sqrt(played.reduce((sum, x) => sum + x * x, 0) / played.length),
    quietestClick: Math.min(...clicks.map(({ at }) => peakOf(cut(at, at + 0.05)))),
    chromas: chords.slice(0, mostChords),
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
  // As on a page where nothing was pressed yet: browsers let its sound run from the first press on.
  await context.suspend();
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

/** Goes round in a stretch, pauses, goes on and stops; tells where it was heard to be. */
async function goRound(plan: BackingPlan, loop: { at: number; end: number }): Promise<Round> {
  const context = new AudioContext();
  const backing = createBacking(plan, context);
  backing.start({ from: loop.at, loop, countIn: false });
  const places: number[] = [];
  const turns = () => places.filter((place, k) => k > 0 && place < places[k - 1]! - 1e-3).length;
  while (turns() < 2) {
    await new Promise((next) => setTimeout(next, 20));
    places.push(backing.heard()!);
  }
  backing.pause();
  const silent = backing.heard();
  const pausedAt = places.at(-1)!;
  backing.resume();
  const resumedAt = backing.heard()!;
  backing.stop();
  const stopped = backing.heard();
  await context.close();
  return { least: Math.min(...places), most: Math.max(...places), pausedAt, resumedAt, silent, stopped };
}

Object.assign(window, { render, waitForPress, goRound });
