import { useLocalSearchParams } from "expo-router";
import { SignedIn } from "@/features/account/SignedIn";
import { InviteScreen } from "@/features/studio/invites/InviteScreen";
import { StudioPage } from "@/features/studio/StudioPage";

export default function InviteRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <StudioPage id={id} title="Invite" page="invite" door={SignedIn}>
      {(studio) => <InviteScreen studio={studio} now={new Date()} />}
    </StudioPage>
  );
}
