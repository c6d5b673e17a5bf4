import { useQuery } from "@tanstack/react-query";
import { useCallback, useMemo } from "react";
import { http } from "@/features/api/httpClient";
import { useSentId } from "@/features/api/useSentId";
import type { Assignment, AssignmentRequest } from "@/shared/contract/studio/assignment";
import type { RosterRow } from "@/shared/contract/studio/roster";
import type { Way } from "@/shared/ways/way";
import { pupilKeys } from "../judge/askPupilKeys";
import { questionOf, type Piece } from "../judge/piece";
import { useStudioChange } from "../studioQueries";
import { partRequest, pupilParts, untouched, type PartsOf, type PupilPart } from "./pupilParts";
import { useDrafts } from "./useDrafts";

export interface AssignmentOf {
  studioId: string;
  piece: Piece;
  pupils: readonly RosterRow[];
  asked: string | null;
  group: string | null;
  instrumentOf: PartsOf["instrumentOf"];
}

interface Given {
  dueOn: string | null;
  note: string;
  waysOf: (memberId: string) => readonly Way[] | null | undefined;
}

/** The table of an assignment while it is made: what is proposed, what the teacher changes, and giving it out. */
export function useAssignment({ studioId, piece, pupils, asked, group, instrumentOf }: AssignmentOf) {
  const { drafts, setDrafts, change } = useDrafts(
    () =>
      new Map(
        pupils
          .filter(({ groupIds }) => group === null || groupIds.includes(group))
          .map(({ memberId }) => [memberId, { ...untouched, chosen: true }]),
      ),
  );
  const question = useMemo(() => questionOf(piece, pupils), [piece, pupils]);
  const judged = useQuery(pupilKeys(question));
  const parts = useMemo<PupilPart[]>(
    () => pupilParts({ written: piece.written, pupils, judged: judged.data, drafts, asked, instrumentOf }),
    [piece, pupils, judged.data, drafts, asked, instrumentOf],
  );
  const choose = useCallback(
    (ids: ReadonlySet<string>) =>
      setDrafts(
        (before) =>
          new Map(
            pupils.map(({ memberId }) => [
              memberId,
              { ...(before.get(memberId) ?? untouched), chosen: ids.has(memberId) },
            ]),
          ),
      ),
    [pupils, setDrafts],
  );
  const send = useStudioChange((request: AssignmentRequest) =>
    http.post<Assignment>(`/studios/${studioId}/assignments`, request),
  );
  const { idFor } = useSentId();
  const chosen = parts.filter(({ draft }) => draft.chosen);
  return {
    parts,
    change,
    choose,
    chosen: chosen.length,
    sending: send.isPending,
    error: send.error,
    /** why keys are not proposed from voices; null where they are */
    problem: judged.error
      ? judged.error.message
      : question === null
        ? "Nothing is known of the tune, so no voice can be held against it. Add its notes or its lowest and highest note to the song, or choose the keys yourself."
        : null,
    give: ({ dueOn, note, waysOf }: Given, done: (assignmentId: string) => void) => {
      const request = {
        ...{ songId: piece.song.id, dueOn, note },
        parts: chosen.map((part) => partRequest(part, waysOf(part.row.memberId))),
      };
      send.mutate({ id: idFor(request), ...request }, { onSuccess: ({ id }) => done(id) });
    },
  };
}
