import { useMemo, useState } from "react";
import { View } from "react-native";
import Svg, { Circle, Line, Path, Rect } from "react-native-svg";
import { semitonesOf } from "@/features/span/ladderGeometry";
import { Button } from "@/features/ui/Button";
import { Notice } from "@/features/ui/Notice";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import type { Comment } from "@/shared/contract/studio/assignment";
import type { HandIn, TakePicture } from "@/shared/contract/studio/handIn";
import { glyphs, noteName } from "@/shared/music/pitch";
import { clockWords } from "@/features/ui/clockWords";
import type { TakeTime } from "../parts/takesPlace";
import { pitchRoom, pitchSpan, trailPath, wavePath, xOf, yOf, type PlayerPlace } from "./playerGeometry";
import { useTakeSound } from "./useTakeSound";

export interface TakePlayerProps {
  take: Pick<HandIn, "id" | "kind" | "durationS" | "picture">;
  /** those that stand at a time in this take are marked */
  comments: readonly Comment[];
  onTime: (time: TakeTime | null) => void;
}

const waveHeight = 40;
const namesPx = 34;
const stepS = 1;
const noPicture: TakePicture = { waveform: [], trail: [], tune: [] };

/** A recording with its pitch over the tune: played, moved through, and spoken of at a time. */
export function TakePlayer({ take, comments, onTime }: TakePlayerProps) {
  const { id, durationS } = take;
  const sound = useTakeSound(id, durationS);
  const picture = take.picture ?? noPicture;
  const marks = comments.flatMap(({ handInId, atS }) => (handInId === id && atS !== null ? [atS] : []));
  const playing = sound.state !== "still";
  return (
    <View style={{ gap: 8 }} testID="take-player">
      <SeekArea
        durationS={durationS}
        atS={sound.atS}
        onSeek={sound.seek}
        height={pitchRoom(picture) + waveHeight}
        what={pictureWords(picture)}
      >
        {(width) => <Picture picture={picture} durationS={durationS} width={width} atS={sound.atS} marks={marks} />}
      </SeekArea>
      <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", gap: 10 }}>
        <Button
          kind="secondary"
          small
          icon={playing ? "pause" : "play"}
          label={playing ? "Pause" : "Play"}
          busy={sound.state === "loading"}
          onPress={playing ? sound.pause : sound.play}
          testID="play-take"
        />
        <Text variant="small" tone="soft" testID="take-clock">
          {`${clockWords(sound.atS)} of ${clockWords(durationS)}`}
        </Text>
        <Button
          kind="text"
          small
          icon="edit"
          label={`Say something at ${clockWords(sound.atS)}`}
          onPress={() => {
            sound.pause();
            onTime({ handInId: id, atS: Math.round(sound.atS * 10) / 10 });
          }}
          testID="say-here"
        />
      </View>
      {marks.length > 0 && (
        <View style={{ flexDirection: "row", flexWrap: "wrap", alignItems: "center", gap: 4 }}>
          <Text variant="tiny" tone="soft">
            Something was said at
          </Text>
          {[...new Set(marks)]
            .sort((a, b) => a - b)
            .map((at) => (
              <Button
                key={at}
                kind="text"
                small
                label={clockWords(at)}
                accessibleName={`${clockWords(at)}: go there`}
                onPress={() => sound.seek(at)}
                testID="go-to-mark"
              />
            ))}
        </View>
      )}
      {sound.problem !== null && (
        <Notice kind="error" title="It cannot be heard">
          {sound.problem}
        </Notice>
      )}
    </View>
  );
}

interface SeekAreaProps {
  durationS: number;
  atS: number;
  /** of the picture, px */
  height: number;
  onSeek: (atS: number) => void;
  /** the picture in words */
  what: string;
  children: (width: number) => React.ReactNode;
}

