import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { Form } from "@/features/ui/Form";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { checkAddress } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { FormField } from "@/features/ui/form/FormField";
import { useServerForm } from "@/features/api/useServerForm";
import { NarrowCard } from "./NarrowCard";

/** Asks for a link to choose a new password. Says the same whether or not the address is known. */
export function ForgottenForm() {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { form, end, submit } = useServerForm({ email: "" }, async ({ email }) => {
    setSentTo(null);
    await http.open("/auth/forgotten", { email: email.trim() });
    setSentTo(email.trim());
  });
  return (
    <NarrowCard text="Tell us your e-mail address. If there is an account with it, we send a link to choose a new password.">
      <Form label="Forgotten password" onSubmit={submit}>
        <FormField
          form={form}
          name="email"
          label="E-mail address"
          check={checkAddress}
          autoComplete="email"
          inputMode="email"
          testID="email"
        />
        {sentTo !== null && (
          <Notice kind="good" title="Look into your mail" testID="link-sent">
            <Text variant="small" style={{ overflowWrap: "anywhere" } as object}>
              {`If ${sentTo} has an account, a link is on its way. It is good for one hour. Nothing there? Look into the folder for spam, or ask once more.`}
            </Text>
          </Notice>
        )}
        <FormEnd {...end} sendLabel={sentTo === null ? "Send the link" : "Send it once more"} busyLabel="Sending" />
      </Form>
      <LinkButton kind="text" flush small label="Back to sign in" href="/account/sign-in" />
    </NarrowCard>
  );
}
