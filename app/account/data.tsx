import { DataPage } from "@/features/account/data/DataPage";
import { Screen } from "@/features/ui/Screen";

export default function DataRoute() {
  return (
    <Screen title="Your data" crumb={{ label: "Account", href: "/account" }}>
      <DataPage />
    </Screen>
  );
}
