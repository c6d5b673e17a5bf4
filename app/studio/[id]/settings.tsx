import { useLocalSearchParams } from "expo-router";
import { SignedIn } from "@/features/account/SignedIn";
import { SettingsScreen } from "@/features/studio/settings/SettingsScreen";
import { StudioPage } from "@/features/studio/StudioPage";

export default function SettingsRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <StudioPage id={id} title="Settings of the studio" page="settings" door={SignedIn}>
      {(studio) => <SettingsScreen studio={studio} />}
    </StudioPage>
  );
}
