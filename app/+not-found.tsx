import { EmptyState } from "@/features/ui/EmptyState";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";

export default function NotFoundRoute() {
  return (
    <Screen title="No such page" back="/">
      <EmptyState
        title="Nothing stands at this address"
        text="The address may be mistyped, or what stood here was removed. What you kept is safe."
        action={<LinkButton href="/" label="Go to the first page" small />}
      />
    </Screen>
  );
}
