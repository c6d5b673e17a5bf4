import { useLocalSearchParams, useRouter } from "expo-router";
import { GuidedScreen } from "@/features/voice/guided/GuidedScreen";

export default function GuidedRoute() {
  const { voice } = useLocalSearchParams<{ voice?: string }>();
  const router = useRouter();
  return <GuidedScreen voiceId={voice} onKept={() => router.replace("/voice")} />;
}
