import { MovesIn } from "./MovesIn";
import { CredentialsForm } from "./CredentialsForm";
import { checkKnownPassword } from "./checkPassword";
import type { useEntry } from "./useEntry";

/** Opens a session of an existing account. */
export function SignInForm({ entry }: { entry: ReturnType<typeof useEntry> }) {
  return (
    <CredentialsForm
      label="Sign in"
      sendLabel="Sign in"
      busyLabel="Signing in"
      passwordKind="current-password"
      checkPassword={checkKnownPassword}
      {...entry}
    >
      <MovesIn />
    </CredentialsForm>
  );
}
