import { countryOptions } from "@/features/account/data/countryOptions";
import { InvitePage } from "@/features/studio/join/InvitePage";
import { Screen } from "@/features/ui/Screen";

export default function InviteRoute() {
  return (
    <Screen title="An invitation" wide>
      <InvitePage countries={countryOptions} />
    </Screen>
  );
}
