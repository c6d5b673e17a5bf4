import { ApiError } from "@/features/api/apiError";
import { queryClient } from "@/features/api/queryClient";
import { session } from "@/features/api/session";
import { forgetUnsent, keepUnsent, unsentOf, type UnsentTake } from "./unsentTakes";
import { uploadTake } from "./uploadTake";

/** Where a recording is on its way. */
export interface Sending {
  id: string;
  /** of the take it was made from; null for an answer */
  takeId: string | null;
  partId: string;
  title: string;
  bytes: number;
  sentBytes: number;
  /** "waiting": for the connection, goes on by itself; "refused": will not be taken as it is */
  state: "sending" | "waiting" | "sent" | "refused";
  /** why it was refused */
  message: string | null;
}

/** Waits between tries while there is no connection; the browser's "online" cuts them short. */
const waitsMs = [3000, 10_000, 30_000, 60_000];

let shown: readonly Sending[] = [];
const kept = new Map<string, UnsentTake>();
const tries = new Map<string, number>();
const timers = new Map<string, ReturnType<typeof setTimeout>>();
const running = new Set<string>();
const listeners = new Set<() => void>();

const owner = () => session.current().account?.id ?? null;
let shownTo = owner();

function tell(): void {
  for (const listener of [...listeners]) listener();
}

// Of one person's recordings the next on this device sees and sends nothing; they lie on the device until their owner is back.
session.subscribe(() => {
  if (owner() === shownTo) return;
  shownTo = owner();
  for (const timer of timers.values()) clearTimeout(timer);
  for (const all of [timers, kept, tries]) all.clear();
  shown = [];
  tell();
});

function show(id: string, change: Partial<Sending>): void {
  shown = shown.map((one) => (one.id === id ? { ...one, ...change } : one));
  tell();
}

function add(take: UnsentTake): void {
  kept.set(take.id, take);
  const { id, partId, title, sound } = take;
  const { takeId } = take.request;
  const fresh: Sending = {
    ...{ id, takeId, partId, title, bytes: sound.size, sentBytes: 0 },
    ...{ state: "sending", message: null },
  };
  shown = [...shown.filter((one) => one.id !== id), fresh];
}

/** Only one tab of this browser sends a recording. */
async function alone(id: string, work: () => Promise<void>): Promise<void> {
  const locks = typeof navigator === "undefined" ? undefined : navigator.locks;
  if (!locks) return work();
  await locks.request(`larkspan-hand-in-${id}`, { ifAvailable: true }, async (lock) => {
    if (lock) await work();
    else throw ApiError.offline();
  });
}

async function send(id: string): Promise<void> {
  const take = kept.get(id);
  if (!take || running.has(id) || take.accountId !== owner()) return;
  clearTimeout(timers.get(id));
  running.add(id);
  show(id, { state: "sending", message: null });
  try {
    await alone(id, async () => {
      await uploadTake(take, (sentBytes) => show(id, { sentBytes }));
      await forgetUnsent(id);
    });
    kept.delete(id);
    show(id, { state: "sent", sentBytes: take.sound.size });
    void queryClient.invalidateQueries({ queryKey: ["studio"] });
  } catch (error) {
    if (take.accountId !== owner()) return;
    const problem = error instanceof ApiError ? error : ApiError.offline();
    if (problem.refused && problem.status !== 423) show(id, { state: "refused", message: problem.message });
    else {
      show(id, { state: "waiting" });
      const tried = tries.get(id) ?? 0;
      tries.set(id, tried + 1);
      timers.set(
        id,
        setTimeout(() => void send(id), waitsMs[Math.min(tried, waitsMs.length - 1)]),
      );
    }
  } finally {
    running.delete(id);
  }
}

if (typeof window !== "undefined") {
  window.addEventListener("online", () => {
    for (const { id, state } of shown) if (state === "waiting") void send(id);
  });
}

/** Sends recordings one has decided to hand in, and keeps each on the device until the server has it. */
export const takeSender = {
  current: () => shown,
  subscribe(listener: () => void): () => void {
    listeners.add(listener);
    return () => void listeners.delete(listener);
  },
  /** Resolves once it is safe on this device; sending goes on by itself. */
  async handIn(take: UnsentTake): Promise<void> {
    await keepUnsent(take);
    add(take);
    void send(take.id);
  },
  /** Goes on with what a reload or a closed tab interrupted. */
  async resume(accountId: string): Promise<void> {
    for (const take of await unsentOf(accountId)) {
      if (take.accountId !== owner()) return;
      if (kept.has(take.id)) continue;
      add(take);
      void send(take.id);
    }
  },
  again: (id: string) => void send(id),
  /** Takes it off the device without handing it in. */
  async giveUp(id: string): Promise<void> {
    clearTimeout(timers.get(id));
    kept.delete(id);
    await forgetUnsent(id);
    shown = shown.filter((one) => one.id !== id);
    tell();
  },
};
