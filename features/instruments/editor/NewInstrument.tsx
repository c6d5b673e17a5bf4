import { useState } from "react";
import { newId } from "@/features/api/newId";
import { useUnits } from "@/features/ui/useUnits";
import type { OwnInstrument } from "@/shared/contract/instrument";
import { findPreset } from "@/shared/instruments/presets";
import { InstrumentEditor } from "./InstrumentEditor";
import { draftOf, emptyDraft } from "./instrumentDraft";

export interface NewInstrumentProps {
  /** a preset to begin from; nothing otherwise */
  from: string | null;
  onKept: (own: OwnInstrument) => void;
}

/** Making an instrument of one's own, from a preset or from nothing. */
export function NewInstrument({ from, onKept }: NewInstrumentProps) {
  const [units] = useUnits();
  const [afresh, setAfresh] = useState(0);
  const preset = from === null ? null : findPreset(from);
  return (
    <InstrumentEditor
      key={`${from} ${afresh}`}
      title="New instrument"
      place={preset ? `new ${preset.id}` : "new"}
      begin={() => ({ id: newId(), draft: preset ? draftOf(preset, null, units) : emptyDraft(units) })}
      finish={(read, id) => ({ ...read, id, presetId: null, favourite: false })}
      onKept={onKept}
      onAfresh={() => setAfresh(afresh + 1)}
    />
  );
}
