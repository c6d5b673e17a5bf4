import { createStore, del, entries, set } from "idb-keyval";
import { ApiError } from "@/features/api/apiError";
import { session } from "@/features/api/session";
import { shelf } from "@/features/api/shelf";
import type { Try } from "@/shared/contract/try";

/** A try that the server could not be given yet, and whose account it belongs to. */
interface Waiting {
  account: string | null;
  item: Try;
}

const storeOf = (() => {
  let store: ReturnType<typeof createStore> | null = null;
  return () => (store ??= createStore("larkspan-waiting-tries", "tries"));
})();

/** Where a try went: to its shelf, or into this device until the connection is back. */
export type Kept = "kept" | "waiting";

/** Keeps a try; without a connection it waits on this device. Rejects where it can be kept nowhere. */
export async function keepTry(item: Try): Promise<Kept> {
  try {
    await shelf.put("tries", item);
    await del(item.id, storeOf()).catch(() => undefined);
    return "kept";
  } catch (fault) {
    if (!mayPass(fault)) throw fault;
    await set(item.id, { account: accountId(), item } satisfies Waiting, storeOf()).catch(() => {
      throw fault;
    });
    return "waiting";
  }
}

/** The tries of whoever is here that wait on this device. */
export async function waitingTries(): Promise<Try[]> {
  try {
    const all = await entries<string, Waiting>(storeOf());
    return all.flatMap(([, { account, item }]) => (account === accountId() ? [item] : []));
  } catch {
    // Without the device's storage nothing can have been left in it.
    return [];
  }
}

export async function dropWaiting(id: string): Promise<void> {
  await del(id, storeOf()).catch(() => undefined);
}

/** Sends what waits; true where anything was sent. What is refused for good is dropped. */
export async function sendWaiting(): Promise<boolean> {
  let sent = false;
  for (const item of await waitingTries()) {
    try {
      await shelf.put("tries", item);
    } catch (fault) {
      if (mayPass(fault)) return sent;
    }
    await dropWaiting(item.id);
    sent = true;
  }
  return sent;
}

/** The server may take it later: it could not be reached, or it stumbled. */
function mayPass(fault: unknown): boolean {
  return fault instanceof ApiError && !fault.refused && (fault.code === "offline" || fault.status >= 500);
}

function accountId(): string | null {
  return session.current().account?.id ?? null;
}
