import { QueryClient } from "@tanstack/react-query";
import { ApiError } from "./apiError";
import { session } from "./session";

/** A request that was refused, or a device that keeps nothing, will not do better at once; a stumbling server may. */
function retry(failures: number, error: Error): boolean {
  return failures < 2 && error instanceof ApiError && error.status >= 500;
}

/** The one query client. "always": a visitor's shelf is on the device and works without a network. */
export const queryClient = new QueryClient({
  defaultOptions: {
    queries: { staleTime: 30_000, gcTime: 10 * 60_000, retry, networkMode: "always" },
    mutations: { retry: false, networkMode: "always" },
  },
});

let owner: string | null | undefined;

/** One person's answers must never be shown to the next: what is on screen is asked for anew, the rest is dropped. */
function changeOwner(): void {
  const { status, account } = session.current();
  if (status === "unknown") return;
  const next = account?.id ?? null;
  const changed = owner !== undefined && owner !== next;
  owner = next;
  if (!changed) return;
  queryClient.getMutationCache().clear();
  queryClient.removeQueries({ type: "inactive" });
  void queryClient.resetQueries({ type: "active" });
}

session.subscribe(changeOwner);
changeOwner();
