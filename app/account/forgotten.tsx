import { ForgottenForm } from "@/features/account/links/ForgottenForm";
import { Screen } from "@/features/ui/Screen";

export default function ForgottenRoute() {
  return (
    <Screen title="Forgotten password" back="/account/sign-in">
      <ForgottenForm />
    </Screen>
  );
}
