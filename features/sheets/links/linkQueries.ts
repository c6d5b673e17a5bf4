import { queryOptions, skipToken, useMutation, useQueryClient } from "@tanstack/react-query";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import type { MadeSheetLink, SharedSheet, SheetLink, SheetLinkRequest } from "@/shared/contract/sheetLink";

export const linkQueries = {
  /** The links to a song's sheet, newest first; null for a visitor, who has none. */
  ofSong: (songId: string | null) =>
    queryOptions({
      queryKey: ["sheet-links", songId],
      queryFn: songId === null ? skipToken : () => http.get<SheetLink[]>(`/sheet-links?songId=${songId}`),
    }),
  /** What a link shows. One that has ended stays so. */
  shared: (token: string) =>
    queryOptions({
      queryKey: ["shared-sheet", token],
      queryFn: () => http.get<SharedSheet>(`/shared/${encodeURIComponent(token)}`),
      retry: (count, error) => !(error instanceof ApiError && error.refused) && count < 2,
    }),
};

export function useMakeLink() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: SheetLinkRequest) => http.post<MadeSheetLink>("/sheet-links", request),
    onSuccess: ({ link }) => client.invalidateQueries({ queryKey: ["sheet-links", link.songId] }),
  });
}

export function useRevokeLink() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id }: SheetLink) => http.delete(`/sheet-links/${id}`),
    onSettled: (_done, _error, { songId }) => client.invalidateQueries({ queryKey: ["sheet-links", songId] }),
  });
}
