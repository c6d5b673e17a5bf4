import { memo } from "react";
import Svg, { G, Line } from "react-native-svg";
import { noteName } from "@/shared/music/pitch";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { isNatural } from "./ladderGeometry";
import type { TrailPlace } from "./trailGeometry";
import { trailSeconds, trailX, trailY } from "./trailGeometry";

/** What stands still behind the trail: note lines with their names, and the time axis. */
export const TrailGrid = memo(function TrailGrid({ width, height, low, high }: TrailPlace) {
  const place = { width, height, low, high };
  const axis = height - 24;
  const step = trailY(place, low) - trailY(place, low + 1);
  const x = trailX(place);
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden style={{ position: "absolute" }}>
      {Array.from({ length: high - low + 1 }, (_, index) => high - index).map((midi) => (
        <TrailLine key={midi} midi={midi} y={trailY(place, midi)} width={width} names={isNamed(midi, step)} />
      ))}
      {Array.from({ length: trailSeconds + 1 }, (_, ago) => (
        <G key={ago}>
          <Line
            x1={x(-ago)}
            x2={x(-ago)}
            y1={axis}
            y2={axis + 5}
            stroke={colors.inkSoft}
            strokeOpacity={0.6}
            strokeWidth={1}
          />
          {ago % 2 === 0 && (
            <SvgLabel x={x(-ago)} y={axis + 19} size={12} anchor="middle">
              {ago === 0 ? "now" : `${ago} s ago`}
            </SvgLabel>
          )}
        </G>
      ))}
      <Line
        x1={x(0)}
        x2={x(0)}
        y1={0}
        y2={axis}
        stroke={colors.inkSoft}
        strokeOpacity={0.7}
        strokeWidth={1}
        strokeDasharray="2 4"
      />
    </Svg>
  );
});

/** Names need 13 px each: on close lines E and B give way to their neighbours a semitone above, then all but C. */
function isNamed(midi: number, step: number): boolean {
  const note = ((midi % 12) + 12) % 12;
  if (step >= 13 || note === 0) return true;
  return step * 2 >= 13 && note !== 4 && note !== 11;
}

function TrailLine({ midi, y, width, names }: { midi: number; y: number; width: number; names: boolean }) {
  const natural = isNatural(midi);
  const octave = midi % 12 === 0;
  return (
    <G>
      <Line
        x1={48}
        x2={width}
        y1={y}
        y2={y}
        stroke={octave ? mixtures.rungC : colors.line}
        strokeWidth={1}
        {...(natural ? null : { strokeDasharray: "1 7", strokeLinecap: "round" as const })}
      />
      {natural && names && (
        <SvgLabel
          x={40}
          y={y + 4.5}
          size={13}
          family="display"
          weight="600"
          anchor="end"
          fill={octave ? colors.ink : colors.inkSoft}
        >
          {noteName(midi)}
        </SvgLabel>
      )}
    </G>
  );
}
