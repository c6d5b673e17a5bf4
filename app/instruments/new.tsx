import { useLocalSearchParams, useRouter } from "expo-router";
import { NewInstrument } from "@/features/instruments/editor/NewInstrument";

export default function NewInstrumentRoute() {
  const { from } = useLocalSearchParams<{ from?: string }>();
  const router = useRouter();
  return <NewInstrument from={from ?? null} onKept={() => router.replace("/instruments")} />;
}
