import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { shelf } from "@/features/api/shelf";
import type { OwnInstrument } from "@/shared/contract/instrument";

export const instrumentQueries = {
  all: () => queryOptions({ queryKey: ["instruments"], queryFn: () => shelf.list("instruments") }),
};

/** Keeps several instruments at once, in order: one change may touch the old favourite and the new. */
export function useSaveInstruments() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (items: readonly OwnInstrument[]) => {
      for (const item of items) await shelf.put("instruments", item);
      return items;
    },
    onSuccess: (items) => {
      client.setQueryData(instrumentQueries.all().queryKey, (known) => [
        ...(known ?? []).filter((each) => !items.some((item) => item.id === each.id)),
        ...items,
      ]);
    },
    onSettled: () => client.invalidateQueries({ queryKey: ["instruments"] }),
  });
}

/** Takes an instrument of one's own away. */
export function useRemoveInstrument() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => shelf.remove("instruments", id),
    onSuccess: (_, id) => {
      client.setQueryData(instrumentQueries.all().queryKey, (known) => (known ?? []).filter((each) => each.id !== id));
    },
    onSettled: () => client.invalidateQueries({ queryKey: ["instruments"] }),
  });
}
