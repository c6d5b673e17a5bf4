import { useEffect, useSyncExternalStore } from "react";
import { useSession } from "@/features/api/SessionProvider";
import { takeSender, type Sending } from "./takeSender";

/** Recordings of this part that are on their way from this device; what an earlier visit left goes on. */
export function useSendings(partId: string): readonly Sending[] {
  const { account } = useSession();
  const accountId = account?.id;
  useEffect(() => {
    if (accountId !== undefined) void takeSender.resume(accountId).catch(() => undefined);
  }, [accountId]);
  const all = useSyncExternalStore(takeSender.subscribe, takeSender.current, takeSender.current);
  return all.filter((one) => one.partId === partId);
}
