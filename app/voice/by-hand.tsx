import { useLocalSearchParams, useRouter } from "expo-router";
import { ByHandScreen } from "@/features/voice/byHand/ByHandScreen";

export default function ByHandRoute() {
  const { voice } = useLocalSearchParams<{ voice?: string }>();
  const router = useRouter();
  return <ByHandScreen voiceId={voice} onKept={() => router.replace("/voice")} />;
}