/** Moves through the take by pointer or by arrow keys. */
function SeekArea({ durationS, atS, height, onSeek, what, children }: SeekAreaProps) {
  const [width, setWidth] = useState(0);
  const inner = Math.max(0, width - namesPx);
  const seekTo = (event: React.PointerEvent<HTMLDivElement>) => {
    const { left } = event.currentTarget.getBoundingClientRect();
    if (inner > 0) onSeek(((event.clientX - left) / inner) * durationS);
  };
  const steps: Record<string, number> = {
    ArrowLeft: atS - stepS,
    ArrowDown: atS - stepS,
    ArrowRight: atS + stepS,
    ArrowUp: atS + stepS,
    PageUp: atS + 10 * stepS,
    PageDown: atS - 10 * stepS,
    Home: 0,
    End: durationS,
  };
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}>
      <div
        role="slider"
        tabIndex={0}
        aria-label={`Place in the take. ${what}`}
        aria-valuemin={0}
        aria-valuemax={Math.round(durationS)}
        aria-valuenow={Math.round(atS)}
        aria-valuetext={`${clockWords(atS)} of ${clockWords(durationS)}`}
        data-testid="seek"
        style={{ cursor: "pointer", touchAction: "pan-y", borderRadius: 8 }}
        onPointerDown={seekTo}
        onPointerMove={(event) => event.buttons === 1 && seekTo(event)}
        onKeyDown={(event) => {
          const to = steps[event.key];
          if (to === undefined) return;
          event.preventDefault();
          onSeek(to);
        }}
      >
        {width > 0 ? children(inner) : <View style={{ height }} />}
      </div>
    </View>
  );
}

interface PictureProps {
  picture: TakePicture;
  durationS: number;
  width: number;
  atS: number;
  marks: readonly number[];
}

function Picture({ picture, durationS, width, atS, marks }: PictureProps) {
  const height = pitchRoom(picture);
  const place = useMemo<PlayerPlace>(
    () => ({ width, height, durationS, ...pitchSpan(picture) }),
    [width, height, durationS, picture],
  );
  const drawn = useMemo(
    () => ({ trail: trailPath(place, picture.trail), wave: wavePath(picture.waveform, width, waveHeight) }),
    [place, picture, width],
  );
  const octaves = height === 0 ? [] : semitonesOf(place).filter((midi) => midi % 12 === 0);
  const now = xOf(place, atS);
  return (
    <Svg
      width={width + namesPx}
      height={height + waveHeight}
      viewBox={`0 0 ${width + namesPx} ${height + waveHeight}`}
      aria-hidden
    >
      {octaves.map((midi) => (
        <Line key={midi} x1={0} x2={width} y1={yOf(place, midi)} y2={yOf(place, midi)} stroke={mixtures.rungC} />
      ))}
      {picture.tune.map(({ t, durationS: length, midi }, k) => (
        <Rect
          key={k}
          x={xOf(place, t)}
          y={yOf(place, midi) - 4}
          width={Math.max(2, xOf(place, t + length) - xOf(place, t) - 1)}
          height={8}
          rx={4}
          fill={mixtures.tint}
          stroke={colors.lagoon}
          strokeWidth={1}
        />
      ))}
      <Path
        d={drawn.trail}
        stroke={colors.plum}
        strokeWidth={2.25}
        strokeLinejoin="round"
        strokeLinecap="round"
        fill="none"
      />
      <Path d={drawn.wave} fill={colors.inkSoft} opacity={0.55} transform={`translate(0 ${height})`} />
      {marks.map((at) => (
        <Circle key={at} cx={xOf(place, at)} cy={Math.max(5, height)} r={4.5} fill={colors.honey} stroke={colors.ink} />
      ))}
      <Line x1={now} x2={now} y1={0} y2={height + waveHeight} stroke={colors.ink} strokeWidth={2} />
      {octaves.map((midi) => (
        <SvgLabel key={midi} x={width + namesPx - 2} y={yOf(place, midi) + 4} size={12} family="display" anchor="end">
          {glyphs(noteName(midi))}
        </SvgLabel>
      ))}
    </Svg>
  );
}

function pictureWords({ trail, tune }: TakePicture): string {
  if (trail.length === 0) return "Its loudness from beginning to end.";
  const midis = trail.map(({ midi }) => midi);
  const name = (midi: number) => glyphs(noteName(Math.round(midi)));
  const [low, high] = [midis.reduce((a, b) => Math.min(a, b)), midis.reduce((a, b) => Math.max(a, b))];
  return `Sung from ${name(low)} to ${name(high)}${tune.length > 0 ? `, over a tune of ${tune.length} notes` : ""}.`;
}
