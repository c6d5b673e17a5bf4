import { MailChoices } from "@/features/account/mail/MailChoices";
import { SignedIn } from "@/features/account/SignedIn";
import { Screen } from "@/features/ui/Screen";

export default function MailRoute() {
  return (
    <Screen title="Mail" crumb={{ label: "Account", href: "/account" }}>
      <SignedIn here="/account/mail">{() => <MailChoices />}</SignedIn>
    </Screen>
  );
}
