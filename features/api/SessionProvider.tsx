import { useEffect, useSyncExternalStore, type ReactNode } from "react";
import { moveIn } from "./moveIn";
import { session, type Session } from "./session";

/** Who is here: `status` "unknown" | "visitor" | "signed-in", and the `account`. */
export function useSession(): Session {
  return useSyncExternalStore(session.subscribe, session.current, session.current);
}

async function settleAndResume(): Promise<void> {
  try {
    if ((await session.settled()).status === "signed-in") await moveIn.resume();
  } catch {
    // The session keeps the problem for the screens; the next "online" event tries again.
  }
}

/** Finds out who is here, follows other tabs, and finishes a move into the account that was interrupted. */
export function SessionProvider({ children }: { children: ReactNode }) {
  useEffect(() => {
    const unfollow = session.followOtherTabs();
    const again = () => void settleAndResume();
    again();
    window.addEventListener("online", again);
    return () => {
      unfollow();
      window.removeEventListener("online", again);
    };
  }, []);
  return children;
}
