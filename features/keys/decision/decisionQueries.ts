import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { shelf } from "@/features/api/shelf";
import type { Decision } from "@/shared/contract/decision";

/** Every "my key"; there is at most one for a song and voice. */
export const decisionQueries = {
  all: () => queryOptions({ queryKey: ["decisions"], queryFn: () => shelf.list("decisions") }),
};

const newestFirst = (a: Decision, b: Decision) => b.decidedAt.localeCompare(a.decidedAt);

/**
 * The key decided for a song: for this voice, else for whoever sings, else the newest for another voice, which holds
 * for that voice only.
 */
export function decisionFor(decisions: readonly Decision[], songId: string, voiceId: string | null): Decision | null {
  const ofSong = decisions.filter((decision) => decision.songId === songId).sort(newestFirst);
  const made = (id: string | null) => ofSong.find((decision) => decision.voiceId === id);
  return made(voiceId) ?? made(null) ?? ofSong[0] ?? null;
}

/** What was decided for the same song and other voices, newest first. */
export function otherDecisions(decisions: readonly Decision[], shown: Decision): Decision[] {
  return decisions.filter(({ id, songId }) => songId === shown.songId && id !== shown.id).sort(newestFirst);
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
