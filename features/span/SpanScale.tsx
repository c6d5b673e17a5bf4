import Svg from "react-native-svg";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { semitonesOf, type Scale } from "./ladderGeometry";

export interface SpanScaleProps {
  scale: Scale;
  width: number;
  /** horizontal place of a pitch */
  x: (midi: number) => number;
  /** F and A carry their octave too */
  full?: boolean;
}

/** The names over spans that lie on one scale: every C, and F and A where there is room. */
export function SpanScale({ scale, width, x, full = false }: SpanScaleProps) {
  const roomy = x(scale.low + 1) - x(scale.low) > (full ? 6.5 : 9);
  const named = semitonesOf(scale).filter(
    (midi) => (roomy ? [0, 5, 9] : [0]).includes(midi % 12) && x(midi) > 10 && x(midi) < width - 10,
  );
  return (
    <Svg width={width} height={18} viewBox={`0 0 ${width} 18`} aria-hidden style={{ display: "flex" }}>
      {named.map((midi) => {
        const octave = midi % 12 === 0;
        const number = octave || full ? String(Math.floor(midi / 12) - 1) : "";
        const name = `${octave ? "C" : midi % 12 === 5 ? "F" : "A"}${number}`;
        return (
          <SvgLabel
            key={midi}
            x={x(midi)}
            y={13}
            size={octave ? 12 : 11}
            family="mono"
            weight={octave ? "600" : "400"}
            anchor="middle"
            fill={octave ? colors.ink : colors.inkSoft}
          >
            {name}
          </SvgLabel>
        );
      })}
    </Svg>
  );
}
