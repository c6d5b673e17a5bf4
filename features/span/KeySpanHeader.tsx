import Svg, { G, Line } from "react-native-svg";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { edges, isNamed, keySpanWidth, keySpanX } from "./keySpanGeometry";
import { isNatural, semitonesOf, type Scale } from "./ladderGeometry";

export interface KeySpanHeaderProps {
  voice: SingingVoice;
  scale: Scale;
  perSemitone?: number;
  spelling?: Spelling;
}

/** Head of the span column, 56 high: names of the notes, of the comfort band and of the reach. */
export function KeySpanHeader({ voice, scale, perSemitone = 14.4, spelling = "common" }: KeySpanHeaderProps) {
  const width = keySpanWidth(scale, perSemitone);
  const { left, right, softLeft, softRight } = edges(voice, scale, perSemitone);
  const name = (midi: number) => glyphs(noteName(midi, spelling));
  const low = name(voice.comfort.lowMidi);
  const high = name(voice.comfort.highMidi);
  const roomy = softRight - softLeft > 170;
  const naturals = semitonesOf(scale).filter(isNatural);
  const reach = [
    { from: left, to: softLeft },
    { from: softRight, to: right },
  ].filter(({ from, to }) => to - from > 34 && softRight - softLeft > 90);
  return (
    <Svg
      width={width}
      height={56}
      viewBox={`0 0 ${width} 56`}
      role="img"
      aria-label={`Scale from ${name(scale.low)} to ${name(scale.high)}. Comfort band ${low} to ${high}.`}
      style={{ display: "flex" }}
    >
      {naturals
        .filter((midi) => isNamed(midi, perSemitone))
        .map((midi) => {
          const octave = midi % 12 === 0;
          return (
            <SvgLabel
              key={midi}
              x={keySpanX(midi, scale, perSemitone)}
              y={47}
              size={octave ? 12 : 11}
              family="mono"
              weight={octave ? "600" : "400"}
              anchor="middle"
              fill={octave ? colors.ink : colors.inkSoft}
            >
              {octave ? name(midi) : name(midi).charAt(0)}
            </SvgLabel>
          );
        })}
      {[softLeft, softRight].map((edge) => (
        <Line key={edge} x1={edge} x2={edge} y1={28} y2={56} stroke={colors.lagoon} strokeWidth={1.5} />
      ))}
      {[left, right].map((edge) => (
        <Line
          key={edge}
          x1={edge}
          x2={edge}
          y1={28}
          y2={56}
          stroke={colors.honey}
          strokeWidth={1.2}
          strokeDasharray="5 3"
        />
      ))}
      <SvgLabel x={(softLeft + softRight) / 2} y={23} size={12} weight="600" anchor="middle" fill={colors.lagoon}>
        {`${roomy ? "comfort band " : ""}${low} to ${high}`}
      </SvgLabel>
      <G>
        {reach.map(({ from, to }) => (
          <SvgLabel
            key={from}
            x={(from + to) / 2}
            y={23}
            size={12}
            weight="600"
            anchor="middle"
            fill={colors.honeyText}
          >
            reach
          </SvgLabel>
        ))}
      </G>
    </Svg>
  );
}
