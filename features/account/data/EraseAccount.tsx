import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { session } from "@/features/api/session";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import { Text } from "@/features/ui/Text";
import { Button } from "@/features/ui/Button";
import type { Erasure } from "@/shared/contract/account";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { KnownPasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";
import { View } from "react-native";

/** Says what happens, and asks the password before it does. */
export function EraseAccount({ onErased }: { onErased: (eraseAt: string) => void }) {
  const [asked, setAsked] = useState(false);
  const { form, end, submit } = useServerForm({ password: "" }, async (typed) => {
    const { eraseAt } = await http.post<Erasure>("/account/erasure", typed);
    onErased(eraseAt);
    session.leave();
  });
  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>Erase the account</Heading>
      <Text variant="small">
        You are signed out everywhere at once. After 14 days the account goes for good, with everything in it. Signing
        in before that day keeps it.
      </Text>
      {asked ? (
        <Form label="Erase the account" onSubmit={submit}>
          <KnownPasswordField form={form} name="password" testID="erase-password" />
          <FormEnd small {...end} sendLabel="Erase my account" busyLabel="One moment" testID="erase" />
          <View style={{ alignSelf: "flex-start", marginLeft: -8 }}>
            <Button kind="text" small label="Keep it" onPress={() => setAsked(false)} />
          </View>
        </Form>
      ) : (
        <View style={{ alignSelf: "flex-start", marginLeft: -8 }}>
          <Button
            kind="text"
            small
            icon="trash"
            label="Erase the account"
            onPress={() => setAsked(true)}
            testID="ask-erase"
          />
        </View>
      )}
    </Card>
  );
}
