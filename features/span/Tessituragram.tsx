import { useMemo, useState } from "react";
import { View } from "react-native";
import Svg, { Circle, G, Line, Path, Rect } from "react-native-svg";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import type { MelodyNote } from "@/shared/songs/melody";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { Text } from "@/features/ui/Text";
import { colors, mixtures } from "@/features/ui/theme";
import { ground, Hatch, useDrawingId } from "./Hatch";
import { isNatural, semitonesOf, sideOf } from "./ladderGeometry";
import { barWords, tessituragramWords, tunePlace, type TessituraBar, type TunePlace } from "./tessituragramWords";

export interface TessituragramProps {
  notes: readonly MelodyNote[];
  /** home note of the tune, ASCII */
  home: string;
  voice: SingingVoice | null;
  spelling?: Spelling;
  testID?: string;
}

const barsHigh = 112;
const top = 20;
const axis = top + barsHigh;
const height = axis + 46;

/** Where the tune lives: the share of its time on each semitone, over the bands of the voice. */
export function Tessituragram({ notes, home, voice, spelling = "common", testID }: TessituragramProps) {
  const [width, setWidth] = useState(0);
  const place = useMemo(() => tunePlace(notes, home, voice), [notes, home, voice]);
  if (!place) return null;
  const words = tessituragramWords(place, voice, spelling);
  return (
    <View testID={testID} style={{ gap: 8 }} onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}>
      <View style={{ height }}>
        {width > 0 && (
          <Picture
            place={place}
            voice={voice}
            width={width}
            spelling={spelling}
            label={`${words.join(" ")} Share of the time: ${barWords(place, spelling)}.`}
          />
        )}
      </View>
      <Text variant="small">{words.join(" ")}</Text>
    </View>
  );
}

interface PictureProps {
  place: TunePlace;
  voice: SingingVoice | null;
  width: number;
  spelling: Spelling;
  label: string;
}

function Picture({ place, voice, width, spelling, label }: PictureProps) {
  const id = useDrawingId();
  const { bars, figures } = place;
  const ends = [figures.lowMidi, figures.highMidi, ...(voice ? [voice.range.lowMidi, voice.range.highMidi] : [])];
  const low = Math.round(Math.min(...ends)) - 1;
  const high = Math.round(Math.max(...ends)) + 1;
  const step = width / (high - low + 1);
  const x = (midi: number) => (midi - low + 0.5) * step;
  const most = Math.max(...bars.map(({ share }) => share));
  const thick = Math.min(14, step * 0.68);
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label}>
      <Hatch id={`${id}h`} pitch={6} line={2.4} />
      <Hatch id={`${id}b`} pitch={6} line={1} lineOpacity={0.4} under="none" />
      {voice && <Bands id={id} voice={voice} x={x} half={step / 2} />}
      <Line x1={0} x2={width} y1={axis} y2={axis} stroke={colors.ink} strokeWidth={1.5} />
      {bars.map((bar) => (
        <Bar
          key={bar.midi}
          id={id}
          bar={bar}
          x={x(bar.midi)}
          thick={thick}
          long={Math.max(6, (bar.share / most) * (barsHigh - 14))}
          up={voice === null || sideOf(bar.midi, voice) === "above"}
        />
      ))}
      {names(low, high, step).map((midi) => (
        <SvgLabel
          key={midi}
          x={x(midi)}
          y={axis + 42}
          size={12}
          family="display"
          weight="600"
          anchor="middle"
          fill={midi % 12 === 0 ? colors.ink : colors.inkSoft}
        >
          {glyphs(noteName(midi, spelling))}
        </SvgLabel>
      ))}
      <Figures figures={figures} x={x} />
    </Svg>
  );
}

