import { ConfirmPage } from "@/features/account/links/ConfirmPage";
import { Screen } from "@/features/ui/Screen";

export default function ConfirmRoute() {
  return (
    <Screen title="Confirm your address" back="/account">
      <ConfirmPage />
    </Screen>
  );
}
