import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { shelf } from "@/features/api/shelf";
import type { Decision } from "@/shared/contract/decision";

/** Every "my key"; there is at most one for a song. */
export const decisionQueries = {
  all: () => queryOptions({ queryKey: ["decisions"], queryFn: () => shelf.list("decisions") }),
};

/** The key decided for a song; where two devices each decided, the later one counts. */
export function decisionFor(decisions: readonly Decision[], songId: string): Decision | null {
  return decisions
    .filter((decision) => decision.songId === songId)
    .reduce<Decision | null>(
      (latest, each) => (latest === null || each.decidedAt > latest.decidedAt ? each : latest),
      null,
    );
}

export function useSaveDecision() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (decision: Decision) => shelf.put("decisions", decision),
    onSuccess: async (decision) => {
      client.setQueryData(decisionQueries.all().queryKey, (known) => [
        ...(known ?? []).filter((each) => each.id !== decision.id),
        decision,
      ]);
      await client.invalidateQueries({ queryKey: ["decisions"] });
    },
  });
}

export function useRemoveDecision() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => shelf.remove("decisions", id),
    onSuccess: async (_, id) => {
      client.setQueryData(decisionQueries.all().queryKey, (known) => (known ?? []).filter((each) => each.id !== id));
      await client.invalidateQueries({ queryKey: ["decisions"] });
    },
  });
}
