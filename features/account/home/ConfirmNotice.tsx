import { useMutation } from "@tanstack/react-query";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { session } from "@/features/api/session";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { Account } from "@/shared/contract/account";

async function resend(): Promise<void> {
  try {
    await http.post("/account/email/resend");
  } catch (error) {
    if (!(error instanceof ApiError) || error.code !== "already-confirmed") throw error;
    session.accountChanged(await http.get<Account>("/account"));
  }
}

/** While nobody has shown that the address is theirs. */
export function ConfirmNotice({ account }: { account: Account }) {
  const again = useMutation({ mutationFn: resend });
  if (account.confirmed) return null;
  return (
    <Notice
      kind="caution"
      title="Confirm your e-mail address"
      testID="unconfirmed"
      action={
        <View style={{ alignSelf: "flex-start", marginTop: 4 }}>
          <Button
            kind="secondary"
            small
            label={again.isPending ? "Sending" : "Send the link once more"}
            busy={again.isPending}
            onPress={() => again.mutate()}
            testID="resend"
          />
        </View>
      }
    >
      <Text variant="small">
        {again.isSuccess
          ? "A new link is on its way. Nothing there? Look into the folder for spam."
          : "Open the link in the mail that we sent you. Until then nothing of yours can be shared, and codes cannot be switched on."}
      </Text>
      {again.error && (
        <Text variant="small" tone="brick">
          {again.error.message}
        </Text>
      )}
    </Notice>
  );
}
