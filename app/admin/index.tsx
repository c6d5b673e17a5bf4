import { AdminOnly } from "@/features/account/admin/AdminOnly";
import { PeoplePage } from "@/features/account/admin/PeoplePage";
import { Screen } from "@/features/ui/Screen";

export default function PeopleRoute() {
  return (
    <Screen title="People" crumb={{ label: "Account", href: "/account" }} wide>
      <AdminOnly here="people">
        <PeoplePage />
      </AdminOnly>
    </Screen>
  );
}
