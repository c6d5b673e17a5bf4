import { useState, useSyncExternalStore } from "react";
import { moveIn, type MoveInState } from "@/features/api/moveIn";
import { session } from "@/features/api/session";
import type { SignInRequest } from "@/shared/contract/account";

export type EntryKind = "sign-up" | "sign-in";

interface Entry {
  /** from the first request until the last item has moved */
  entering: boolean;
  progress: MoveInState;
  enter: (credentials: SignInRequest) => Promise<void>;
}

/** Opens the session and then moves in what is on the device. Rejects with ApiError where the session was refused. */
export function useEntry(kind: EntryKind): Entry {
  const [entering, setEntering] = useState(false);
  const progress = useSyncExternalStore(moveIn.subscribe, moveIn.state, moveIn.state);
  return {
    entering,
    progress,
    async enter(credentials) {
      setEntering(true);
      try {
        if (kind === "sign-up") {
          await session.signUp(credentials);
          await moveIn.afterSignUp();
        } else {
          await session.signIn(credentials);
          await moveIn.afterSignIn();
        }
      } finally {
        setEntering(false);
      }
    },
  };
}
