import type { WaysQuestion } from "@/shared/ways/wayCandidates";
import type { Way } from "@/shared/ways/way";

/** What the worker says: that it listens, and one answer for each question. */
export type WayAnswer = { ready: true } | { ways: Way[] } | { fault: string };

interface Asked {
  question: WaysQuestion;
  signal: AbortSignal | undefined;
  done: (ways: Way[]) => void;
  fail: (reason: unknown) => void;
}

const unopened = "The search for ways could not be opened here. Check your connection and try again.";
const waiting: Asked[] = [];
let running: Asked | null = null;
let opened: { worker: Worker; ready: Promise<void> } | null = null;

/**
 * Searches beside the page, one question after the other, so that the page never waits. What is no longer wanted when
 * its turn comes is not searched.
 */
export function searchWays(question: WaysQuestion, signal?: AbortSignal): Promise<Way[]> {
  if (typeof Worker === "undefined") return Promise.reject(new Error(unopened));
  return new Promise<Way[]>((done, fail) => {
    waiting.push({ question, signal, done, fail });
    ask();
  });
}

/** Opens the search before it is wanted, so that it also works when the connection is gone by then. */
export async function openWaySearch(): Promise<void> {
  if (typeof Worker !== "undefined") await open().ready;
}

function ask(): void {
  while (!running) {
    const next = waiting.shift();
    if (!next) return;
    if (next.signal?.aborted) next.fail(next.signal.reason);
    else {
      running = next;
      open().worker.postMessage(next.question);
    }
  }
}

/** One worker for as long as the page lives; it is bundled apart (metro.config.js), as pages share its modules. */
function open(): NonNullable<typeof opened> {
  if (opened) return opened;
  const worker = new Worker("/worklets/wayWorker.js");
  const ready = new Promise<void>((listens, fails) => {
    worker.onmessage = ({ data }: MessageEvent<WayAnswer>) => {
      if ("ready" in data) {
        listens();
        return;
      }
      const asked = running;
      running = null;
      if ("ways" in data) asked?.done(data.ways);
      else asked?.fail(new Error(data.fault));
      ask();
    };
    worker.onerror = () => {
      worker.terminate();
      opened = null;
      const lost = [...(running ? [running] : []), ...waiting.splice(0)];
      running = null;
      const reason = new Error(unopened);
      for (const { fail } of lost) fail(reason);
      fails(reason);
    };
  });
  // Whoever asks is told by the question that failed.
  ready.catch(() => undefined);
  opened = { worker, ready };
  return opened;
}
