import type { Page } from "playwright-core";

/**
 * Puts a synthetic singer in the place of the microphone: a voice-like tone that the test tunes. When a note is set, an
 * inaudibly soft tone at 15 kHz marks the change in the sound itself, so that the moment at which the change comes out
 * of the device's way into the page can be seen apart from what the page makes of it.
 */
export async function singSynthetically(page: Page): Promise<void> {
  await page.addInitScript(() => {
    const openContext = window.AudioContext;
    const singer = { midi: 57, noteAtMs: 0, arrivedAtMs: 0, shownAtMs: 0, shown: "" };
    Object.assign(window, { singer });
    let voice: OscillatorNode;
    let mark: GainNode;
    let marked = 0;
    let graphs = 0;
    navigator.mediaDevices.getUserMedia = async () => {
      const context = new openContext();
      await context.resume();
      const partials = Float32Array.from([0, 1, 0.7, 0.5, 0.35, 0.25, 0.15, 0.1]);
      voice = new OscillatorNode(context, { frequency: 220 });
      voice.setPeriodicWave(context.createPeriodicWave(new Float32Array(partials.length), partials));
      const loud = new GainNode(context, { gain: 0.25 });
      mark = new GainNode(context, { gain: marked * 0.004 });
      const out = context.createMediaStreamDestination();
      voice.connect(loud).connect(out);
      const high = new OscillatorNode(context, { frequency: 15_000 });
      high.connect(mark).connect(out);
      voice.start();
      high.start();
      return out.stream;
    };
    // The page's own graph, with an ear beside it.
    const connectSource = openContext.prototype.createMediaStreamSource;
    openContext.prototype.createMediaStreamSource = function (stream) {
      const source = connectSource.call(this, stream);
      const ear = new AnalyserNode(this, { fftSize: 256, smoothingTimeConstant: 0 });
      source.connect(ear);
      const bins = new Float32Array(ear.frequencyBinCount);
      const bin = Math.round((15_000 * ear.fftSize) / this.sampleRate);
      const channel = new MessageChannel();
      graphs += 1;
      const graph = graphs;
      channel.port1.onmessage = () => {
        // The ear of a graph that was put away hears its last sound for ever.
        if (graph !== graphs) return;
        ear.getFloatFrequencyData(bins);
        const there = (bins[bin] ?? -Infinity) > -75;
        if (singer.noteAtMs > 0 && singer.arrivedAtMs === 0 && there === (marked === 1)) {
          singer.arrivedAtMs = performance.now();
        }
        setTimeout(() => channel.port2.postMessage(null), 1);
      };
      channel.port2.postMessage(null);
      return source;
    };
    const look = () => {
      const now = document.querySelector('[data-testid="note-now"]')?.textContent ?? "";
      if (now === singer.shown) return;
      singer.shown = now;
      if (singer.noteAtMs > 0 && singer.shownAtMs === 0 && now === (singer as { wanted?: string }).wanted) {
        // What is in the document now is on the screen with the next picture.
        requestAnimationFrame(() => {
          singer.shownAtMs = performance.now();
        });
      }
    };
    new MutationObserver(look).observe(document, { subtree: true, childList: true, characterData: true });
    Object.assign(window, {
      singNote(midi: number, name: string) {
        marked = 1 - marked;
        Object.assign(singer, { wanted: name, arrivedAtMs: 0, shownAtMs: 0, noteAtMs: performance.now() });
        voice.frequency.setValueAtTime(440 * 2 ** ((midi - 69) / 12), 0);
        mark.gain.setValueAtTime(marked * 0.004, 0);
      },
    });
  });
}

/** Sings one note and waits until the page names it; ms from the change to its arrival in the page, and on to the screen. */
export async function timeNote(
  page: Page,
  midi: number,
  name: string,
): Promise<{ deviceMs: number; screenMs: number }> {
  await page.evaluate(([m, n]) => (window as unknown as { singNote(m: number, n: string): void }).singNote(m, n), [
    midi,
    name,
  ] as [number, string]);
  type Singer = { noteAtMs: number; arrivedAtMs: number; shownAtMs: number };
  const at = await page
    .waitForFunction(() => {
      const { singer } = window as unknown as { singer: Singer };
      return singer.arrivedAtMs > 0 && singer.shownAtMs > 0 ? { ...singer } : null;
    })
    .then((handle) => handle.jsonValue() as Promise<Singer>);
  return { deviceMs: at.arrivedAtMs - at.noteAtMs, screenMs: at.shownAtMs - at.arrivedAtMs };
}

/** Collects the main thread's long tasks (50 ms and more) from now on. */
export async function watchLongTasks(page: Page): Promise<() => Promise<number[]>> {
  await page.evaluate(() => {
    const tasks: number[] = [];
    Object.assign(window, { longTasks: tasks });
    new PerformanceObserver((list) =>
      list.getEntries().forEach((entry) => tasks.push(Math.round(entry.duration))),
    ).observe({ entryTypes: ["longtask"] });
  });
  return () =>
    page.evaluate(() => {
      const { longTasks } = window as unknown as { longTasks: number[] };
      return longTasks.splice(0);
    });
}
