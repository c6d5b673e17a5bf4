import { useEffect, useRef, useState } from "react";
import { deviceDraft } from "@/features/api/deviceDraft";
import { useUnits } from "@/features/ui/useUnits";
import { inUnits, type InstrumentDraft } from "./instrumentDraft";

interface Kept {
  draft: InstrumentDraft;
  /** the id that the instrument will have: a second try to keep it must not make two */
  id: string;
}

const drafts = deviceDraft<Kept>("instrument-draft");

/** A draft of one instrument, found again after a reload, always in the units of this device. */
export function useDraft(place: string, begin: () => Kept) {
  const [units] = useUnits();
  const [start] = useState(() => {
    const kept = drafts.load(place);
    return { ...(kept ?? begin()), restored: kept !== null };
  });
  const [typed, setTyped] = useState(start.draft);
  const draft = inUnits(typed, units);
  const touched = useRef(start.restored);
  const { id } = start;
  useEffect(() => {
    if (touched.current) drafts.save(place, { draft: typed, id });
  }, [place, typed, id]);
  return {
    id,
    draft,
    restored: start.restored,
    change: (part: Partial<InstrumentDraft>) => {
      touched.current = true;
      setTyped((before) => ({ ...inUnits(before, units), ...part }));
    },
    /** After it was kept, or to begin anew. */
    forget: () => {
      touched.current = false;
      drafts.clear(place);
    },
  };
}
