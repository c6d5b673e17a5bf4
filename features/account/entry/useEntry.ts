import { useState, useSyncExternalStore } from "react";
import { ApiError } from "@/features/api/apiError";
import { moveIn, type MoveInState } from "@/features/api/moveIn";
import { session } from "@/features/api/session";
import type { SignInRequest } from "@/shared/contract/account";

export type EntryKind = "sign-up" | "sign-in";

interface Entry {
  /** from the first request until the last item has moved */
  entering: boolean;
  progress: MoveInState;
  /** the last address that was sent */
  email: string;
  /** the password was right; a code is asked for */
  asksCode: boolean;
  /** why the password is asked for again; null where it is not */
  again: string | null;
  enter: (credentials: SignInRequest) => Promise<void>;
  secondStep: (code: string) => Promise<void>;
  back: () => void;
}

/** Opens the session and then moves in what is on the device. Rejects with ApiError where the session was refused. */
export function useEntry(kind: EntryKind): Entry {
  const [entering, setEntering] = useState(false);
  const [email, setEmail] = useState("");
  const [challenge, setChallenge] = useState<string | null>(null);
  const [again, setAgain] = useState<string | null>(null);
  const progress = useSyncExternalStore(moveIn.subscribe, moveIn.state, moveIn.state);

  async function during(work: () => Promise<void>) {
    setEntering(true);
    try {
      await work();
    } finally {
      setEntering(false);
    }
  }

  return {
    entering,
    progress,
    email,
    asksCode: challenge !== null,
    again,
    enter: (credentials) =>
      during(async () => {
        setAgain(null);
        setEmail(credentials.email);
        const asked = await (kind === "sign-up" ? session.signUp(credentials) : session.signIn(credentials));
        if (asked) setChallenge(asked.challenge);
        else await (kind === "sign-up" ? moveIn.afterSignUp() : moveIn.afterSignIn());
      }),
    secondStep: (code) =>
      during(async () => {
        try {
          await session.secondStep({ challenge: challenge ?? "", code });
        } catch (error) {
          if (!(error instanceof ApiError) || error.code !== "challenge-expired") throw error;
          setChallenge(null);
          setAgain(error.message);
          return;
        }
        await moveIn.afterSignIn();
      }),
    back: () => setChallenge(null),
  };
}
