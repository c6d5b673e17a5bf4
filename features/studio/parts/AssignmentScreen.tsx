import { useQuery } from "@tanstack/react-query";
import { type Href, useRouter } from "expo-router";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import type { Assignment } from "@/shared/contract/studio/assignment";
import type { Studio } from "@/shared/contract/studio/studio";
import { plural } from "@/shared/music/countWords";
import { dayOf, dueWords } from "../dayWords";
import { studioQueries, useStudioChange } from "../studioQueries";
import { ChangeAssignment } from "./ChangeAssignment";
import { PartsTable } from "./PartsTable";

export interface AssignmentScreenProps {
  studio: Studio;
  assignmentId: string;
  now: Date;
}

/** One song given to many: how far each of them is, due date and note, and its end. */
export function AssignmentScreen({ studio, assignmentId, now }: AssignmentScreenProps) {
  const query = useQuery(studioQueries.assignment(studio.id, assignmentId));
  return (
    <QueryState query={query} title="The assignment could not be opened">
      {(assignment) => <Opened studio={studio} assignment={assignment} now={now} />}
    </QueryState>
  );
}

function Opened({ studio, assignment, now }: { studio: Studio; assignment: Assignment; now: Date }) {
  const router = useRouter();
  const { id, title, parts, dueOn, note, assignedAt, assignedBy } = assignment;
  const path = `/studios/${studio.id}/assignments/${id}`;
  const remove = useStudioChange(async () => {
    await http.delete(path);
    router.replace(`/studio/${studio.id}/assignments` as Href);
  });
  return (
    <View style={{ gap: 20 }}>
      <View style={{ gap: 4 }}>
        <Text tone="soft">
          {[
            `Given ${dayOf(assignedAt, now)}${assignedBy === null ? "" : ` by ${assignedBy}`} to ${plural(parts.length, "pupil")}`,
            dueOn && dueWords(dueOn, now),
          ]
            .filter(Boolean)
            .join(", ")}
        </Text>
        {note !== "" && <Text style={{ maxWidth: 640 }}>{note}</Text>}
      </View>
      <PartsTable parts={parts} now={now} />
      <ChangeAssignment path={path} dueOn={dueOn} note={note} />
      <AskedTwice
        flush
        label="Take the song back"
        question={`Take “${title}” back from all of them?`}
        text="Their threads and the takes handed in are deleted. The copies on their own shelves stay theirs."
        failed="It is not taken back."
        confirmLabel="Take it back"
        onRemove={() => remove.mutate()}
        busy={remove.isPending}
        error={remove.error}
        testID="delete-assignment"
      />
    </View>
  );
}
