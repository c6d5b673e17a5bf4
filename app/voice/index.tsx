import { VoiceScreen } from "@/features/voice/VoiceScreen";

export default function VoiceRoute() {
  return <VoiceScreen />;
}
