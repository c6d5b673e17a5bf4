import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { Form } from "@/features/ui/Form";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { Account } from "@/shared/contract/account";
import { checkAddress } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { KnownPasswordField } from "../forms/PasswordField";
import { UnfoldingCard } from "../forms/UnfoldingCard";
import { useServerForm } from "@/features/api/useServerForm";

function NewAddressForm({ onAsked }: { onAsked: (email: string) => void }) {
  const { form, end, submit } = useServerForm({ email: "", password: "" }, async (typed) => {
    const email = typed.email.trim();
    await http.post("/account/email", { email, password: typed.password });
    onAsked(email);
  });
  return (
    <Form label="Change the e-mail address" onSubmit={submit}>
      <FormField
        form={form}
        name="email"
        label="New e-mail address"
        check={checkAddress}
        autoComplete="email"
        inputMode="email"
        testID="new-email"
      />
      <KnownPasswordField form={form} name="password" testID="email-password" />
      <FormEnd small {...end} sendLabel="Change the address" busyLabel="Sending the link" testID="send-email" />
    </Form>
  );
}

/** Another address for the account; the present one stays until the new one is confirmed. */
export function ChangeEmail({ account }: { account: Account }) {
  const [sentTo, setSentTo] = useState<string | null>(null);
  return (
    <UnfoldingCard
      title="E-mail address"
      openLabel="Change the address"
      closeLabel="Not now"
      testID="change-email"
      form={(fold) => (
        <NewAddressForm
          onAsked={(email) => {
            setSentTo(email);
            fold();
          }}
        />
      )}
    >
      <Text variant="body" style={{ overflowWrap: "anywhere" } as object}>
        {`${account.email}, ${account.confirmed ? "confirmed" : "not confirmed yet"}`}
      </Text>
      {sentTo !== null && (
        <Notice kind="good" testID="email-asked">
          {`A link is on its way to ${sentTo}. Until you open it, your address stays as it is.`}
        </Notice>
      )}
    </UnfoldingCard>
  );
}
