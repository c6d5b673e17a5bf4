import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useMemo } from "react";
import type { LineUp, Player } from "@/shared/contract/lineUp";
import { findFixed, type FixedInstrument } from "@/shared/keys/fixed/fixedInstrument";
import { newId } from "./newId";
import { shelf } from "./shelf";

const lineUpQueries = {
  all: () => queryOptions({ queryKey: ["line-ups"], queryFn: () => shelf.list("line-ups") }),
};

/** Who plays a song, and the way to change it. */
export interface SongLineUp {
  /** undefined while it is being fetched */
  players: readonly Player[] | undefined;
  /** why it could not be fetched */
  unread: Error | null;
  /** why the last change is not kept */
  error: Error | null;
  refetch: () => unknown;
  change: (players: readonly Player[]) => void;
}

/** The line-up of a song, of the account or of this device; what is changed holds at once and is kept behind it. */
export function useLineUp(songId: string): SongLineUp {
  const client = useQueryClient();
  const { queryKey } = lineUpQueries.all();
  const query = useQuery(lineUpQueries.all());
  const save = useMutation({
    // One after the other: the last change is the one that stays.
    scope: { id: "line-ups" },
    mutationFn: (next: LineUp) => shelf.put("line-ups", next),
    onError: () => client.invalidateQueries({ queryKey }),
  });
  return {
    players: query.data && (query.data.find((each) => each.songId === songId)?.players ?? []),
    unread: query.data ? null : query.error,
    error: save.error,
    refetch: () => query.refetch(),
    change: (players) => {
      const all = client.getQueryData(queryKey) ?? [];
      const kept = all.find((each) => each.songId === songId);
      const next = { id: kept?.id ?? newId(), songId, players: [...players], changedAt: new Date().toISOString() };
      void client.cancelQueries({ queryKey });
      client.setQueryData(queryKey, [...all.filter((each) => each.songId !== songId), next]);
      save.mutate(next);
    },
  };
}

/** The instruments of a song's line-up that are made in one key, each once. */
export function useFixedInstruments(songId: string): readonly FixedInstrument[] {
  const { data } = useQuery(lineUpQueries.all());
  return useMemo(() => {
    const players = data?.find((each) => each.songId === songId)?.players ?? [];
    return [...new Set(players.map(({ instrument }) => instrument))].flatMap((id) => findFixed(id) ?? []);
  }, [data, songId]);
}
