import { SignedIn } from "@/features/account/SignedIn";
import { NewStudioForm } from "@/features/studio/settings/NewStudioForm";
import { Screen } from "@/features/ui/Screen";

export default function NewStudioRoute() {
  return (
    <Screen title="A new studio" crumb={{ label: "Studio", href: "/studio" }}>
      <SignedIn here="/studio/new">{() => <NewStudioForm />}</SignedIn>
    </Screen>
  );
}
