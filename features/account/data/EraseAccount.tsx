import { http } from "@/features/api/httpClient";
import { session } from "@/features/api/session";
import { Form } from "@/features/ui/Form";
import { Text } from "@/features/ui/Text";
import type { Erasure } from "@/shared/contract/account";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { KnownPasswordField } from "../forms/PasswordField";
import { UnfoldingCard } from "../forms/UnfoldingCard";
import { useServerForm } from "@/features/api/useServerForm";

interface EraseAccountProps {
  onErased: (eraseAt: string) => void;
}

function ErasureForm({ onErased }: EraseAccountProps) {
  const { form, end, submit } = useServerForm({ password: "" }, async (typed) => {
    const { eraseAt } = await http.post<Erasure>("/account/erasure", typed);
    onErased(eraseAt);
    session.leave();
  });
  return (
    <Form label="Erase the account" onSubmit={submit}>
      <KnownPasswordField form={form} name="password" testID="erase-password" />
      <FormEnd small {...end} sendLabel="Erase my account" busyLabel="One moment" testID="erase" />
    </Form>
  );
}

/** Says what happens, and asks the password before it does. */
export function EraseAccount({ onErased }: EraseAccountProps) {
  return (
    <UnfoldingCard
      title="Erase the account"
      openLabel="Erase the account"
      closeLabel="Keep it"
      icon="trash"
      quiet
      testID="ask-erase"
      form={() => <ErasureForm onErased={onErased} />}
    >
      <Text variant="small">
        You are signed out everywhere at once. After 14 days the account goes for good, with everything in it. Signing
        in before that day keeps it.
      </Text>
    </UnfoldingCard>
  );
}
