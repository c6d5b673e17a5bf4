import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { newId } from "@/features/api/newId";
import type { OwnInstrument } from "@/shared/contract/instrument";
import type { Instrument } from "@/shared/instruments/instrument";
import { instrumentQueries, useSaveInstruments } from "./instrumentQueries";
import { chosenInstrument, makeFavourite } from "./myInstruments";

/** The instrument in hand. Choosing another makes it the favourite, so that every page speaks of it from then on. */
export function useInstrument(): {
  instrument: Instrument;
  owned: readonly OwnInstrument[];
  choose: (id: string) => void;
  error: Error | null;
} {
  const query = useQuery(instrumentQueries.all());
  const save = useSaveInstruments();
  const [chosen, setChosen] = useState<string | null>(null);
  const owned = query.data ?? [];
  return {
    instrument: chosenInstrument(owned, chosen),
    owned,
    error: save.error,
    choose: (id) => {
      setChosen(id);
      const changed = makeFavourite(owned, id, newId);
      if (changed.length > 0) save.mutate(changed);
    },
  };
}
