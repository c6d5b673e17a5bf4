import { AccountPage } from "@/features/account/AccountPage";
import { Screen } from "@/features/ui/Screen";

export default function AccountRoute() {
  return (
    <Screen title="Account" wide>
      <AccountPage />
    </Screen>
  );
}
