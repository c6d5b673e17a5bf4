import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { newId } from "@/features/api/newId";
import { shelf } from "@/features/api/shelf";
import type { PlayerWishes } from "@/shared/contract/playerWishes";
import { merged, type Wishes } from "./wishes";

const wishQueries = {
  all: () => queryOptions({ queryKey: ["wishes"], queryFn: () => shelf.list("wishes") }),
};

/** The player's wishes, of the account or of this device; what is changed holds at once and is kept behind it. */
export function useWishes(): [wishes: Wishes, keep: (wishes: Wishes) => void, error: Error | null] {
  const client = useQueryClient();
  const { queryKey } = wishQueries.all();
  const query = useQuery(wishQueries.all());
  const save = useMutation({
    // One after the other: the last change is the one that stays.
    scope: { id: "wishes" },
    mutationFn: async ({ sets, next }: { sets: readonly PlayerWishes[]; next: PlayerWishes }) => {
      await shelf.put("wishes", next);
      for (const { id } of sets) if (id !== next.id) await shelf.remove("wishes", id);
    },
    onError: () => client.invalidateQueries({ queryKey }),
  });
  const keep = (wishes: Wishes) => {
    const sets = client.getQueryData(queryKey) ?? [];
    const next = { ...wishes, id: sets[0]?.id ?? newId(), changedAt: new Date().toISOString() };
    void client.cancelQueries({ queryKey });
    client.setQueryData(queryKey, [next]);
    save.mutate({ sets, next });
  };
  return [merged(query.data ?? []), keep, save.error];
}
