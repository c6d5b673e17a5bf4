import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { useRadioKeys } from "@/features/ui/useRadioKeys";
import { webProps } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import type { Way } from "@/shared/ways/way";
import { WayCard } from "./WayCard";

export interface WayListProps {
  ways: readonly Way[];
  instrument: Instrument;
  chosen: number;
  onChoose: (index: number) => void;
}

/** The ways as a radio group. A press anywhere on a card chooses it; the keyboard has one stop in its head. */
export function WayList({ ways, instrument, chosen, onChoose }: WayListProps) {
  const values = ways.map((_, index) => String(index));
  const keys = useRadioKeys(values, String(chosen), (value) => onChoose(Number(value)));
  return (
    <View role="radiogroup" aria-label="Ways to play it" testID="ways" style={{ gap: 9 }}>
      {ways.map((way, index) => (
        <View key={`${way.retune},${way.capo},${way.shapeKey}`} {...webProps({ onClick: () => onChoose(index) })}>
          <Card selected={index === chosen} style={{ padding: index === chosen ? 11 : 12, paddingBottom: 10 }}>
            <WayCard
              way={way}
              instrument={instrument}
              chosen={index === chosen}
              radio={keys(index)}
              onChoose={() => onChoose(index)}
            />
          </Card>
        </View>
      ))}
    </View>
  );
}
