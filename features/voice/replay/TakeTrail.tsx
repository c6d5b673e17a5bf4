import { useCallback, useMemo, useState } from "react";
import { Dimensions, View } from "react-native";
import Svg, { Line, Path, Rect } from "react-native-svg";
import { semitonesOf } from "@/features/span/ladderGeometry";
import { PitchTrail } from "@/features/span/PitchTrail";
import { Button } from "@/features/ui/Button";
import { LiveText } from "@/features/ui/LiveText";
import { Notice } from "@/features/ui/Notice";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures, sizes } from "@/features/ui/theme";
import { noteWord } from "../noteWords";
import type { HeardTake } from "../recorder/recorder";
import type { TakePart } from "../recorder/takeProtocol";
import { usePlayback } from "../recorder/usePlayback";
import { strokesOf, takePicture, type TakePicture } from "./takePicture";
import { leastPartS, TrimHandle } from "./TrimHandle";

export interface TakeTrailProps {
  take: HeardTake;
  /** the worker is reading the part between the handles */
  judging: boolean;
  /** why the part between the handles gave no notes */
  refused: string | null;
  onTrim: (part: TakePart | null) => void;
}

const height = 168;
const widest = 560;
const handleRoom = 22;
const foot = 44;

/** The take as it was sung: play it back with the trail moving along, and leave out its start or end. */
export function TakeTrail({ take, judging, refused, onTrim }: TakeTrailProps) {
  const whole = take.part?.whole ?? take.report;
  const picture = useMemo(() => takePicture(whole), [whole]);
  // A fair guess, so that the picture is there at once; the layout says it exactly.
  const [width, setWidth] = useState(() => Math.min(widest, Dimensions.get("window").width - 2 * sizes.gutterPhone));
  const seconds = take.pcm.length / take.sampleRate;
  const judged = take.part ?? { startS: 0, endS: seconds };
  const [draft, setDraft] = useState<TakePart | null>(null);
  // While the part is read, the handles stay where they were put.
  const [asked, setAsked] = useState<TakePart | null>(null);
  const part = draft ?? (judging ? asked : null) ?? judged;
  const { playing, failed, play, stop, position } = usePlayback(take.pcm, take.sampleRate);
  const read = useCallback(() => {
    const now = position();
    const to = Math.floor(now * 100) + 1;
    return { frames: picture.frames.slice(Math.max(0, to - 660), to), ahead: [], now };
  }, [picture, position]);
  const commit = (next: TakePart) => {
    setDraft(null);
    setAsked(next);
    const all = next.startS <= 0 && next.endS >= seconds;
    if (next.startS !== judged.startS || next.endS !== judged.endS) onTrim(all ? null : next);
  };
  const trimmed = take.part !== undefined;
  return (
    <View role="region" aria-label="The take" style={{ gap: 8 }}>
      <View
        onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}
        testID="take-trail"
        style={{ height: height + foot, justifyContent: "center" }}
      >
        {playing ? (
          <PitchTrail read={read} width={width} height={height + foot} scale={picture} testID="playing-trail" />
        ) : (
          <Overview width={width} seconds={seconds} picture={picture} part={part}>
            {(["start", "end"] as const).map((end) => (
              <TrimHandle
                key={end}
                end={end}
                part={part}
                seconds={seconds}
                width={width - 2 * handleRoom}
                left={handleRoom}
                height={height}
                disabled={judging || seconds <= leastPartS}
                onChange={setDraft}
                onCommit={commit}
              />
            ))}
          </Overview>
        )}
      </View>
      <View style={{ flexDirection: "row", alignItems: "center", gap: 12, flexWrap: "wrap" }}>
        <Button
          kind="secondary"
          small
          icon={playing ? "stop" : "play"}
          label={playing ? "Stop playing" : "Play back"}
          onPress={playing ? stop : () => void play(judged)}
          testID="take-play"
        />
        {trimmed && !playing && (
          <Button
            kind="text"
            small
            label="Use the whole take"
            onPress={() => onTrim(null)}
            disabled={judging}
            testID="take-whole"
          />
        )}
      </View>
      <LiveText variant="small" tone="soft" testID="take-part">
        {judging ? "Reading the part between the handles." : partWords(take, seconds)}
      </LiveText>
      {refused !== null && (
        <Notice kind="caution" testID="take-part-refused">
          {`${refused} The take is as it was.`}
        </Notice>
      )}
      {failed && <Notice kind="error">This browser could not play the take. Its notes are safe.</Notice>}
    </View>
  );
}

function partWords({ part }: HeardTake, seconds: number): string {
  const all = `${seconds.toFixed(1)} s`;
  if (!part) return `All ${all}. Move the handles to leave out the start or the end. The sound stays on this device.`;
  return `From ${part.startS.toFixed(1)} to ${part.endS.toFixed(1)} s of ${all}. The sound stays on this device.`;
}

interface OverviewProps {
  width: number;
  seconds: number;
  picture: TakePicture;
  part: TakePart;
  children: React.ReactNode;
}

/** The whole take at once; what is left out stands pale and dashed. */
function Overview({ width, seconds, picture, part, children }: OverviewProps) {
  const { notes, low, high } = picture;
  const x = (t: number) => handleRoom + (t / seconds) * (width - 2 * handleRoom);
  const y = (midi: number) => 8 + ((high - midi) * (height - 16)) / (high - low);
  const octaves = semitonesOf({ low, high }).filter((midi) => midi % 12 === 0);
  return (
    <View style={{ width, height: height + foot }}>
      <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={takeWords(picture)}>
        <Rect
          x={x(part.startS)}
          y={0}
          width={Math.max(0, x(part.endS) - x(part.startS))}
          height={height}
          fill={mixtures.tint}
        />
        {octaves.map((midi) => (
          <Line key={midi} x1={0} x2={width} y1={y(midi)} y2={y(midi)} stroke={mixtures.rungC} strokeWidth={1} />
        ))}
        <Path
          d={strokesOf(notes, part, true, x, y)}
          stroke={colors.lagoon}
          strokeWidth={6}
          strokeLinecap="round"
          fill="none"
        />
        <Path
          d={strokesOf(notes, part, false, x, y)}
          stroke={colors.inkSoft}
          strokeWidth={2.5}
          strokeDasharray="2 4"
          fill="none"
        />
        {octaves.map((midi) => (
          <SvgLabel key={midi} x={width - 4} y={y(midi) - 4} size={12} family="display" anchor="end" halo>
            {noteWord(midi)}
          </SvgLabel>
        ))}
      </Svg>
      {children}
    </View>
  );
}

function takeWords({ notes }: TakePicture): string {
  const lines = notes.map(({ line }) => line);
  const low = lines.reduce((a, b) => Math.min(a, b), Infinity);
  const high = lines.reduce((a, b) => Math.max(a, b), -Infinity);
  if (!Number.isFinite(low)) return "The take, without any steady note.";
  return `The whole take: ${notes.length} notes from ${noteWord(low)} to ${noteWord(high)}.`;
}
