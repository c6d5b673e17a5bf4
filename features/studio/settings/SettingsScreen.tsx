import { type Href, useRouter } from "expo-router";
import { useState } from "react";
import { View } from "react-native";
import { http } from "@/features/api/httpClient";
import { useServerForm } from "@/features/api/useServerForm";
import { AskedTwice } from "@/features/ui/AskedTwice";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Studio } from "@/shared/contract/studio/studio";
import { useStudioChange, useStudioRefresh } from "../studioQueries";
import { MembersCard } from "./MembersCard";
import { StudioFields } from "./StudioFields";
import { checkPerson, draftOf, readDraft } from "./studioForm";

/** What a teacher changes of a studio: its facts, one's own name, who teaches and who is in it, and its end. */
export function SettingsScreen({ studio }: { studio: Studio }) {
  const wide = useLayout() === "wide";
  const column = wide ? ({ flexGrow: 1, flexBasis: 0, minWidth: 0, gap: 16 } as const) : ({ gap: 16 } as const);
  return (
    <View style={{ flexDirection: wide ? "row" : "column", gap: wide ? 32 : 16 }}>
      <View style={column}>
        <FactsCard studio={studio} />
        <NameCard studio={studio} />
        <Card style={{ gap: 12 }}>
          <Heading level={2}>{studio.me.role === "owner" ? "End of the studio" : "Leave the studio"}</Heading>
          {studio.me.role === "owner" ? <DeleteStudio studio={studio} /> : <LeaveStudio studio={studio} />}
        </Card>
      </View>
      <View style={column}>
        <MembersCard studio={studio} />
      </View>
    </View>
  );
}

function FactsCard({ studio }: { studio: Studio }) {
  const refresh = useStudioRefresh();
  const [kept, setKept] = useState(false);
  const { form, end, submit } = useServerForm(draftOf(studio), async (draft) => {
    setKept(false);
    await http.put(`/studios/${studio.id}`, readDraft(draft));
    await refresh();
    setKept(true);
  });
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>The studio</Heading>
      <Form label="The studio" onSubmit={submit}>
        <StudioFields form={form} owner={studio.me.role === "owner"} />
        {kept && <Notice kind="good">Kept.</Notice>}
        <FormEnd small {...end} sendLabel="Keep this" busyLabel="Keeping it" testID="keep-studio" />
      </Form>
    </Card>
  );
}

/** What one is called in a studio. */
export function NameCard({ studio }: { studio: Studio }) {
  const refresh = useStudioRefresh();
  const [kept, setKept] = useState(false);
  const { form, end, submit } = useServerForm({ memberName: studio.me.name }, async ({ memberName }) => {
    setKept(false);
    await http.put(`/studios/${studio.id}/members/${studio.me.memberId}`, { name: memberName.trim() });
    await refresh();
    setKept(true);
  });
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>Your name there</Heading>
      <Form label="Your name there" onSubmit={submit}>
        <FormField form={form} name="memberName" label="What you are called" check={checkPerson} testID="member-name" />
        {kept && <Notice kind="good">Kept.</Notice>}
        <FormEnd small {...end} sendLabel="Keep this name" busyLabel="Keeping it" testID="keep-name" />
      </Form>
    </Card>
  );
}

function DeleteStudio({ studio }: { studio: Studio }) {
  const router = useRouter();
  const remove = useStudioChange(async () => {
    await http.delete(`/studios/${studio.id}`);
    router.replace("/studio" as Href);
  });
  return (
    <>
      <Text variant="small" tone="soft">
        Groups, assignments, threads and every recording handed in go with it. Your pupils keep their accounts, their
        voices and their songs.
      </Text>
      <AskedTwice
        flush
        label="Delete the studio"
        question={`Delete “${studio.name}”?`}
        text="It goes for everybody in it, with all recordings, and does not come back."
        failed="It is not deleted."
        onRemove={() => remove.mutate()}
        busy={remove.isPending}
        error={remove.error}
        testID="delete-studio"
      />
    </>
  );
}

/** Ends one's own membership. */
export function LeaveStudio({ studio }: { studio: Studio }) {
  const router = useRouter();
  const leave = useStudioChange(async () => {
    await http.delete(`/studios/${studio.id}/members/${studio.me.memberId}`);
    router.replace("/studio" as Href);
  });
  return (
    <AskedTwice
      flush
      icon={null}
      label="Leave the studio"
      question={`Leave “${studio.name}”?`}
      text={
        studio.me.role === "pupil"
          ? "Your teachers see nothing of you any more, and recordings you handed in are deleted. The songs on your shelf stay yours."
          : "You see nothing of the studio any more. Its pupils and threads stay."
      }
      failed="You are still in it."
      confirmLabel="Leave it"
      keepLabel="Stay"
      onRemove={() => leave.mutate()}
      busy={leave.isPending}
      error={leave.error}
      testID="leave-studio"
    />
  );
}
