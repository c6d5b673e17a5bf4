import { queryOptions, skipToken, useMutation, useQueryClient } from "@tanstack/react-query";
import { shelf } from "@/features/api/shelf";
import type { Arrangement } from "@/shared/contract/arrangement";
import type { Instrument } from "@/shared/instruments/instrument";
import type { ArrangementQuestion } from "@/shared/ways/arrangements/arrangement";
import { proposeArrangements } from "@/shared/ways/arrangements/proposeArrangements";
import { allShapes } from "@/shared/ways/neck/allShapes";

export const arrangementQueries = {
  all: () => queryOptions({ queryKey: ["arrangements"], queryFn: () => shelf.list("arrangements") }),
  /** Those of one song, the oldest first. */
  ofSong: (songId: string) =>
    queryOptions({
      ...arrangementQueries.all(),
      select: (all: Arrangement[]) => all.filter((each) => each.songId === songId),
    }),
  /** What may be proposed; worked out on this device when it is first wanted. */
  proposed: (question: ArrangementQuestion | null) =>
    queryOptions({
      queryKey: ["arrangements proposed", question],
      queryFn: question ? () => proposeArrangements(question) : skipToken,
      staleTime: Infinity,
      retry: false,
    }),
  /** Every shape of a chord on the neck, easiest first. */
  shapes: (played: string, instrument: Instrument, capo: number) =>
    queryOptions({
      queryKey: ["shapes", played, instrument, capo],
      queryFn: () => allShapes(played, instrument, capo),
      staleTime: Infinity,
      retry: false,
    }),
};

export function useKeepArrangement() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (item: Arrangement) => shelf.put("arrangements", item),
    onSuccess: (kept) => {
      client.setQueryData(arrangementQueries.all().queryKey, (known) =>
        known?.some(({ id }) => id === kept.id)
          ? known.map((each) => (each.id === kept.id ? kept : each))
          : [...(known ?? []), kept],
      );
      void client.invalidateQueries({ queryKey: ["arrangements"] });
    },
  });
}

export function useRemoveArrangement() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => shelf.remove("arrangements", id),
    onSuccess: (_, id) => {
      client.setQueryData(arrangementQueries.all().queryKey, (known) => known?.filter((each) => each.id !== id));
      void client.invalidateQueries({ queryKey: ["arrangements"] });
    },
  });
}
