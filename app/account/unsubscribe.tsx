import { UnsubscribePage } from "@/features/account/links/UnsubscribePage";
import { Screen } from "@/features/ui/Screen";

export default function UnsubscribeRoute() {
  return (
    <Screen title="Stop a kind of mail" back="/account">
      <UnsubscribePage />
    </Screen>
  );
}
