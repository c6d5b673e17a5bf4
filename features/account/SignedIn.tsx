import type { Href } from "expo-router";
import type { ReactNode } from "react";
import { View } from "react-native";
import { session as sessionStore } from "@/features/api/session";
import { useSession } from "@/features/api/SessionProvider";
import { EmptyState } from "@/features/ui/EmptyState";
import { ErrorState } from "@/features/ui/ErrorState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Skeleton } from "@/features/ui/Skeleton";
import type { Account } from "@/shared/contract/account";

export interface SignedInProps {
  /** where one stands, to come back after signing in */
  here: string;
  /** the whole width of the page instead of a column */
  wide?: boolean;
  children: (account: Account) => ReactNode;
}

/** A page of the account: for whoever is signed in; anybody else is asked to. */
export function SignedIn({ here, wide = false, children }: SignedInProps) {
  const { account, status, problem } = useSession();
  if (account)
    return <View style={{ width: "100%", ...(wide ? null : { maxWidth: 560 }), gap: 16 }}>{children(account)}</View>;
  if (status === "visitor")
    return (
      <EmptyState
        testID="sign-in-first"
        title="Sign in first"
        text="This page belongs to an account. Sign in, and you come back here."
        action={
          <LinkButton
            label="Sign in"
            href={`/account/sign-in?next=${encodeURIComponent(here)}` as Href}
            testID="to-sign-in"
          />
        }
      />
    );
  if (problem)
    return (
      <ErrorState
        title="Your account cannot be reached"
        text={`${problem.message} What is kept in it is safe.`}
        onRetry={() => void sessionStore.settled().catch(() => undefined)}
      />
    );
  return <Skeleton words="Looking whether you are signed in" />;
}
