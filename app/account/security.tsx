import { ChangeEmail } from "@/features/account/security/ChangeEmail";
import { ChangePassword } from "@/features/account/security/ChangePassword";
import { SecondFactorCard } from "@/features/account/security/SecondFactorCard";
import { SignedIn } from "@/features/account/SignedIn";
import { Screen } from "@/features/ui/Screen";

export default function SecurityRoute() {
  return (
    <Screen title="Signing in" crumb={{ label: "Account", href: "/account" }}>
      <SignedIn here="/account/security">
        {(account) => (
          <>
            <ChangeEmail account={account} />
            <ChangePassword />
            <SecondFactorCard account={account} />
          </>
        )}
      </SignedIn>
    </Screen>
  );
}
