import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { Form } from "@/features/ui/Form";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import { checkNewPassword } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { KnownPasswordField, PasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";
import { UnfoldingCard } from "../forms/UnfoldingCard";
import { accountQueries } from "../accountQueries";

/** The server calls the present password "password" in its complaints, the form "present". */
function placed(error: unknown): unknown {
  if (!(error instanceof ApiError) || error.code !== "wrong-password") return error;
  return new ApiError(error.status, error.code, error.message, [{ path: "present", message: error.message }]);
}

function NewPasswordForm({ onChanged }: { onChanged: () => void }) {
  const client = useQueryClient();
  const { form, end, submit } = useServerForm({ present: "", next: "" }, async (typed) => {
    await http.post("/account/password", typed).catch((error: unknown) => {
      throw placed(error);
    });
    onChanged();
    await client.invalidateQueries({ queryKey: accountQueries.sessions().queryKey });
  });
  return (
    <Form label="Change the password" onSubmit={submit}>
      <KnownPasswordField form={form} name="present" label="Present password" testID="present-password" />
      <PasswordField
        form={form}
        name="next"
        label="New password"
        check={checkNewPassword}
        hint="At least 12 characters. A few words in a row are easy to keep in mind; pasting is fine."
        autoComplete="new-password"
        testID="next-password"
      />
      <FormEnd small {...end} sendLabel="Change the password" busyLabel="Changing it" testID="send-password" />
    </Form>
  );
}

/** Another password; all other sessions end with it. */
export function ChangePassword() {
  const [done, setDone] = useState(false);
  return (
    <UnfoldingCard
      title="Password"
      openLabel="Change the password"
      closeLabel="Not now"
      testID="change-password"
      form={(fold) => (
        <NewPasswordForm
          onChanged={() => {
            setDone(true);
            fold();
          }}
        />
      )}
    >
      {done ? (
        <Notice kind="good" testID="password-changed">
          Your password is changed. You stay signed in here; all other sessions have ended.
        </Notice>
      ) : (
        <Text variant="small" tone="soft">
          A new one ends all other sessions. You stay signed in here.
        </Text>
      )}
    </UnfoldingCard>
  );
}
