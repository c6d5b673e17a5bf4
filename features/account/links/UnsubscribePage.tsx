import { useMutation } from "@tanstack/react-query";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { useMailedToken } from "@/features/api/useMailedToken";
import { Button } from "@/features/ui/Button";
import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Notice } from "@/features/ui/Notice";
import { Text } from "@/features/ui/Text";
import type { Unsubscribed } from "@/shared/contract/mail";
import { mailWords } from "../mail/mailWords";
import { NarrowCard } from "./NarrowCard";

/** Ends one kind of mail, without signing in. */
export function UnsubscribePage() {
  const token = useMailedToken();
  const end = useMutation({
    mutationFn: () => http.open<Unsubscribed>(`/mail/unsubscribe?token=${encodeURIComponent(token)}`),
  });
  const choices = <LinkButton kind="secondary" label="Choose which mails you get" href="/account/mail" />;
  if (token === "" || (end.error instanceof ApiError && end.error.status === 404))
    return (
      <EmptyState
        testID="link-not-valid"
        title="This link does not work"
        text="It is not complete, or its account is gone. Signed in, you choose which mails you get."
        action={choices}
      />
    );
  if (end.data)
    return (
      <EmptyState
        testID="unsubscribed"
        title="No more of these mails"
        text={`“${mailWords[end.data.kind].label}” is switched off. You can switch it on again in your account.`}
        action={choices}
      />
    );
  return (
    <NarrowCard>
      <Text variant="body">Stop the kind of mail that this link came with? All other mails go on as they are.</Text>
      {end.error && (
        <Notice kind="error" testID="form-problem">
          {end.error.message}
        </Notice>
      )}
      <Button
        label={end.isPending ? "Stopping them" : "Stop these mails"}
        busy={end.isPending}
        onPress={() => end.mutate()}
        testID="unsubscribe"
      />
    </NarrowCard>
  );
}
