import { InstrumentList } from "@/features/instruments/list/InstrumentList";
import { LinkButton } from "@/features/ui/LinkButton";
import { Screen } from "@/features/ui/Screen";

export default function InstrumentsRoute() {
  return (
    <Screen
      title="Instruments"
      wide
      footer={<LinkButton href="/instruments/new" icon="plus" label="New instrument" testID="new-instrument" />}
    >
      <InstrumentList />
    </Screen>
  );
}
