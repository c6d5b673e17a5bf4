import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams } from "expo-router";
import { instrumentQueries } from "@/features/instruments/instrumentQueries";
import { chosenInstrument, instrumentWords } from "@/features/instruments/myInstruments";
import { QueryState } from "@/features/ui/QueryState";
import { Screen } from "@/features/ui/Screen";
import { KnownShapes } from "@/features/ways/wishes/KnownShapes";

export default function KnownShapesRoute() {
  const { instrument: id, song } = useLocalSearchParams<{ instrument?: string; song?: string }>();
  const query = useQuery(instrumentQueries.all());
  const instrument = query.data && chosenInstrument(query.data, id ?? null);
  return (
    <Screen
      title="Shapes I know"
      subtitle={instrument ? instrumentWords(instrument) : undefined}
      back={song ? { pathname: "/songs/[id]/ways", params: { id: song } } : "/instruments"}
      wide
    >
      <QueryState query={query} title="Your instruments could not be opened">
        {(owned) => <KnownShapes instrument={chosenInstrument(owned, id ?? null)} />}
      </QueryState>
    </Screen>
  );
}
