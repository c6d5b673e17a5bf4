import { ResetForm } from "@/features/account/links/ResetForm";
import { Screen } from "@/features/ui/Screen";

export default function ResetRoute() {
  return (
    <Screen title="New password" back="/account/sign-in">
      <ResetForm />
    </Screen>
  );
}
