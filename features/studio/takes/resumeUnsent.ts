const hint = "larkspan.unsent-takes";

/** Notes whether recordings wait on this device, where every page can look without opening the store. */
export function noteUnsent(some: boolean): void {
  try {
    if (some) localStorage.setItem(hint, "1");
    else localStorage.removeItem(hint);
  } catch {
    // Without it the takes go on when a page of the studio is opened.
  }
}

/** Goes on sending what an earlier visit left, on whatever page one comes back; loads the sender only if something waits. */
export function resumeUnsent(accountId: string): void {
  try {
    if (localStorage.getItem(hint) === null) return;
  } catch {
    return;
  }
  void import("./takeSender").then(({ takeSender }) => takeSender.resume(accountId)).catch(() => undefined);
}
