import Svg, { Circle, G, Line, Rect } from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { webStyle } from "@/features/ui/webStyle";
import type { NeckDot } from "@/shared/coach/whyStep";
import { fretName } from "@/shared/instruments/frets";
import type { Instrument } from "@/shared/instruments/instrument";

export interface NeckStripProps {
  instrument: Instrument;
  /** how many frets are shown */
  frets: number;
  /** fret of the capo, 0 for none */
  capo: number;
  dots: readonly NeckDot[];
  spoken: string;
}

const width = 344;
const nut = 34;
const stringGap = 24;
const top = 22;

/** The first frets of the neck from the player's eyes, bass at the foot, with notes on it; left-handed necks run the other way. */
export function NeckStrip({ instrument, frets, capo, dots, spoken }: NeckStripProps) {
  const { strings, leftHanded } = instrument;
  const unit = (width - nut - 8) / frets;
  const turned = (at: number) => (leftHanded ? width - at : at);
  const wire = (fret: number) => turned(nut + fret * unit);
  const place = (fret: number) => turned(fret === 0 ? nut / 2 : nut + (fret - 0.5) * unit);
  const foot = top + (strings.length - 1) * stringGap;
  const y = (string: number) => foot - string * stringGap;
  const radius = Math.min(10.5, unit * 0.46);
  return (
    <Svg
      width="100%"
      viewBox={`0 0 ${width} ${foot + 34}`}
      role="img"
      aria-label={spoken}
      style={webStyle({ maxWidth: 620, height: "auto", display: "block" })}
      testID="neck-strip"
    >
      {Array.from({ length: frets }, (_, k) => k + 1).map((fret) => (
        <G key={fret}>
          <Line
            x1={wire(fret)}
            x2={wire(fret)}
            y1={top - 7}
            y2={foot + 7}
            stroke={colors.inkSoft}
            strokeOpacity={0.55}
            strokeWidth={1}
          />
          <SvgLabel
            x={place(fret)}
            y={foot + 28}
            size={fret === capo ? 13 : 11}
            family="display"
            weight="600"
            anchor="middle"
            fill={fret === capo ? colors.ink : colors.inkSoft}
          >
            {fretName(instrument, fret)}
          </SvgLabel>
        </G>
      ))}
      <Line
        x1={wire(0)}
        x2={wire(0)}
        y1={top - 8}
        y2={foot + 8}
        stroke={colors.ink}
        strokeWidth={3.5}
        strokeLinecap="round"
      />
      {strings.map(({ startsAtFret = 0 }, string) => (
        <Line
          key={string}
          x1={wire(Math.min(startsAtFret, frets))}
          x2={wire(frets)}
          y1={y(string)}
          y2={y(string)}
          stroke={colors.inkSoft}
          strokeWidth={1.25}
        />
      ))}
      {capo > 0 && (
        <Rect x={place(capo) - 11} y={top - 16} width={22} height={foot - top + 32} rx={11} fill={colors.ink} />
      )}
      {dots.map(({ string, fret, label, root }) => {
        const open = fret === 0;
        return (
          <G key={`${string},${fret}`}>
            {open ? (
              <Circle
                cx={place(0)}
                cy={y(string)}
                r={11}
                fill="none"
                stroke={root ? colors.plum : colors.ink}
                strokeWidth={root ? 2.5 : 1.5}
              />
            ) : (
              <Circle cx={place(fret)} cy={y(string)} r={radius} fill={root ? colors.plum : colors.ink} />
            )}
            <SvgLabel
              x={place(fret)}
              y={y(string) + 4}
              size={open ? 12 : Math.min(11.5, radius * 1.15)}
              weight="600"
              anchor="middle"
              fill={open ? colors.ink : root ? colors.onPlum : colors.paper}
            >
              {label}
            </SvgLabel>
          </G>
        );
      })}
    </Svg>
  );
}
