import { VoiceScreen } from "@/features/voice/profile/VoiceScreen";

export default function VoiceRoute() {
  return <VoiceScreen />;
}
