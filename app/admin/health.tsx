import { AdminOnly } from "@/features/account/admin/AdminOnly";
import { HealthPage } from "@/features/account/admin/HealthPage";
import { Screen } from "@/features/ui/Screen";

export default function HealthRoute() {
  return (
    <Screen title="Health" crumb={{ label: "Account", href: "/account" }} wide>
      <AdminOnly here="health">
        <HealthPage />
      </AdminOnly>
    </Screen>
  );
}
