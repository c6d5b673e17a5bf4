import { useCallback, useMemo, useState, useSyncExternalStore, type ReactNode } from "react";
import { useWindowDimensions, View } from "react-native";
import { LevelMeter } from "@/features/span/LevelMeter";
import { meterLevel } from "@/features/span/meterLevel";
import { Screen } from "@/features/ui/Screen";
import { StopButton } from "@/features/ui/StopButton";
import { Text } from "@/features/ui/Text";
import { useLayout } from "@/features/ui/useLayout";
import type { Song } from "@/shared/contract/song";
import type { KeyName } from "@/shared/music/keyName";
import type { ChartLine } from "@/shared/songs/chart";
import { BeatLights } from "../../backing/BeatLights";
import { spellingIn } from "../../keyRows";
import { timedLines } from "./songLines";
import { TryLines } from "./TryLines";
import type { TryRecorder } from "./tryRecorder";
import { TryRoad } from "./TryRoad";
import type { Try } from "../useTry";

export interface TrySingingProps {
  song: Song;
  to: KeyName;
  sign: string;
  own: Try;
  recorder: TryRecorder;
  seconds: number;
  stopping: boolean;
  voice: { lowMidi: number; highMidi: number } | null;
  /** a line of the chart, chords over its syllables */
  draw: (line: ChartLine) => ReactNode;
}

/** While it is sung: the beat, the line with its chords, the notes as they come, and Stop under the thumb. */
export function TrySinging({ song, to, sign, own, recorder, seconds, stopping, voice, draw }: TrySingingProps) {
  const layout = useLayout();
  const { height } = useWindowDimensions();
  const { plan, backing } = own;
  const lines = useMemo(() => (plan ? timedLines(song, to, plan) : []), [song, to, plan]);
  const wide = layout === "wide";
  const road = (
    <Road
      notes={plan?.notes ?? []}
      voice={voice}
      spelling={spellingIn(to)}
      height={wide ? Math.max(360, height - 220) : Math.max(180, Math.min(420, height - 500))}
      heard={recorder.now}
      planNow={backing.heard}
      startS={own.startS}
    />
  );
  const words = plan && (
    <>
      <BeatLights plan={plan} heard={backing.heard} playing={backing.playing === "playing"} />
      <TryLines lines={lines} planNow={backing.heard} draw={draw} most={wide ? 3 : 2} />
    </>
  );
  const foot = (
    <View style={{ gap: 12 }}>
      <Level recorder={recorder} />
      <Text variant="small" tone="soft" testID="take-seconds">
        {`${Math.floor(seconds)} s sung`}
      </Text>
      <StopButton stopping={stopping} onStop={recorder.stop} round={wide} />
    </View>
  );
  return (
    <Screen
      title={`Singing in ${sign}`}
      subtitle={song.title}
      back={{ pathname: "/songs/[id]/keys", params: { id: song.id } }}
      closes
      hideBar
      wide
    >
      {wide ? (
        <View style={{ flexDirection: "row", gap: 40 }}>
          <View style={{ flexGrow: 1, flexBasis: 0 }}>{road}</View>
          <View style={{ width: 440, gap: 24 }}>
            {words}
            {foot}
          </View>
        </View>
      ) : (
        <View style={{ gap: 14, flexGrow: 1 }}>
          {words}
          {road}
          <View style={{ marginTop: "auto" }}>{foot}</View>
        </View>
      )}
    </Screen>
  );
}

function Road(props: Omit<Parameters<typeof TryRoad>[0], "width">) {
  const [width, setWidth] = useState(0);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height: props.height }}>
      {width > 0 && <TryRoad {...props} width={width} />}
    </View>
  );
}

function Level({ recorder: { listen, now } }: { recorder: TryRecorder }) {
  const read = useCallback(() => meterLevel(now()), [now]);
  return <LevelMeter levelDb={useSyncExternalStore(listen, read)} labelled />;
}
