import { queryOptions } from "@tanstack/react-query";
import { songVersions } from "@/features/api/songVersions";

export const versionQueries = {
  list: (songId: string) =>
    queryOptions({ queryKey: ["song-versions", songId], queryFn: () => songVersions.list(songId) }),
  /** An earlier state never changes. */
  detail: (songId: string, versionId: string) =>
    queryOptions({
      queryKey: ["song-version", songId, versionId],
      queryFn: () => songVersions.get(songId, versionId),
      staleTime: Infinity,
    }),
};
