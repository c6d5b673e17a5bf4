import { ClipPath, Defs, G, Line, Path, Rect } from "react-native-svg";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { ground } from "./Hatch";
import { isNatural, ladderMeasures, yOf, type LadderStep, type Scale } from "./ladderGeometry";

export interface LadderColumnProps {
  id: string;
  voice: SingingVoice;
  scale: Scale;
  step: LadderStep;
  pad: number;
  x: number;
  /** words low in the column */
  words?: readonly string[] | undefined;
}

/** The voice: solid lagoon where it is comfortable, honey hatch to the ends of the range. */
export function LadderColumn({ id, voice, scale, step, pad, x, words = [] }: LadderColumnProps) {
  const { column, radius, ground: room, noteGap: gap } = ladderMeasures[step];
  const half = step / 2;
  const top = yOf(voice.range.highMidi, scale, step, pad) - half;
  const bottom = yOf(voice.range.lowMidi, scale, step, pad) + half;
  const softTop = yOf(voice.comfort.highMidi, scale, step, pad) - half;
  const softBottom = yOf(voice.comfort.lowMidi, scale, step, pad) + half;
  const reachAbove = softTop - top > gap;
  const reachBelow = bottom - softBottom > gap;
  const inner = radius - 0.75;
  const right = x + column;
  const end = Math.min(inner, Math.max(0, softTop - gap - top - 0.75));
  const foot = Math.min(inner, Math.max(0, bottom - softBottom - gap - 0.75));
  const inside: number[] = [];
  for (let midi = scale.low; midi <= scale.high; midi += 1) {
    const y = yOf(midi, scale, step, pad);
    if (isNatural(midi) && y > softTop && y < softBottom) inside.push(y);
  }
  return (
    <G>
      <Rect x={x - room} y={top - 3} width={column + 2 * room} height={bottom - top + 6} fill={ground} />
      <Defs>
        <ClipPath id={`${id}c`}>
          <Rect x={x} y={top} width={column} height={bottom - top} rx={radius} />
        </ClipPath>
      </Defs>
      <G clipPath={`url(#${id}c)`}>
        <Rect x={x} y={top} width={column} height={bottom - top} fill={`url(#${id}h)`} />
        <Rect
          x={x}
          y={softTop - (reachAbove ? gap : 0)}
          width={column}
          height={softBottom - softTop + (reachAbove ? gap : 0) + (reachBelow ? gap : 0)}
          fill={ground}
        />
        <Rect x={x} y={softTop} width={column} height={softBottom - softTop} fill={colors.lagoon} />
      </G>
      {inside.map((y) => (
        <Line key={y} x1={x} x2={right} y1={y} y2={y} stroke={ground} strokeOpacity={0.22} strokeWidth={1} />
      ))}
      {reachAbove && (
        <Path
          d={`M${x + 0.75} ${softTop - gap}V${top + 0.75 + end}a${inner} ${end} 0 0 1 ${inner} ${-end}H${right - radius}a${inner} ${end} 0 0 1 ${inner} ${end}V${softTop - gap}`}
          fill="none"
          stroke={colors.honey}
          strokeWidth={1.5}
        />
      )}
      {reachBelow && (
        <Path
          d={`M${x + 0.75} ${softBottom + gap}V${bottom - 0.75 - foot}a${inner} ${foot} 0 0 0 ${inner} ${foot}H${right - radius}a${inner} ${foot} 0 0 0 ${inner} ${-foot}V${softBottom + gap}`}
          fill="none"
          stroke={colors.honey}
          strokeWidth={1.5}
        />
      )}
      {words.map((word, index) => (
        <SvgLabel
          key={word}
          x={x + column / 2}
          y={softBottom - step * (1.17 + 2 * (words.length - 1 - index))}
          size={14}
          family="display"
          weight="700"
          anchor="middle"
          fill={ground}
        >
          {word}
        </SvgLabel>
      ))}
    </G>
  );
}
