import { SignedIn } from "@/features/account/SignedIn";
import { SharingPage } from "@/features/studio/consent/SharingPage";
import { Screen } from "@/features/ui/Screen";

export default function SharingRoute() {
  return (
    <Screen title="What teachers see" crumb={{ label: "Account", href: "/account" }}>
      <SignedIn here="/account/sharing">{() => <SharingPage now={new Date()} />}</SignedIn>
    </Screen>
  );
}
