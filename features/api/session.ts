import type {
  Account,
  ChallengeResponse,
  SessionResponse,
  SignInRequest,
  SignUpRequest,
} from "@/shared/contract/account";
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

/** What is asked next after a right password: nothing, or a code. */
function entered(answer: SessionResponse | ChallengeResponse): ChallengeResponse | null {
  if ("challenge" in answer) return answer;
  signedIn(answer);
  return null;
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
  /** Resolves to the challenge where a code is needed as well, to null once signed in. */
  signUp: async (request: SignUpRequest) =>
    entered(await http.authenticate<SessionResponse | ChallengeResponse>("/auth/sign-up", request)),
  /** Resolves to the challenge where a code is needed as well, to null once signed in. */
  signIn: async (request: SignInRequest) =>
    entered(await http.authenticate<SessionResponse | ChallengeResponse>("/auth/sign-in", request)),
  /** The code that was asked for after the password: six digits, or a recovery code. */
  secondStep: async (request: { challenge: string; code: string }) =>
    void signedIn(await http.authenticate<SessionResponse>("/auth/second-step", request)),
  signOut,
  /** Something about the account changed: its address was confirmed, codes were switched on. */
  accountChanged(account: Account): void {
    if (current.account?.id === account.id) publish({ ...current, account });
  },
  /** The server has ended this session on the person's own wish. */
  leave(): void {
    http.forget();
    visitor(false);
  },
  /** Whoever was signed in here goes on as a visitor. */
  stayOut: () => void visitor(false),
  followOtherTabs,
};
