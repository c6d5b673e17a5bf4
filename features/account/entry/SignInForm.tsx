import { View } from "react-native";
import { TextLink } from "@/features/ui/TextLink";
import { checkKnownPassword } from "../forms/checkPassword";
import { CredentialsForm } from "./CredentialsForm";
import { MovesIn } from "./MovesIn";
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
      <View style={{ alignSelf: "flex-start" }}>
        <TextLink href="/account/forgotten" testID="to-forgotten">
          Forgotten password
        </TextLink>
      </View>
      <MovesIn />
    </CredentialsForm>
  );
}
