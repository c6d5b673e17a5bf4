import { useLocalSearchParams } from "expo-router";
import { SignedIn } from "@/features/account/SignedIn";
import { AssignmentsScreen } from "@/features/studio/parts/AssignmentsScreen";
import { StudioPage } from "@/features/studio/StudioPage";

export default function AssignmentsRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return (
    <StudioPage id={id} title="Assignments" page="assignments" door={SignedIn}>
      {(studio) => <AssignmentsScreen studio={studio} now={new Date()} />}
    </StudioPage>
  );
}
