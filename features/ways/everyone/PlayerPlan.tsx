import { useQuery } from "@tanstack/react-query";
import { View } from "react-native";
import { Choice } from "@/features/ui/Choice";
import { ErrorState } from "@/features/ui/ErrorState";
import { Skeleton } from "@/features/ui/Skeleton";
import { Text } from "@/features/ui/Text";
import { TextLink } from "@/features/ui/TextLink";
import { whyPath } from "@/features/ui/whyPath";
import type { Player } from "@/shared/contract/lineUp";
import type { Instrument } from "@/shared/instruments/instrument";
import type { KeyName } from "@/shared/music/keyName";
import type { Way } from "@/shared/ways/way";
import { differentWays } from "@/shared/ways/wayOrder";
import { wayQueries, type Playing } from "../wayQueries";
import { WayGrids } from "../WayGrids";
import { usualWishes } from "../wishes/wishes";
import { wayInUse } from "./playersOf";

export interface PlayerPlanProps {
  player: Player;
  instrument: Instrument;
  songId: string;
  chords: Omit<Playing, "instrument" | "wishes">;
  into: KeyName;
  shift: number;
  onWay: (way: Way) => void;
}

/** How many ways are shown for each player. */
const most = 3;

/** One player's best ways into the shared key, the shapes of the one in use, and what to take care of. */
export function PlayerPlan({ player, instrument, songId, chords, into, shift, onWay }: PlayerPlanProps) {
  // What one person would rather do without says nothing of the others.
  const search = useQuery(wayQueries.into({ ...chords, instrument, wishes: usualWishes }, into));
  if (search.error)
    return (
      <ErrorState
        title="The ways could not be found"
        text="The search did not run. The line-up is safe; try again."
        onRetry={() => void search.refetch()}
      />
    );
  if (!search.data)
    return <Skeleton bars={[{ height: 56 }, { height: 56 }, { height: 110 }]} words="Looking for ways to play it" />;
  const best = differentWays(search.data, most);
  const used = wayInUse(search.data, player, into.tonic);
  if (!used)
    return (
      <Text variant="small" tone="soft">
        None of the song’s chords can be played on it in this key. Try another key or another instrument.
      </Text>
    );
  const ways = best.includes(used) ? best : [...best, used];
  return (
    <View style={{ gap: 10 }}>
      <Choice
        label={`The way ${player.name} plays it`}
        hideLabel
        testID="player-ways"
        options={ways.map((way) => ({ value: idOf(way), label: way.title, hint: way.cost }))}
        value={idOf(used)}
        onChange={(id) => {
          const way = ways.find((each) => idOf(each) === id);
          if (way) onWay(way);
        }}
      />
      <WayGrids way={used} instrument={instrument} />
      {used.cautions.map((caution) => (
        <Text key={caution} variant="tiny" tone="honey">
          {caution}
        </Text>
      ))}
      <View {...screenOnly} style={{ flexDirection: "row" }}>
        <TextLink href={whyPath(songId, into, shift, { instrument: instrument.id, way: used })}>
          Why this way works
        </TextLink>
      </View>
    </View>
  );
}

const screenOnly = { dataSet: { screen: "" } } as object;

function idOf({ retune, capo, shapeKey }: Way): string {
  return `${retune},${capo},${shapeKey}`;
}
