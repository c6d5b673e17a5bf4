import Svg, { Circle, G, Line, Path } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";

export interface StringsPictureProps {
  /** from the bass side */
  strings: readonly { from: string; to: string }[];
  /** semitones between neighbours */
  gaps: readonly number[];
  spoken: string;
}

const width = 344;
const top = 44;
const rowHigh = 46;
const [before, after] = [96, 248];

/** The strings before and after a retune, bass at the foot, with the distances between neighbours on both sides. */
export function StringsPicture({ strings, gaps, spoken }: StringsPictureProps) {
  const foot = top + (strings.length - 1) * rowHigh;
  const y = (string: number) => foot - string * rowHigh;
  return (
    <Svg
      width="100%"
      viewBox={`0 0 ${width} ${foot + 26}`}
      role="img"
      aria-label={`${spoken}. Semitones between neighbours, before and after: ${gaps.join(", ")}`}
      style={webStyle({ maxWidth: 480, height: "auto", display: "block" })}
      testID="strings-picture"
    >
      {[before, after].map((x) => (
        <SvgLabel key={x} x={x} y={14} size={12} weight="600" anchor="middle">
          {x === before ? "before" : "after"}
        </SvgLabel>
      ))}
      {strings.map(({ from, to }, string) => (
        <G key={string}>
          <Line
            x1={before + 22}
            x2={after - 28}
            y1={y(string)}
            y2={y(string)}
            stroke={colors.inkSoft}
            strokeWidth={1.25}
          />
          <Path
            d={`M${after - 34} ${y(string) - 4.5} l7 4.5 l-7 4.5`}
            fill="none"
            stroke={colors.inkSoft}
            strokeWidth={1.5}
            strokeLinejoin="round"
          />
          <Circle cx={before} cy={y(string)} r={16} fill="none" stroke={colors.inkSoft} strokeWidth={1.5} />
          <Circle cx={after} cy={y(string)} r={16} fill={colors.plum} />
          <SvgLabel x={before} y={y(string) + 5} size={13} weight="600" anchor="middle" fill={colors.ink}>
            {from}
          </SvgLabel>
          <SvgLabel x={after} y={y(string) + 5} size={13} weight="600" anchor="middle" fill={colors.onPlum}>
            {to}
          </SvgLabel>
        </G>
      ))}
      {gaps.map((gap, k) =>
        [before - 34, after + 34].map((x) => (
          <G key={`${k},${x}`}>
            <Path
              d={`M${x} ${y(k) - 6} V${y(k + 1) + 6}`}
              stroke={colors.lagoon}
              strokeWidth={2}
              strokeLinecap="round"
              fill="none"
            />
            <SvgLabel
              x={x < before ? x - 9 : x + 9}
              y={(y(k) + y(k + 1)) / 2 + 4}
              size={13}
              family="display"
              weight="600"
              anchor={x < before ? "end" : "start"}
              fill={colors.ink}
            >
              {String(Math.abs(gap))}
            </SvgLabel>
          </G>
        )),
      )}
    </Svg>
  );
}
