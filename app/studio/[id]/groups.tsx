import { useLocalSearchParams } from "expo-router";
import { SignedIn } from "@/features/account/SignedIn";
import { GroupsScreen } from "@/features/studio/groups/GroupsScreen";
import { StudioPage } from "@/features/studio/StudioPage";

export default function GroupsRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <StudioPage id={id} title="Groups" page="groups" door={SignedIn}>
      {(studio) => <GroupsScreen studio={studio} />}
    </StudioPage>
  );
}
