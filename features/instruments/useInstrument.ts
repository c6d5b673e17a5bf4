import { useQuery } from "@tanstack/react-query";
import { newId } from "@/features/api/newId";
import type { OwnInstrument } from "@/shared/contract/instrument";
import type { Instrument } from "@/shared/instruments/instrument";
import { instrumentQueries, useSaveInstruments } from "./instrumentQueries";
import { chosenInstrument, makeFavourite, offeredInstruments } from "./myInstruments";
import { tryInstrument, useTrial } from "./trialInstrument";

/**
 * The instrument in hand at one song: the one tried with it, else the one its key was decided on, else the favourite.
 * Trying one changes nothing that is kept.
 */
export function useInstrument(
  songId: string,
  decided: string | null,
): {
  instrument: Instrument;
  owned: readonly OwnInstrument[];
  choose: (id: string) => void;
  /** Somebody who has not said yet what they play plays what they take a way on. */
  settle: () => void;
  error: Error | null;
} {
  const query = useQuery(instrumentQueries.all());
  const save = useSaveInstruments();
  const tried = useTrial(songId);
  const owned = query.data ?? [];
  const instrument = chosenInstrument(owned, tried ?? decided);
  return {
    instrument,
    owned,
    error: save.error,
    choose: (id) => tryInstrument(songId, id),
    settle: () => {
      if (query.data && !owned.some(({ favourite }) => favourite))
        save.mutate(makeFavourite(owned, instrument.id, newId));
    },
  };
}

/** Every instrument that can be chosen, one's own among them, by id and name. */
export function useInstrumentNames(): { id: string; name: string }[] {
  const { data } = useQuery(instrumentQueries.all());
  return offeredInstruments(data ?? []).map(({ instrument: { id, name } }) => ({ id, name }));
}
