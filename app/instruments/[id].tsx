import { useLocalSearchParams, useRouter } from "expo-router";
import { OwnInstrumentPage } from "@/features/instruments/editor/OwnInstrumentPage";

export default function InstrumentRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  const router = useRouter();
  return (
    <OwnInstrumentPage
      id={id}
      onDone={() => router.replace("/instruments")}
      onOpen={(other) => router.push({ pathname: "/instruments/[id]", params: { id: other } })}
    />
  );
}
