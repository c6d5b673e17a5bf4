import { AccountPage } from "@/features/account/home/AccountPage";
import { Screen } from "@/features/ui/Screen";

export default function AccountRoute() {
  return (
    <Screen title="Account" wide>
      <AccountPage />
    </Screen>
  );
}