/** Comfort tinted with solid edges, reach hatched with dashed edges. */
function Bands({ id, voice, x, half }: { id: string; voice: SingingVoice; x: (midi: number) => number; half: number }) {
  const edge = (midi: number, side: -1 | 1) => x(Math.round(midi)) + side * half;
  const [left, right] = [edge(voice.range.lowMidi, -1), edge(voice.range.highMidi, 1)];
  const [softLeft, softRight] = [edge(voice.comfort.lowMidi, -1), edge(voice.comfort.highMidi, 1)];
  return (
    <G>
      <Rect x={left} y={top} width={softLeft - left} height={barsHigh} fill={`url(#${id}b)`} />
      <Rect x={softRight} y={top} width={right - softRight} height={barsHigh} fill={`url(#${id}b)`} />
      <Rect x={softLeft} y={top} width={softRight - softLeft} height={barsHigh} fill={mixtures.band} />
      {[left, right].map((at) => (
        <Line
          key={at}
          x1={at}
          x2={at}
          y1={top}
          y2={axis}
          stroke={colors.honey}
          strokeWidth={1.2}
          strokeDasharray="3 3"
        />
      ))}
      {[softLeft, softRight].map((at) => (
        <Line key={at} x1={at} x2={at} y1={top} y2={axis} stroke={colors.lagoon} strokeWidth={1.5} />
      ))}
      <SvgLabel x={(softLeft + softRight) / 2} y={13} size={12} weight="500" anchor="middle" fill={colors.lagoon}>
        comfort
      </SvgLabel>
    </G>
  );
}

interface BarProps {
  id: string;
  bar: TessituraBar;
  x: number;
  thick: number;
  long: number;
  /** beyond the upper end, not the lower */
  up: boolean;
}

function Bar({ id, bar, x, thick, long, up }: BarProps) {
  const { zone, home, heldBeats } = bar;
  const y = axis - long;
  const beyond = zone === "beyond";
  const outlined = zone === "reach" || beyond;
  const shade = beyond ? colors.brick : zone === "reach" ? colors.honey : zone === null ? colors.ink : colors.lagoon;
  return (
    <G>
      <Rect
        x={x - thick / 2 + (outlined ? 0.75 : 0)}
        y={y}
        width={thick - (outlined ? 1.5 : 0)}
        height={long}
        rx={Math.min(4, thick / 2)}
        fill={beyond ? "none" : zone === "reach" ? `url(#${id}h)` : shade}
        stroke={outlined ? shade : "none"}
        strokeWidth={1.5}
        {...(beyond ? { strokeDasharray: "0.1 3.2", strokeLinecap: "round" as const } : null)}
      />
      {home && <Circle cx={x} cy={axis - 6} r={2.2} fill={outlined ? shade : ground} />}
      {heldBeats !== null && (
        <Line
          x1={x - thick / 2 - 2}
          x2={x + thick / 2 + 2}
          y1={y - 4}
          y2={y - 4}
          stroke={colors.ink}
          strokeWidth={2.5}
          strokeLinecap="round"
        />
      )}
      {beyond && (
        <Path d={up ? `M${x - 4} ${y - 8}h8l-4 -6.4z` : `M${x - 4} ${y - 14.4}h8l-4 6.4z`} fill={colors.brick} />
      )}
    </G>
  );
}

/** Under the axis: the middle half of the time as a line, the median as its tick, the mean as a diamond. */
function Figures({
  figures: { q1, median, q3, mean },
  x,
}: {
  figures: TunePlace["figures"];
  x: (m: number) => number;
}) {
  const y = axis + 14;
  const at = x(mean);
  return (
    <G>
      <Line x1={x(q1)} x2={x(q3)} y1={y} y2={y} stroke={colors.ink} strokeWidth={1.5} />
      {[q1, q3].map((end, index) => (
        <Line key={index} x1={x(end)} x2={x(end)} y1={y - 5} y2={y + 5} stroke={colors.ink} strokeWidth={1.5} />
      ))}
      <Line x1={x(median)} x2={x(median)} y1={y - 8} y2={y + 8} stroke={colors.ink} strokeWidth={3} />
      <Path d={`M${at} ${y - 5.5}l5.5 5.5l-5.5 5.5l-5.5 -5.5z`} fill={colors.plum} stroke={ground} strokeWidth={1} />
    </G>
  );
}

/** What the marks mean, once on a page. */
export function TessituragramLegend() {
  return (
    <Text variant="small" tone="soft">
      Taller is longer. The line under the notes is the middle half of the time, its thick stroke the median, the
      diamond the mean. A cap on a bar is a note held for three beats or more; the dot is the home note.
    </Text>
  );
}

/** Semitones that are named first where there is little room: C, then the fifth, then what lies between. */
const rank = [0, 7, 4, 9, 2, 5, 11];

/** Naturals, as many as stand apart. */
function names(low: number, high: number, step: number): number[] {
  const all = semitonesOf({ low, high }).filter(isNatural);
  const byRank = [...all].sort((a, b) => rank.indexOf(a % 12) - rank.indexOf(b % 12));
  const named: number[] = [];
  for (const midi of byRank) if (named.every((other) => Math.abs(other - midi) * step >= 24)) named.push(midi);
  return named;
}
