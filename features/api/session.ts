import type { Account, SessionResponse, SignInRequest, SignUpRequest } from "@/shared/contract/account";
import { ApiError } from "./apiError";
import { http } from "./httpClient";
import { sessionHint } from "./sessionHint";

/** Who is here. "unknown" until the server was asked; `ended` says that the last session here ran out without being signed out. */
export interface Session {
  status: "unknown" | "visitor" | "signed-in";
  account: Account | null;
  ended: boolean;
  /** why it is still unknown, where the server could not be asked */
  problem: ApiError | null;
}

let current: Session = { status: "unknown", account: null, ended: false, problem: null };
let settling: Promise<Session> | null = null;
const listeners = new Set<() => void>();

function publish(next: Session): Session {
  current = next;
  for (const listener of [...listeners]) listener();
  return next;
}

function visitor(ended: boolean): Session {
  if (ended) sessionHint.end();
  else sessionHint.clear();
  return publish({ status: "visitor", account: null, ended, problem: null });
}

function signedIn(answer: SessionResponse): Session {
  sessionHint.set();
  const same = JSON.stringify(current.account) === JSON.stringify(answer.account);
  return same ? current : publish({ status: "signed-in", account: answer.account, ended: false, problem: null });
}

http.onSession((answer) => {
  if (answer) signedIn(answer);
  else if (current.status !== "visitor") visitor(sessionHint.present() || sessionHint.ended());
});

async function ask(): Promise<Session> {
  if (!sessionHint.present()) return visitor(sessionHint.ended());
  try {
    await http.refresh();
  } catch (error) {
    const problem = error instanceof ApiError ? error : ApiError.offline();
    publish({ ...current, problem });
    throw problem;
  }
  return current;
}

/** The session once it is known. Rejects with ApiError while the server cannot be asked; asking again tries again. */
function settled(): Promise<Session> {
  if (current.status !== "unknown") return Promise.resolve(current);
  settling ??= ask().finally(() => {
    settling = null;
  });
  return settling;
}

async function signOut(): Promise<void> {
  await http.authenticate("/auth/sign-out");
  visitor(false);
}

/** Another tab signed in or out: this one follows. */
function followOtherTabs(): () => void {
  return sessionHint.onChange((change) => {
    if (change !== "opened" && current.status === "signed-in") {
      http.forget();
      visitor(change === "ended");
    } else if (change === "signed-out" && current.ended) {
      visitor(false);
    } else if (change === "opened" && current.status === "visitor") {
      http.refresh().catch(() => undefined);
    }
  });
}

/** The session of this tab, as a module store. */
export const session = {
  current: () => current,
  subscribe(listener: () => void): () => void {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  },
  settled,
  signUp: async (request: SignUpRequest) =>
    signedIn(await http.authenticate<SessionResponse>("/auth/sign-up", request)),
  signIn: async (request: SignInRequest) =>
    signedIn(await http.authenticate<SessionResponse>("/auth/sign-in", request)),
  signOut,
  /** Whoever was signed in here goes on as a visitor. */
  stayOut: () => void visitor(false),
  followOtherTabs,
};
