import { useState } from "react";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { session } from "@/features/api/session";
import { Button } from "@/features/ui/Button";
import { Card } from "@/features/ui/Card";
import { Heading } from "@/features/ui/Heading";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { Account } from "@/shared/contract/account";

/** Who is signed in, and the way out. */
export function SignedInCard({ account }: { account: Account }) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiError | null>(null);

  async function signOut() {
    setBusy(true);
    setProblem(null);
    try {
      await session.signOut();
      // The button is gone, so the focus needs a place.
      document.querySelector<HTMLElement>("h1")?.focus();
    } catch (error) {
      setProblem(error instanceof ApiError ? error : ApiError.offline());
      setBusy(false);
    }
  }

  return (
    <Card style={{ gap: 12 }}>
      <Heading level={2}>Signed in</Heading>
      <Text variant="strong" testID="account-email" style={{ overflowWrap: "anywhere" } as object}>
        {account.email}
      </Text>
      <Text variant="small" tone="soft">
        Your voices, songs and keys are in your account. You find them on every device you sign in on.
      </Text>
      {problem && (
        <Notice kind={problem.code === "offline" ? "offline" : "error"} title="You are still signed in">
          {problem.message}
        </Notice>
      )}
      <View style={{ alignSelf: "flex-start" }}>
        <Button
          kind="secondary"
          small
          label={busy ? "Signing out" : "Sign out"}
          busy={busy}
          onPress={() => void signOut()}
          testID="sign-out"
        />
      </View>
    </Card>
  );
}
