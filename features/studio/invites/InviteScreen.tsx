import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { useServerForm } from "@/features/api/useServerForm";
import { Choice } from "@/features/ui/Choice";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { QueryState } from "@/features/ui/QueryState";
import { Select } from "@/features/ui/Select";
import { useLayout } from "@/features/ui/useLayout";
import type { Invite } from "@/shared/contract/studio/invite";
import type { Studio } from "@/shared/contract/studio/studio";
import { plural } from "@/shared/music/countWords";
import { studioQueries, useStudioRefresh } from "../studioQueries";
import { InviteRows } from "./InviteRows";
import { checkAddresses, readAddresses } from "./readAddresses";

type InvitedRole = Invite["role"];
const roles: { value: InvitedRole; label: string; hint: string }[] = [
  { value: "pupil", label: "As pupils", hint: "They get songs, and decide what you see of them." },
  {
    value: "co-teacher",
    label: "As teachers beside you",
    hint: "They see what you see, and may do almost all you may.",
  },
];

/** Invites many at once by e-mail, and shows who was invited and what became of it. */
export function InviteScreen({ studio, now }: { studio: Studio; now: Date }) {
  const wide = useLayout() === "wide";
  const query = useQuery(studioQueries.invites(studio.id));
  const column = wide ? ({ flexGrow: 1, flexBasis: 0, minWidth: 0, gap: 16 } as const) : ({ gap: 16 } as const);
  return (
    <View style={{ flexDirection: wide ? "row" : "column", gap: 32 }}>
      <View style={column}>
        <InviteForm studio={studio} />
      </View>
      <View style={column}>
        <Heading level={2}>Invited</Heading>
        <QueryState query={query} title="The invitations could not be listed">
          {(invites) => (
            <InviteRows studioId={studio.id} invites={invites} owner={studio.me.role === "owner"} now={now} />
          )}
        </QueryState>
      </View>
    </View>
  );
}

function InviteForm({ studio }: { studio: Studio }) {
  const refresh = useStudioRefresh();
  const groups = useQuery(studioQueries.groups(studio.id)).data ?? [];
  const [role, setRole] = useState<InvitedRole>("pupil");
  const [group, setGroup] = useState("");
  const [sent, setSent] = useState<number | null>(null);
  const { form, end, submit } = useServerForm({ emails: "" }, async ({ emails }) => {
    setSent(null);
    const asked = readAddresses(emails).emails;
    const groupId = role === "pupil" && group !== "" ? group : null;
    await http.post(`/studios/${studio.id}/invites`, { emails: asked, role, groupId });
    setSent(asked.length);
    form.reset({ emails: "" });
    await refresh();
  });
  return (
    <Form label="Invite by e-mail" onSubmit={submit}>
      <FormField
        form={form}
        name="emails"
        label="E-mail addresses"
        hint="One a line, or with commas between them. Each gets a link of their own, good once, for seven days."
        check={checkAddresses}
        multiline
        rows={5}
        inputMode="email"
        autoComplete="off"
        testID="invite-emails"
      />
      <Choice label="They join" options={roles} value={role} onChange={setRole} testID="invite-role" />
      {role === "pupil" && groups.length > 0 && (
        <Select
          label="Into a group"
          options={[{ value: "", label: "No group" }, ...groups.map(({ id, name }) => ({ value: id, label: name }))]}
          value={group}
          onChange={setGroup}
          testID="invite-group"
        />
      )}
      {sent !== null && (
        <Notice kind="good" title={`${plural(sent, "invitation")} on the way`} testID="invited">
          Whoever follows the link sees what you would see of them before they accept.
        </Notice>
      )}
      <FormEnd {...end} sendLabel="Send the invitations" busyLabel="Sending the invitations" testID="send-invites" />
    </Form>
  );
}
