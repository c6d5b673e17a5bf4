import type { Href } from "expo-router";
import { View } from "react-native";
import { Card } from "@/features/ui/Card";
import { useRadioKeys } from "@/features/ui/useRadioKeys";
import { webProps, webStyle } from "@/features/ui/webStyle";
import type { Instrument } from "@/shared/instruments/instrument";
import type { Way } from "@/shared/ways/way";
import { WayCard, type ShapeTicks, type WayLinks } from "./WayCard";

export interface WayListProps {
  ways: readonly Way[];
  instrument: Instrument;
  chosen: number;
  onChoose: (index: number) => void;
  /** how many stand beside each other */
  columns?: number;
  full?: boolean;
  ticks?: ShapeTicks | undefined;
  links?: WayLinks | undefined;
  why?: ((way: Way) => Href) | undefined;
}

/** The ways as a radio group. A press anywhere on a card chooses it; the keyboard has one stop in its head. */
export function WayList({
  ways,
  instrument,
  chosen,
  onChoose,
  columns = 1,
  full = false,
  ticks,
  links,
  why,
}: WayListProps) {
  const values = ways.map((_, index) => String(index));
  const keys = useRadioKeys(values, String(chosen), (value) => onChoose(Number(value)));
  return (
    <View
      role="radiogroup"
      aria-label="Ways to play it"
      testID="ways"
      style={
        columns === 1
          ? { gap: 9 }
          : webStyle({ display: "grid", gridTemplateColumns: `repeat(${columns}, minmax(0, 1fr))`, gap: 16 })
      }
    >
      {ways.map((way, index) => (
        <View key={`${way.retune},${way.capo},${way.shapeKey}`} {...webProps({ onClick: () => onChoose(index) })}>
          <Card
            selected={index === chosen}
            style={{ flexGrow: 1, padding: index === chosen ? 11 : 12, paddingBottom: 10 }}
          >
            <WayCard
              way={way}
              instrument={instrument}
              chosen={index === chosen}
              radio={keys(index)}
              onChoose={() => onChoose(index)}
              full={full}
              ticks={ticks}
              links={links}
              why={why?.(way)}
            />
          </Card>
        </View>
      ))}
    </View>
  );
}
