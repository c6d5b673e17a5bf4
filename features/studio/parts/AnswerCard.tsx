import { useState } from "react";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { useSentId } from "@/features/api/useSentId";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Field } from "@/features/ui/Field";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { Part } from "@/shared/contract/studio/assignment";
import { useStudioChange, useStudioRefresh } from "../studioQueries";

type Answer = "accepted" | "returned";

const done: Record<Answer, string> = {
  accepted: "You accepted this take.",
  returned: "You asked to hear it again.",
};

/** The teacher's answer to what was handed in; the pupil gets a mail. */
export function AnswerCard({ part }: { part: Part }) {
  const [message, setMessage] = useState("");
  const { idFor, answered: sent } = useSentId();
  const refresh = useStudioRefresh();
  const answer = useStudioChange(async (state: Answer) => {
    const words = message.trim();
    try {
      await http.put<Part>(`/parts/${part.id}`, {
        ...{ state, seenTakeAt: part.lastTake?.at ?? null },
        ...(words === "" ? null : { message: words, messageId: idFor({ words }) }),
      });
    } catch (error) {
      // The take that was not heard yet comes into sight.
      if (error instanceof ApiError && error.code === "newer-take") await refresh();
      throw error;
    }
    sent();
    setMessage("");
  });
  const answered = part.state === "accepted" || part.state === "returned" ? part.state : null;
  return (
    <Card style={{ gap: 12 }} testID="answer">
      <Heading level={2}>Your answer</Heading>
      {answered && (
        <Notice kind={answered === "accepted" ? "good" : "caution"} testID="answered">
          {done[answered]}
        </Notice>
      )}
      <Field
        label="Words that go with it"
        hint={`They stand in the thread, and in the mail to ${part.pupil}.`}
        value={message}
        onChangeText={setMessage}
        multiline
        rows={2}
        testID="answer-message"
      />
      {answer.error && (
        <Notice kind="error" title="The answer was not sent">
          {`${answer.error.message} What you wrote is still here.`}
        </Notice>
      )}
      <View style={{ flexDirection: "row", flexWrap: "wrap", gap: 10 }}>
        <Button
          small
          icon="check"
          label="Accept it"
          busy={answer.isPending && answer.variables === "accepted"}
          disabled={answered === "accepted" && message.trim() === ""}
          onPress={() => answer.mutate("accepted")}
          testID="accept"
        />
        <Button
          small
          kind="secondary"
          icon="again"
          label="Ask to sing it again"
          busy={answer.isPending && answer.variables === "returned"}
          onPress={() => answer.mutate("returned")}
          testID="return"
        />
      </View>
      <Text variant="tiny" tone="soft">
        A mail tells the pupil, unless they switched such mails off.
      </Text>
    </Card>
  );
}
