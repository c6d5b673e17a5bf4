import { useEffect, useRef, useState } from "react";
import { deviceDraft } from "@/features/api/deviceDraft";
import type { ArrangementDraft } from "./arrangementDraft";

interface Kept {
  draft: ArrangementDraft;
  /** the id that it will have: a second try to keep it must not make two */
  id: string;
}

const drafts = deviceDraft<Kept>("arrangement-draft", "tab");

/** A draft of one arrangement, found again after a reload. */
export function useArrangementDraft(place: string, begin: () => Kept) {
  const [start] = useState(() => drafts.load(place) ?? begin());
  const [draft, setDraft] = useState(start.draft);
  const touched = useRef(false);
  const { id } = start;
  useEffect(() => {
    if (touched.current) drafts.save(place, { draft, id });
  }, [place, draft, id]);
  return {
    id,
    draft,
    change: (part: Partial<ArrangementDraft>) => {
      touched.current = true;
      setDraft((before) => ({ ...before, ...part }));
    },
    /** After it was kept, or to begin anew from what is there. */
    forget: (from?: ArrangementDraft) => {
      touched.current = false;
      drafts.clear(place);
      if (from) setDraft(from);
    },
  };
}
