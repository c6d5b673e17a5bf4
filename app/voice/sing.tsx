import { useRouter } from "expo-router";
import { SingScreen } from "@/features/voice/sing/SingScreen";

export default function SingRoute() {
  const router = useRouter();
  return <SingScreen onKept={(next) => router.replace(next === "songs" ? "/songs" : "/voice")} />;
}
