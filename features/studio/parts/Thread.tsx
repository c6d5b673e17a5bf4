import { useQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { View } from "react-native";
import { Heading } from "@/features/ui/Heading";
import { QueryState } from "@/features/ui/QueryState";
import { Text } from "@/features/ui/Text";
import type { Part } from "@/shared/contract/studio/assignment";
import { studioQueries } from "../studioQueries";
import { CommentForm } from "./CommentForm";
import { CommentRow } from "./CommentRow";
import type { TakesPlace, TakeTime } from "./takesPlace";

export interface ThreadProps {
  part: Part;
  now: Date;
  takes: (place: TakesPlace) => ReactNode;
  time: TakeTime | null;
  onTime: (time: TakeTime | null) => void;
}

/** The takes of a part, and what teacher and pupil wrote about them, oldest first. */
export function Thread({ part, now, takes, time, onTime }: ThreadProps) {
  const query = useQuery(studioQueries.comments(part.id));
  const other = part.side === "teacher" ? part.pupil : (part.assignedBy ?? "Your teacher");
  return (
    <QueryState query={query} title="The thread could not be opened">
      {(comments) => (
        <View style={{ gap: 16 }}>
          {takes({ part, comments, onTime })}
          <Heading level={2}>{`You and ${other}`}</Heading>
          {comments.length === 0 ? (
            <Text tone="soft" testID="no-comments">
              Nothing written yet.
            </Text>
          ) : (
            <View role="list" testID="comments" style={{ gap: 12 }}>
              {comments.map((comment) => (
                <View key={comment.id} role="listitem">
                  <CommentRow partId={part.id} comment={comment} now={now} />
                </View>
              ))}
            </View>
          )}
          <CommentForm partId={part.id} time={time} onTime={onTime} />
        </View>
      )}
    </QueryState>
  );
}
