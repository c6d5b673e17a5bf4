import { useLocalSearchParams } from "expo-router";
import { RetuneScreen } from "@/features/instruments/retune/RetuneScreen";

export default function RetuneRoute() {
  const { instrument, shift } = useLocalSearchParams<{ instrument?: string; shift?: string }>();
  return <RetuneScreen key={`${instrument} ${shift}`} instrumentId={instrument ?? null} shift={Number(shift ?? 0)} />;
}
