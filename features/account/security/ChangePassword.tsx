import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { http } from "@/features/api/httpClient";
import { Card } from "@/features/ui/Card";
import { Form } from "@/features/ui/Form";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { checkNewPassword } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { KnownPasswordField, PasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";
import { ApiError } from "@/features/api/apiError";
import { accountQueries } from "../accountQueries";

/** The server calls the present password "password" in its complaints, the form "present". */
function placed(error: unknown): unknown {
  if (!(error instanceof ApiError) || error.code !== "wrong-password") return error;
  return new ApiError(error.status, error.code, error.message, [{ path: "present", message: error.message }]);
}

/** Another password; all other sessions end with it. */
export function ChangePassword() {
  const client = useQueryClient();
  const [done, setDone] = useState(false);
  const { form, end, submit } = useServerForm({ present: "", next: "" }, async (typed) => {
    setDone(false);
    await http.post("/account/password", typed).catch((error: unknown) => {
      throw placed(error);
    });
    form.reset();
    setDone(true);
    await client.invalidateQueries({ queryKey: accountQueries.sessions().queryKey });
  });
  return (
    <Card style={{ gap: 16 }}>
      <Heading level={2}>Password</Heading>
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
        {done && (
          <Notice kind="good" testID="password-changed">
            Your password is changed. You stay signed in here; all other sessions have ended.
          </Notice>
        )}
        <FormEnd small {...end} sendLabel="Change the password" busyLabel="Changing it" testID="change-password" />
      </Form>
    </Card>
  );
}
