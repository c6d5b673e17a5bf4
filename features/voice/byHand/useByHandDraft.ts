import { useCallback, useEffect, useState } from "react";
import { deviceDraft } from "@/features/api/deviceDraft";
import type { ByHandFields } from "./byHand";

const drafts = deviceDraft<ByHandFields>("by-hand-draft", "tab");
const names = ["lowest", "highest", "comfortLow", "comfortTop"] as const;

/** What was typed for one voice and not kept: a reload finds it again, until the tab is closed. */
export function useByHandDraft(place: string, known: ByHandFields) {
  const [base] = useState(known);
  const [start] = useState(() => drafts.load(place));
  const [found, setFound] = useState(start !== null);
  const note = useCallback(
    (fields: ByHandFields) => {
      if (names.every((name) => fields[name] === base[name])) drafts.clear(place);
      else drafts.save(place, fields);
    },
    [place, base],
  );
  return { start: start ?? base, base, found, note, giveUp: () => setFound(false) };
}

/** Once the notes are kept with their voice. */
export function letGoOfByHandDraft(place: string): void {
  drafts.clear(place);
}

/** Notes what stands in the fields whenever it changes. */
export function useNoted(fields: ByHandFields, note: (fields: ByHandFields) => void): void {
  const { lowest, highest, comfortLow, comfortTop } = fields;
  useEffect(() => note({ lowest, highest, comfortLow, comfortTop }), [note, lowest, highest, comfortLow, comfortTop]);
}
