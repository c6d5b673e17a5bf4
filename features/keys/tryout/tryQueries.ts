import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { useEffect } from "react";
import { ApiError } from "@/features/api/apiError";
import { shelf } from "@/features/api/shelf";
import type { Try } from "@/shared/contract/try";
import { dropWaiting, keepTry, sendWaiting, waitingTries } from "./waitingTries";

/** A try and whether it still waits on this device. */
export interface KnownTry extends Try {
  waiting: boolean;
}

const newestFirst = (a: Try, b: Try) => b.sungAt.localeCompare(a.sungAt);

export const tryQueries = {
  all: () => queryOptions({ queryKey: ["tries"], queryFn: allTries }),
};

/** Everything that was tried, newest first; without a connection what waits on this device. */
async function allTries(): Promise<KnownTry[]> {
  const waiting = await waitingTries();
  const kept = await shelf.list("tries").catch((fault: unknown) => {
    if (fault instanceof ApiError && fault.code === "offline" && waiting.length > 0) return [];
    throw fault;
  });
  const ids = new Set(waiting.map(({ id }) => id));
  return [
    ...waiting.map((each) => ({ ...each, waiting: true })),
    ...kept.filter(({ id }) => !ids.has(id)).map((each) => ({ ...each, waiting: false })),
  ].sort(newestFirst);
}

export function useKeepTry() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (item: Try) => ({ item, kept: await keepTry(item) }),
    onSuccess: ({ item, kept }) => {
      // What is known stays known where nothing can be asked for anew.
      client.setQueryData(tryQueries.all().queryKey, (known) =>
        [{ ...item, waiting: kept === "waiting" }, ...(known ?? []).filter(({ id }) => id !== item.id)].sort(
          newestFirst,
        ),
      );
      if (kept === "kept") void client.invalidateQueries({ queryKey: ["tries"] });
    },
  });
}

/** Takes a try out again: the keys are then ranked as they were without it. */
export function useRemoveTry() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async ({ id, waiting }: KnownTry) => {
      if (!waiting) await shelf.remove("tries", id);
      await dropWaiting(id);
    },
    onSuccess: async (_, { id }) => {
      client.setQueryData(tryQueries.all().queryKey, (known) => (known ?? []).filter((each) => each.id !== id));
      await client.invalidateQueries({ queryKey: ["tries"] });
    },
  });
}

const againMs = 20_000;

/** Sends what waits on this device as soon as the connection is back. */
export function useSendWaiting(some: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    const send = () =>
      void sendWaiting()
        .then((sent) => (sent ? client.invalidateQueries({ queryKey: ["tries"] }) : undefined))
        .catch(() => undefined);
    send();
    window.addEventListener("online", send);
    const timer = some ? setInterval(send, againMs) : null;
    return () => {
      window.removeEventListener("online", send);
      if (timer !== null) clearInterval(timer);
    };
  }, [client, some]);
}
