import { MovesIn } from "./MovesIn";
import { CredentialsForm } from "./CredentialsForm";
import { checkNewPassword } from "../forms/checkPassword";
import type { useEntry } from "./useEntry";

/** Opens an account. */
export function SignUpForm({ entry }: { entry: ReturnType<typeof useEntry> }) {
  return (
    <CredentialsForm
      label="Sign up"
      sendLabel="Sign up"
      busyLabel="Opening your account"
      passwordHint="At least 12 characters. A few words in a row are easy to keep in mind; pasting is fine."
      passwordKind="new-password"
      checkPassword={checkNewPassword}
      {...entry}
    >
      <MovesIn />
    </CredentialsForm>
  );
}
