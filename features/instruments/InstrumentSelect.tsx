import { Select } from "@/features/ui/Select";
import type { OwnInstrument } from "@/shared/contract/instrument";
import { offeredInstruments, ownWords } from "./myInstruments";

export interface InstrumentSelectProps {
  owned: readonly OwnInstrument[];
  value: string;
  onChange: (id: string) => void;
  /** one of the words of a sentence */
  inline?: boolean;
}

/** Which instrument the ways are for; the favourite says so. */
export function InstrumentSelect({ owned, value, onChange, inline = false }: InstrumentSelectProps) {
  return (
    <Select
      label="Instrument"
      inline={inline}
      testID="instrument"
      value={value}
      options={offeredInstruments(owned).map(({ instrument, own }) => ({
        value: instrument.id,
        label: ownWords(instrument, own),
      }))}
      onChange={onChange}
    />
  );
}
