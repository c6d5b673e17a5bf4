import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { useSentId } from "@/features/api/useSentId";
import { useServerForm } from "@/features/api/useServerForm";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { LiveText } from "@/features/ui/LiveText";
import { useStudioRefresh } from "../studioQueries";
import { clockWords } from "@/features/ui/clockWords";
import type { TakeTime } from "./takesPlace";

export interface CommentFormProps {
  partId: string;
  /** where in a take the words will stand; null: in the thread */
  time: TakeTime | null;
  onTime: (time: TakeTime | null) => void;
}

/** Writes into the thread, or at a time in a take. */
export function CommentForm({ partId, time, onTime }: CommentFormProps) {
  const refresh = useStudioRefresh();
  const { idFor, answered } = useSentId();
  const { form, end, submit } = useServerForm({ text: "" }, async ({ text }) => {
    const words = { text: text.trim(), handInId: time?.handInId ?? null, atS: time?.atS ?? null };
    await http.post(`/parts/${partId}/comments`, { id: idFor(words), ...words });
    answered();
    form.reset({ text: "" });
    onTime(null);
    await refresh();
  });
  return (
    <Form label="Write into the thread" onSubmit={submit} gap={10}>
      <LiveText variant="small" tone="plum" testID="comment-time">
        {time ? `This will stand at ${clockWords(time.atS)} in the take.` : ""}
      </LiveText>
      <FormField
        form={form}
        name="text"
        label={time ? `What you say at ${clockWords(time.atS)}` : "What you say"}
        check={(text) =>
          text.trim() === "" ? "Write something." : text.length > 2000 ? "At most 2,000 characters." : null
        }
        multiline
        rows={3}
        testID="comment-text"
      />
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", columnGap: 8 }}>
        <FormEnd {...end} small sendLabel="Send" busyLabel="Sending" testID="send-comment" />
        {time && <Button kind="text" small label="Not at a time" onPress={() => onTime(null)} testID="drop-time" />}
      </View>
    </Form>
  );
}
