import { useCallback, useState } from "react";
import { untouched, type PartDraft } from "./pupilParts";

/** What the teacher changed, by member. */
type Drafts = ReadonlyMap<string, PartDraft>;

/** What the teacher changes in the table of an assignment; `change` stays the same, so that no other row is drawn anew. */
export function useDrafts(start: () => Drafts) {
  const [drafts, setDrafts] = useState(start);
  const change = useCallback(
    (memberId: string, draft: Partial<PartDraft>) =>
      setDrafts((before) => new Map(before).set(memberId, { ...(before.get(memberId) ?? untouched), ...draft })),
    [],
  );
  return { drafts, setDrafts, change };
}
