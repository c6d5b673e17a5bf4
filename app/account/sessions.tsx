import { SessionsList } from "@/features/account/sessions/SessionsList";
import { SignedIn } from "@/features/account/SignedIn";
import { Screen } from "@/features/ui/Screen";

export default function SessionsRoute() {
  return (
    <Screen title="Sessions" crumb={{ label: "Account", href: "/account" }}>
      <SignedIn here="/account/sessions">{() => <SessionsList />}</SignedIn>
    </Screen>
  );
}
