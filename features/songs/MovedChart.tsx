import { useMemo } from "react";
import { Text } from "@/features/ui/Text";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import { parseChart, transposeChart } from "@/shared/songs/chart";
import { ChartView } from "./ChartView";

/** A song's chart in another key, spelled as that key wants it; as written where it has no key or none is asked for. */
export function MovedChart({
  song,
  to,
  size,
  level,
}: {
  song: Song;
  to: KeyName | null;
  size?: number;
  level?: 2 | 3;
}) {
  const chart = useMemo(() => {
    const written = parseChart(song.chart);
    return song.writtenKey && to && to.tonic !== song.writtenKey.tonic
      ? transposeChart(written, song.writtenKey, to)
      : written;
  }, [song.chart, song.writtenKey, to]);
  if (song.chart.trim() === "") return <Text tone="soft">This song has no chart yet.</Text>;
  return (
    <ChartView
      chart={chart}
      {...(size === undefined ? null : { size })}
      {...(level === undefined ? null : { level })}
    />
  );
}
