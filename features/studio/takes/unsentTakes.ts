import { createStore, del, set, values } from "idb-keyval";
import type { HandInRequest } from "@/shared/contract/studio/handIn";
import { unsentHint } from "./unsentHint";

/** A recording that waits on this device until the server has it. */
export interface UnsentTake {
  /** of the hand-in */
  id: string;
  /** whose it is; nobody else who uses this device sends it */
  accountId: string;
  partId: string;
  /** of the song */
  title: string;
  request: HandInRequest;
  sound: Blob;
  at: string;
}

const store = (() => {
  let opened: ReturnType<typeof createStore> | null = null;
  return () => (opened ??= createStore("larkspan-unsent-takes", "takes"));
})();

/** Keeps it on the device, over reloads, until `forgetUnsent`. */
export async function keepUnsent(take: UnsentTake): Promise<void> {
  await set(take.id, take, store());
  unsentHint.note(true);
}

export async function unsentOf(accountId: string): Promise<UnsentTake[]> {
  const all = await values<UnsentTake>(store());
  unsentHint.note(all.length > 0);
  return all.filter((take) => take.accountId === accountId).sort((a, b) => (a.at < b.at ? -1 : 1));
}

export async function forgetUnsent(id: string): Promise<void> {
  await del(id, store());
}
