import { ApiError } from "./apiError";

const mostWaits = 20;

/** What the server prints, "/charts/pdf" or "/sheets/pdf". Where too many are asked for at once, it waits its turn. */
export async function printedPdf(path: string, body: object, signal: AbortSignal): Promise<Blob> {
  for (let waits = 0; ; waits += 1) {
    const answer = await ask(path, body, signal);
    if (answer.ok) return answer.blob();
    if (answer.status !== 429 || waits >= mostWaits) throw await problemOf(answer);
    const seconds = Math.min(60, Math.max(1, Number(answer.headers.get("Retry-After")) || 2));
    await pause(seconds * 1000, signal);
  }
}

async function ask(path: string, body: object, signal: AbortSignal): Promise<Response> {
  try {
    return await fetch(`/api${path}`, {
      method: "POST",
      headers: { "Content-Type": "application/json", Accept: "application/pdf, application/json" },
      credentials: "same-origin",
      body: JSON.stringify(body),
      signal,
    });
  } catch (error) {
    signal.throwIfAborted();
    throw error instanceof TypeError ? ApiError.offline() : error;
  }
}

async function problemOf(answer: Response): Promise<ApiError> {
  if (answer.status >= 502 && answer.status <= 504) return ApiError.offline();
  const body = (await answer.json().catch(() => null)) as { code?: string; message?: string } | null;
  return new ApiError(
    answer.status,
    body?.code ?? "unexpected",
    body?.message ?? "The page could not be made. Try again.",
  );
}

function pause(ms: number, signal: AbortSignal): Promise<void> {
  return new Promise((done, fail) => {
    const stop = () => {
      clearTimeout(clock);
      fail(signal.reason as Error);
    };
    const clock = setTimeout(() => {
      signal.removeEventListener("abort", stop);
      done();
    }, ms);
    signal.addEventListener("abort", stop, { once: true });
  });
}
