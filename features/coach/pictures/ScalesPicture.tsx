import Svg, { Circle, G, Line } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import { keyWords } from "@/shared/music/keyWords";
import { glyphs } from "@/shared/music/pitch";
import type { LaidScale } from "@/shared/coach/whyStep";

export interface ScalesPictureProps {
  scales: readonly LaidScale[];
  spoken: string;
}

const width = 344;
const edge = 16;
const rowHigh = 78;
const top = 34;

/** Scales on one ruler of semitones, each note with its number; where there are two, a line joins the same numbers. */
export function ScalesPicture({ scales, spoken }: ScalesPictureProps) {
  const span = 12 + Math.max(...scales.map(({ from }) => from));
  const unit = (width - 2 * edge) / span;
  const radius = Math.min(12, unit * 0.52);
  const x = (semitones: number) => edge + semitones * unit;
  const y = (row: number) => top + row * rowHigh;
  const height = y(scales.length - 1) + 34;
  const places = scales.map(({ degrees, from }) => [
    ...degrees.map(({ number, note, semitones }) => ({ number, note: glyphs(note), at: from + semitones })),
    { number: 1, note: glyphs(degrees[0]?.note ?? ""), at: from + 12 },
  ]);
  return (
    <Svg
      width="100%"
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={spoken}
      style={webStyle({ maxWidth: 560, height: "auto", display: "block", overflow: "visible" })}
      testID="scales"
    >
      {places.length === 2 &&
        places[0]?.map(({ at }, k) => (
          <Line
            key={k}
            x1={x(at)}
            x2={x(places[1]?.[k]?.at ?? at)}
            y1={y(0) + radius}
            y2={y(1) - radius}
            stroke={colors.inkSoft}
            strokeOpacity={0.5}
            strokeWidth={1.25}
            strokeDasharray="2 3"
          />
        ))}
      {scales.map(({ key, from }, row) => (
        <G key={row}>
          <SvgLabel x={x(from) - radius} y={y(row) - radius - 9} size={12} weight="600">
            {glyphs(keyWords(key))}
          </SvgLabel>
          <Line x1={x(from)} x2={x(from + 12)} y1={y(row)} y2={y(row)} stroke={colors.line} strokeWidth={1.5} />
          {Array.from({ length: 13 }, (_, k) => (
            <Line
              key={k}
              x1={x(from + k)}
              x2={x(from + k)}
              y1={y(row) - 5}
              y2={y(row) + 5}
              stroke={colors.inkSoft}
              strokeOpacity={0.6}
              strokeWidth={1}
            />
          ))}
          {places[row]?.map(({ number, note, at }, k) => {
            const home = number === 1;
            return (
              <G key={k}>
                <Circle cx={x(at)} cy={y(row)} r={radius} fill={home ? colors.plum : colors.ink} />
                <SvgLabel
                  x={x(at)}
                  y={y(row) + radius * 0.42}
                  size={radius * 1.2}
                  weight="600"
                  anchor="middle"
                  fill={home ? colors.onPlum : colors.paper}
                >
                  {String(number)}
                </SvgLabel>
                <SvgLabel
                  x={x(at)}
                  y={y(row) + radius + 15}
                  size={12.5}
                  family="display"
                  weight="600"
                  anchor="middle"
                  fill={colors.ink}
                  halo
                >
                  {note}
                </SvgLabel>
              </G>
            );
          })}
        </G>
      ))}
    </Svg>
  );
}
