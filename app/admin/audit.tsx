import { AdminOnly } from "@/features/account/admin/AdminOnly";
import { EventsPage } from "@/features/account/admin/EventsPage";
import { Screen } from "@/features/ui/Screen";

export default function AuditRoute() {
  return (
    <Screen title="Security events" crumb={{ label: "Account", href: "/account" }} wide>
      <AdminOnly here="events">
        <EventsPage />
      </AdminOnly>
    </Screen>
  );
}
