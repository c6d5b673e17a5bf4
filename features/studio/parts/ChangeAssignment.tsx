import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { useServerForm } from "@/features/api/useServerForm";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { DayField } from "../DayField";
import { useStudioRefresh } from "../studioQueries";

export interface ChangeAssignmentProps {
  path: string;
  dueOn: string | null;
  note: string;
}

/** Another due date or note for everybody. */
export function ChangeAssignment({ path, dueOn, note }: ChangeAssignmentProps) {
  const [open, setOpen] = useState(false);
  const refresh = useStudioRefresh();
  const { form, end, submit } = useServerForm({ dueOn: dueOn ?? "", note }, async (draft) => {
    await http.put(path, { dueOn: draft.dueOn === "" ? null : draft.dueOn, note: draft.note.trim() });
    await refresh();
    setOpen(false);
  });
  if (!open)
    return (
      <Button
        kind="text"
        flush
        small
        icon="edit"
        label="Change due date or note"
        onPress={() => setOpen(true)}
        testID="change-assignment"
      />
    );
  return (
    <Card style={{ maxWidth: 560 }}>
      <Form label="Due date and note" onSubmit={submit}>
        <DayField
          label="Due on"
          value={form.watch("dueOn")}
          onChange={(day) => form.setValue("dueOn", day)}
          testID="change-due"
        />
        <FormField
          form={form}
          name="note"
          label="Note to all of them"
          check={(text) => (text.length > 2000 ? "At most 2,000 characters." : null)}
          multiline
          rows={3}
        />
        <FormEnd small {...end} sendLabel="Keep this" busyLabel="Keeping it" testID="keep-assignment" />
      </Form>
    </Card>
  );
}
