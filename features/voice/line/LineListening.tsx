import { useCallback, useState } from "react";
import { View } from "react-native";
import { LevelMeter } from "@/features/span/LevelMeter";
import { meterLevel } from "@/features/span/meterLevel";
import { PitchTrail } from "@/features/span/PitchTrail";
import { StopButton } from "@/features/ui/StopButton";
import { Text } from "@/features/ui/Text";
import { timeOf, type LiveSound } from "../recorder/liveSound";
import { longestTakeS } from "../recorder/takeProtocol";
import { noteWord } from "../noteWords";
import { noteNow } from "../listening/noteNow";
import { useHeard } from "../listening/useHeard";

export interface LineListeningProps {
  live: LiveSound;
  seconds: number;
  mostS?: number;
  stopping: boolean;
  onStop: () => void;
}

/** What is measured ends this long before the sound does: half a window, and the block on its way. */
const behindS = 0.045;
const trailHeight = 200;

/** While a line is sung: the note now, the trail, how loud, how long, and Stop. */
export function LineListening({ live, seconds, mostS = longestTakeS, stopping, onStop }: LineListeningProps) {
  const now = useHeard(live, ({ frames, ahead }) => {
    const note = noteNow([...frames, ...ahead]);
    return note ? noteWord(note.midi) : "–";
  });
  const level = useHeard(live, meterLevel);
  return (
    <View style={{ gap: 12 }}>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 16 }}>
        <Text variant="display" style={{ minWidth: 64 }} testID="note-now">
          {now}
        </Text>
        <Text variant="small" tone="soft" style={{ flexShrink: 1 }}>
          <Text style={{ fontWeight: "600" }} tone="ink" testID="take-seconds">{`${Math.floor(seconds)} s`}</Text>
          {` of ${mostS}. A longer tune is sung in pieces.`}
        </Text>
      </View>
      <Trail live={live} />
      <LevelMeter levelDb={level} />
      <StopButton stopping={stopping} onStop={onStop} />
    </View>
  );
}

function Trail({ live }: { live: LiveSound }) {
  const [width, setWidth] = useState(0);
  const read = useCallback(
    () => ({ frames: live.frames, ahead: live.ahead, now: Math.max(0, timeOf(live, performance.now()) - behindS) }),
    [live],
  );
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height: trailHeight }}>
      {width > 0 && <PitchTrail read={read} width={width} height={trailHeight} testID="pitch-trail" />}
    </View>
  );
}
