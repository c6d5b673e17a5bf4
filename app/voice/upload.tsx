import { useRouter } from "expo-router";
import { UploadScreen } from "@/features/voice/upload/UploadScreen";

export default function UploadRoute() {
  const router = useRouter();
  return <UploadScreen onKept={(next) => router.replace(next === "songs" ? "/songs" : "/voice")} />;
}
