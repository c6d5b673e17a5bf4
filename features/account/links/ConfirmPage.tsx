import { useCallback, useEffect, useRef, useState } from "react";
import { View } from "react-native";
import { ApiError } from "@/features/api/apiError";
import { http } from "@/features/api/httpClient";
import { keptTokens } from "@/features/api/keptTokens";
import { useTokenOverSignIn } from "@/features/api/useTokenOverSignIn";
import { session } from "@/features/api/session";
import { useSession } from "@/features/api/SessionProvider";
import { EmptyState } from "@/features/ui/EmptyState";
import { ErrorState } from "@/features/ui/ErrorState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Account } from "@/shared/contract/account";

type Outcome = { email: string } | ApiError | null;

/** Shows that an address is one's own, by the link from the mail; only for whoever is signed in. */
export function ConfirmPage() {
  const { status } = useSession();
  const token = useTokenOverSignIn(keptTokens.confirm);
  const [outcome, setOutcome] = useState<Outcome>(null);
  const begun = useRef(false);

  const confirm = useCallback(async () => {
    setOutcome(null);
    try {
      const account = await http.post<Account>("/account/email/confirm", { token });
      keptTokens.confirm.clear();
      session.accountChanged(account);
      setOutcome({ email: account.email });
    } catch (error) {
      const refused = error instanceof ApiError ? error : ApiError.offline();
      if (refused.refused) keptTokens.confirm.clear();
      setOutcome(refused);
    }
  }, [token]);
  useEffect(() => {
    if (status !== "signed-in" || token === "" || begun.current) return;
    begun.current = true;
    void confirm();
  }, [status, token, confirm]);

  if (outcome && "email" in outcome)
    return (
      <EmptyState
        testID="confirmed"
        title="Your address is confirmed"
        text={`${outcome.email} is the address of your account.`}
        action={<LinkButton label="To your account" href="/account" />}
      />
    );
  if (token === "" || outcome?.code === "link-not-valid")
    return (
      <EmptyState
        testID="link-not-valid"
        title="This link does not work"
        text="It is used up, too old, not complete, or belongs to another account. You find in your account which address is confirmed, and can ask for a new link there."
        action={<LinkButton label="To your account" href="/account" />}
      />
    );
  if (outcome)
    return (
      <ErrorState
        title="The address is not confirmed yet"
        text={outcome.message}
        onRetry={outcome.refused ? undefined : () => void confirm()}
      />
    );
  if (status === "visitor")
    return (
      <EmptyState
        testID="confirm-sign-in"
        title="Sign in to confirm"
        text="Only you can say that the address is yours. Sign in with the account that it belongs to; then it is confirmed by itself."
        action={<LinkButton label="Sign in" href="/account/sign-in?next=%2Faccount%2Fconfirm" testID="to-sign-in" />}
      />
    );
  return (
    <View style={{ maxWidth: 480, width: "100%" }}>
      <Skeleton bars={[{ height: 24, width: 220 }, { width: "80%" }]} words="Confirming your address" />
    </View>
  );
}
