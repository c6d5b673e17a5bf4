import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { useServerForm } from "@/features/api/useServerForm";
import { Button } from "@/features/ui/Button";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import type { StudioGroup } from "@/shared/contract/studio/group";
import type { RosterRow } from "@/shared/contract/studio/roster";
import { PupilTicks } from "../PupilTicks";
import { checkName } from "../settings/studioForm";
import { useStudioRefresh } from "../studioQueries";

export interface GroupFormProps {
  studioId: string;
  pupils: readonly Pick<RosterRow, "memberId" | "name">[];
  /** absent for a new one */
  group?: StudioGroup;
  onDone: () => void;
}

/** Name and pupils of a group. */
export function GroupForm({ studioId, pupils, group, onDone }: GroupFormProps) {
  const refresh = useStudioRefresh();
  const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set(group?.memberIds));
  const { form, end, submit } = useServerForm({ name: group?.name ?? "" }, async ({ name }) => {
    const body = { name: name.trim(), memberIds: [...chosen] };
    await (group
      ? http.put(`/studios/${studioId}/groups/${group.id}`, body)
      : http.post(`/studios/${studioId}/groups`, body));
    await refresh();
    onDone();
  });
  return (
    <Form label={group ? `Change ${group.name}` : "A new group"} onSubmit={submit}>
      <FormField form={form} name="name" label="Name of the group" check={checkName} testID="group-name" />
      <PupilTicks label="Who is in it" pupils={pupils} chosen={chosen} onChosen={setChosen} />
      <FormEnd small {...end} sendLabel="Keep the group" busyLabel="Keeping it" testID="keep-group" />
      <Button kind="text" flush small label="Leave it as it is" onPress={onDone} />
    </Form>
  );
}
