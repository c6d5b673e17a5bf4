import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { colors } from "@/features/ui/theme";
import type { Comment } from "@/shared/contract/studio/assignment";
import { dayOf } from "../dayWords";
import { useStudioChange } from "../studioQueries";
import { clockWords } from "@/features/ui/clockWords";

export interface CommentRowProps {
  partId: string;
  comment: Comment;
  now: Date;
}

/** One remark of a thread; at a time in a take, if it stands there. */
export function CommentRow({ partId, comment, now }: CommentRowProps) {
  const { id, text, author, mine, atS, createdAt } = comment;
  const remove = useStudioChange(() => http.delete(`/parts/${partId}/comments/${id}`));
  const teacher = author.role !== "pupil";
  return (
    <View
      testID="comment"
      style={{
        gap: 2,
        paddingLeft: 12,
        borderLeftWidth: 3,
        borderLeftColor: teacher ? colors.plum : colors.lagoon,
      }}
    >
      <View style={{ flexDirection: "row", flexWrap: "wrap", columnGap: 8, alignItems: "baseline" }}>
        <Text variant="label" style={{ fontWeight: "600" }}>
          {mine ? "You" : author.name}
        </Text>
        <Text variant="tiny" tone="soft">
          {[teacher ? "teacher" : "pupil", dayOf(createdAt, now), atS !== null && `at ${clockWords(atS)}`]
            .filter(Boolean)
            .join(", ")}
        </Text>
      </View>
      <Text style={{ overflowWrap: "anywhere", whiteSpace: "pre-wrap" } as object}>{text}</Text>
      {mine && (
        <Button
          kind="text"
          flush
          small
          label="Take back"
          accessibleName={`Take back: ${text.slice(0, 40)}`}
          busy={remove.isPending}
          onPress={() => remove.mutate()}
          testID="remove-comment"
        />
      )}
      {remove.error && <Notice kind="error">{remove.error.message}</Notice>}
    </View>
  );
}
