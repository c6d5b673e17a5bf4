import { unsentHint } from "./unsentHint";

/** Goes on sending what an earlier visit left, on whatever page one comes back; loads the sender only if something waits. */
export function resumeUnsent(accountId: string): void {
  if (!unsentHint.some()) return;
  void import("./takeSender").then(({ takeSender }) => takeSender.resume(accountId)).catch(() => undefined);
}
