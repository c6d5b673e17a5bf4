import { useState, type ReactNode } from "react";
import { http } from "@/features/api/httpClient";
import { useServerForm } from "@/features/api/useServerForm";
import { Form } from "@/features/ui/Form";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { useStudioRefresh } from "../studioQueries";

export interface GuardianFormProps {
  /** who was named before */
  asked: string | null;
  /** what is said over it until somebody is asked here */
  before?: ReactNode;
}

/** Names a parent or guardian, who then gets a mail and decides. */
export function GuardianForm({ asked, before }: GuardianFormProps) {
  const refresh = useStudioRefresh();
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { form, end, submit } = useServerForm({ email: asked ?? "" }, async ({ email }) => {
    setSentTo(null);
    await http.post("/guardian", { email: email.trim() });
    await refresh();
    setSentTo(email.trim());
  });
  return (
    <Form label="Parent or guardian" onSubmit={submit}>
      {sentTo === null && before}
      <Text>
        At your age a parent or guardian confirms first. They get a mail with a link. Until they agree, your teachers
        see only your name, and you hand in nothing.
      </Text>
      <FormField
        form={form}
        name="email"
        label="E-mail address of a parent or guardian"
        check={(email) => (email.trim() === "" ? "Type their e-mail address." : null)}
        autoComplete="off"
        inputMode="email"
        testID="guardian-email"
      />
      {sentTo !== null && (
        <Notice kind="good" title="The mail is on its way" testID="guardian-asked">
          {`It goes to ${sentTo}. The link in it is good for 14 days.`}
        </Notice>
      )}
      <FormEnd
        {...end}
        small
        sendLabel={asked === null && sentTo === null ? "Ask them" : "Ask once more"}
        busyLabel="Asking them"
        testID="ask-guardian"
      />
    </Form>
  );
}
