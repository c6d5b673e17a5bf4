import { GuardianPage } from "@/features/studio/join/GuardianPage";
import { Screen } from "@/features/ui/Screen";

export default function GuardianRoute() {
  return (
    <Screen title="Your word">
      <GuardianPage />
    </Screen>
  );
}
