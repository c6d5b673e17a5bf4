import { View } from "react-native";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import type { Instrument } from "@/shared/instruments/instrument";
import type { Way } from "@/shared/ways/way";
import { WayGrids } from "./WayGrids";

export interface BestWayProps {
  /** best first; undefined while they are searched, null where they could not be */
  found: readonly Way[] | null | undefined;
  instrument: Instrument;
}

/** The best way into a key in full: what to do, what it costs, its shapes and its cautions. */
export function BestWay({ found, instrument }: BestWayProps) {
  if (found === undefined) return <Skeleton bars={[{ width: "80%" }, { height: 96 }]} words="Looking for ways" />;
  const way = found?.[0];
  if (!way)
    return (
      <Text variant="small" tone="soft">
        No way on this instrument. Try another one.
      </Text>
    );
  return (
    <View>
      <Text variant="strong" style={{ fontSize: 15, lineHeight: 20 }}>
        {way.title}
      </Text>
      <Text variant="small" tone="soft" style={{ fontSize: 13, lineHeight: 18 }}>
        {way.cost}
      </Text>
      <WayGrids way={way} instrument={instrument} />
      {way.cautions.map((caution) => (
        <Text key={caution} variant="tiny" tone="honey" style={{ marginTop: 6 }}>
          {caution}
        </Text>
      ))}
    </View>
  );
}
