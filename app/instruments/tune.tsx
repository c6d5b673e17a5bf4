import { useQuery } from "@tanstack/react-query";
import { useLocalSearchParams, useRouter } from "expo-router";
import { instrumentQueries } from "@/features/instruments/instrumentQueries";
import { chosenInstrument } from "@/features/instruments/myInstruments";
import { toneS } from "@/features/instruments/tuner/ByEar";
import { tuneWishes } from "@/features/instruments/tuner/tuneWishes";
import { TunerScreen } from "@/features/instruments/tuner/TunerScreen";
import { QueryState } from "@/features/ui/QueryState";
import { createReferenceTone } from "@/features/voice/guided/hearing/referenceTone";
import { createEar } from "@/features/voice/recorder/ear";

export default function TuneRoute() {
  const router = useRouter();
  const asked = useLocalSearchParams<{ instrument?: string; retune?: string; capo?: string; a4?: string }>();
  const wishes = tuneWishes(asked);
  return (
    <QueryState query={useQuery(instrumentQueries.all())} title="Your instruments could not be opened">
      {(owned) => {
        const instrument = chosenInstrument(owned, asked.instrument ?? null);
        return (
          <TunerScreen
            key={`${instrument.id} ${wishes.retune} ${wishes.capo}`}
            instrument={instrument}
            {...wishes}
            onA4={(hz) => router.setParams({ a4: String(hz) })}
            createEar={createEar}
            createTone={longTone}
          />
        );
      }}
    </QueryState>
  );
}

function longTone() {
  return createReferenceTone(toneS);
}
