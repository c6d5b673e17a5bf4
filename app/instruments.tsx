import { InstrumentList } from "@/features/instruments/InstrumentList";
import { Screen } from "@/features/ui/Screen";

export default function InstrumentsRoute() {
  return (
    <Screen title="Instruments" wide>
      <InstrumentList />
    </Screen>
  );
}
