import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { http } from "@/features/api/httpClient";
import type { Assignment, AssignmentListing, Comment, Part, PartListing } from "@/shared/contract/studio/assignment";
import type { GuardianState } from "@/shared/contract/studio/consent";
import type { StudioGroup } from "@/shared/contract/studio/group";
import type { HandIn } from "@/shared/contract/studio/handIn";
import type { Invite } from "@/shared/contract/studio/invite";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Studio } from "@/shared/contract/studio/studio";

const ask = <Data>(path: string) =>
  queryOptions({ queryKey: ["studio", path], queryFn: () => http.get<Data>(path), staleTime: 5_000 });

/** What the server tells of studios; all of it stands under one key, so that one change can refresh it. */
export const studioQueries = {
  list: () => ask<Studio[]>("/studios"),
  detail: (id: string) => ask<Studio>(`/studios/${id}`),
  roster: (id: string) => ask<RosterRow[]>(`/studios/${id}/roster`),
  groups: (id: string) => ask<StudioGroup[]>(`/studios/${id}/groups`),
  invites: (id: string) => ask<Invite[]>(`/studios/${id}/invites`),
  assignments: (id: string) => ask<AssignmentListing[]>(`/studios/${id}/assignments`),
  assignment: (studioId: string, id: string) => ask<Assignment>(`/studios/${studioId}/assignments/${id}`),
  /** the pupil's own, over all studios */
  parts: () => ask<PartListing[]>("/parts"),
  part: (id: string) => ask<Part>(`/parts/${id}`),
  comments: (partId: string) => ask<Comment[]>(`/parts/${partId}/comments`),
  handIns: (partId: string) => ask<HandIn[]>(`/parts/${partId}/hand-ins`),
  guardian: () => ask<GuardianState>("/guardian"),
};

/** Asks for everything of the studios anew; what is on screen stays until the answer is here. */
export function useStudioRefresh(): () => Promise<void> {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: ["studio"] });
}

/** A change on the server, after which every page of the studios is true again. */
export function useStudioChange<Variables = void, Result = unknown>(send: (variables: Variables) => Promise<Result>) {
  const refresh = useStudioRefresh();
  return useMutation({ mutationFn: send, onSuccess: refresh });
}
