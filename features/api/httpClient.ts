import type { Problem } from "@/shared/contract/problem";
import type { ChallengeResponse, SessionResponse } from "@/shared/contract/account";
import { ApiError } from "./apiError";

const waitMs = 20_000;
/** A token is renewed a little before its end, so that no request has to fail first. */
const marginMs = 15_000;

interface Access {
  token: string;
  endsAt: number;
}

let access: Access | null = null;
let refreshing: Promise<SessionResponse | null> | null = null;
let tail: Promise<unknown> = Promise.resolve();
const listeners = new Set<(answer: SessionResponse | null) => void>();

/** Told about every renewed session, and with null when the server no longer knows the session. */
function onSession(listener: (answer: SessionResponse | null) => void): () => void {
  listeners.add(listener);
  return () => void listeners.delete(listener);
}

function adopt(answer: SessionResponse | null): void {
  access = answer && { token: answer.accessToken, endsAt: Date.now() + answer.expiresInS * 1000 - marginMs };
}

/** One after the other over all tabs, because they share one rotating cookie. */
async function exclusively<T>(work: () => Promise<T>): Promise<T> {
  const locks = typeof navigator === "undefined" ? undefined : navigator.locks;
  if (locks) return locks.request("larkspan-session", work);
  const turn = tail.then(work, work);
  tail = turn.catch(() => undefined);
  return turn;
}

async function problemOf(answer: Response): Promise<ApiError> {
  const body = (await answer.json().catch(() => null)) as Partial<Problem> | null;
  if (typeof body?.code === "string" && typeof body.message === "string")
    return new ApiError(answer.status, body.code, body.message, Array.isArray(body.fields) ? body.fields : []);
  // A proxy in between answers with these when the server itself is away.
  if (answer.status >= 502 && answer.status <= 504) return ApiError.offline();
  return new ApiError(
    answer.status,
    "unexpected",
    "Something went wrong at our end. What you entered is still here; try again.",
  );
}

async function send(method: string, path: string, body: unknown, token: string | null): Promise<Response> {
  const headers: Record<string, string> = { Accept: "application/json" };
  if (body !== undefined) headers["Content-Type"] = "application/json";
  if (token !== null) headers["Authorization"] = `Bearer ${token}`;
  const stop = new AbortController();
  const timer = setTimeout(() => stop.abort(), waitMs);
  try {
    return await fetch(`/api${path}`, {
      method,
      headers,
      credentials: "same-origin",
      signal: stop.signal,
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
  } catch {
    throw ApiError.offline();
  } finally {
    clearTimeout(timer);
  }
}

async function read<T>(answer: Response): Promise<T> {
  if (!answer.ok) throw await problemOf(answer);
  if (answer.status === 204) return undefined as T;
  return (await answer.json().catch(() => {
    // A wish that was taken up has nothing more to say.
    if (answer.status === 202) return undefined;
    throw new ApiError(answer.status, "unexpected", "The answer could not be read. Try again.");
  })) as T;
}

/** Asks for a fresh access token. Many callers, one request. Resolves to null when the server knows no session. */
function refresh(): Promise<SessionResponse | null> {
  const before = access;
  refreshing ??= exclusively(async () => {
    if (access !== before) return null;
    const answer = await send("POST", "/auth/refresh", undefined, null);
    const session = answer.status === 401 ? null : await read<SessionResponse>(answer);
    adopt(session);
    for (const listener of listeners) listener(session);
    return session;
  }).finally(() => {
    refreshing = null;
  });
  return refreshing;
}

async function answerTo(method: string, path: string, body?: unknown): Promise<Response> {
  if (access && Date.now() > access.endsAt) await refresh();
  const used = access?.token ?? null;
  const answer = await send(method, path, body, used);
  if (answer.status !== 401 || used === null) return answer;
  if (access?.token === used) await refresh();
  const renewed: string | null = access?.token ?? null;
  return renewed === null ? answer : send(method, path, body, renewed);
}

/** For what is sent in another way than by this client: the header by which the server knows who asks; null for nobody. */
async function authorization(): Promise<string | null> {
  if (access && Date.now() > access.endsAt) await refresh();
  return access && `Bearer ${access.token}`;
}

async function request<T>(method: string, path: string, body?: unknown): Promise<T> {
  return read<T>(await answerTo(method, path, body));
}

/** A file instead of JSON. */
async function download(path: string): Promise<Blob> {
  const answer = await answerTo("GET", path);
  if (!answer.ok) throw await problemOf(answer);
  return answer.blob().catch(() => {
    throw ApiError.offline();
  });
}

/** Opens or ends a session: no bearer token, no renewal, and never at the same time as a refresh. */
function authenticate<T extends SessionResponse | ChallengeResponse | undefined>(
  path: string,
  body?: unknown,
): Promise<T> {
  return exclusively(async () => {
    const answer = await read<T>(await send("POST", path, body, null));
    adopt(answer && "accessToken" in answer ? answer : null);
    return answer;
  });
}

/** Of whoever is not signed in, and that opens nothing. */
async function open<T>(path: string, body?: unknown): Promise<T> {
  return read<T>(await send("POST", path, body, null));
}

/** The one HTTP client: JSON under /api, the access token in memory only, every failure an ApiError. */
export const http = {
  get: <T>(path: string) => request<T>("GET", path),
  put: <T>(path: string, body: unknown) => request<T>("PUT", path, body),
  post: <T>(path: string, body?: unknown) => request<T>("POST", path, body),
  delete: (path: string) => request<void>("DELETE", path),
  /** a POST without the access token */
  open,
  download,
  authorization,
  authenticate,
  refresh,
  onSession,
  forget: () => adopt(null),
};
