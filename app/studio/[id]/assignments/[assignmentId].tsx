import { type Href, useLocalSearchParams } from "expo-router";
import { SignedIn } from "@/features/account/SignedIn";
import { AssignmentScreen } from "@/features/studio/parts/AssignmentScreen";
import { StudioPage } from "@/features/studio/StudioPage";

export default function AssignmentRoute() {
  const { id, assignmentId } = useLocalSearchParams<{ id: string; assignmentId: string }>();
  return (
    <StudioPage
      id={id}
      wide
      title="Assignment"
      crumb={(studio) => ({
        label: studio ? `Studio / ${studio.name} / Assignments` : "Studio",
        href: `/studio/${id}/assignments` as Href,
      })}
      door={(inside) => (
        <SignedIn here={`/studio/${id}/assignments/${assignmentId}`} wide>
          {inside}
        </SignedIn>
      )}
    >
      {(studio) => <AssignmentScreen studio={studio} assignmentId={assignmentId} now={new Date()} />}
    </StudioPage>
  );
}
