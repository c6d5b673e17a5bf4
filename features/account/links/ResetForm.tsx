import { useState } from "react";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { useMailedToken } from "@/features/api/useMailedToken";
import { session } from "@/features/api/session";
import { EmptyState } from "@/features/ui/EmptyState";
import { Form } from "@/features/ui/Form";
import { LinkButton } from "@/features/ui/LinkButton";
import { checkNewPassword } from "../forms/checkPassword";
import { FormEnd } from "@/features/ui/form/FormEnd";
import { PasswordField } from "../forms/PasswordField";
import { useServerForm } from "@/features/api/useServerForm";
import { NarrowCard } from "./NarrowCard";

/** A new password, by the link from the mail. */
export function ResetForm() {
  const token = useMailedToken();
  const [state, setState] = useState<"open" | "done" | "not-valid">(token === "" ? "not-valid" : "open");
  const { form, end, submit } = useServerForm({ password: "" }, async ({ password }) => {
    try {
      await http.open("/auth/reset", { token, password });
    } catch (error) {
      if (!(error instanceof ApiError) || error.code !== "link-not-valid") throw error;
      setState("not-valid");
      return;
    }
    // Every session has ended with it, this browser's too.
    if (session.current().status === "signed-in") session.leave();
    setState("done");
  });
  if (state === "done")
    return (
      <EmptyState
        testID="reset-done"
        title="Your password is changed"
        text="All sessions have ended, on every device. Sign in with the new password."
        action={<LinkButton label="Sign in" href="/account/sign-in" testID="to-sign-in" />}
      />
    );
  if (state === "not-valid")
    return (
      <EmptyState
        testID="link-not-valid"
        title="This link does not work"
        text="It is used up, older than an hour, or not complete. Your password is as it was. Ask for a new link."
        action={<LinkButton label="Ask for a new link" href="/account/forgotten" />}
      />
    );
  return (
    <NarrowCard text="Choose the new password. With it all sessions end, on every device; then you sign in with it.">
      <Form label="New password" onSubmit={submit}>
        <PasswordField
          form={form}
          name="password"
          label="New password"
          check={checkNewPassword}
          hint="At least 12 characters. A few words in a row are easy to keep in mind; pasting is fine."
          autoComplete="new-password"
          testID="password"
        />
        <FormEnd {...end} sendLabel="Keep this password" busyLabel="Changing your password" />
      </Form>
    </NarrowCard>
  );
}
