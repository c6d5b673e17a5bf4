import { useQuery } from "@tanstack/react-query";
import { type Href, useLocalSearchParams } from "expo-router";
import { useSession } from "@/features/api/SessionProvider";
import { SignedIn } from "@/features/account/SignedIn";
import { AssignmentScreen } from "@/features/studio/parts/AssignmentScreen";
import { studioQueries } from "@/features/studio/studioQueries";
import { StudioPage } from "@/features/studio/StudioPage";

export default function AssignmentRoute() {
  const { id, assignmentId } = useLocalSearchParams<{ id: string; assignmentId: string }>();
  const signedIn = useSession().status === "signed-in";
  const { data: assignment } = useQuery({ ...studioQueries.assignment(id, assignmentId), enabled: signedIn });
  return (
    <StudioPage
      id={id}
      title={assignment?.title ?? "Assignment"}
      crumb={(studio) => ({
        label: studio ? `Studio / ${studio.name} / Assignments` : "Studio",
        href: `/studio/${id}/assignments` as Href,
      })}
      page={`assignments/${assignmentId}`}
      door={SignedIn}
    >
      {(studio) => <AssignmentScreen studio={studio} assignmentId={assignmentId} now={new Date()} />}
    </StudioPage>
  );
}
