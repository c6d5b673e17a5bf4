import Svg, { ClipPath, Defs, G, Line, Path, Rect } from "react-native-svg";
import { Hatch, useDrawingId } from "./Hatch";
import { stripX } from "./VoiceStrip";
import { semitonesOf, type Scale } from "./ladderGeometry";
import { colors, mixtures } from "@/features/ui/theme";
import type { SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName } from "@/shared/music/pitch";
import type { SungSpan } from "./sungSpan";
import { SvgLabel } from "@/features/ui/SvgLabel";

export interface SpanBarProps {
  /** on whole semitones */
  voice: SingingVoice;
  /** null: the voice alone */
  span: SungSpan | null;
  /** semitones shown; the same for all rows */
  scale: Scale;
  width: number;
  words: string;
  /** in a list of voices: a row of 40 with the names of both ends, and F and A dotted between the Cs */
  tall?: boolean;
}

const low = { height: 26, top: 6, thick: 14 } as const;
const high = { height: 40, top: 12, thick: 16 } as const;

/** The voice lying down, comfort solid and reach hatched, and the song's span as a line through it. */
export function SpanBar({ voice, span, scale, width, words, tall = false }: SpanBarProps) {
  const id = useDrawingId();
  const { height, top, thick } = tall ? high : low;
  const half = width / (scale.high - scale.low + 1) / 2;
  const x = (midi: number) => Math.min(width - 8, Math.max(8, stripX(midi, scale, width)));
  const [left, right] = [x(voice.range.lowMidi) - half, x(voice.range.highMidi) + half];
  const [softLeft, softRight] = [x(voice.comfort.lowMidi) - half, x(voice.comfort.highMidi) + half];
  const middle = top + thick / 2;
  const semitones = semitonesOf(scale);
  const octaves = semitones.filter((midi) => midi % 12 === 0);
  const between = tall ? semitones.filter((midi) => midi % 12 === 5 || midi % 12 === 9) : [];
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={words}>
      <Hatch id={`${id}s`} pitch={4.5} line={1.2} />
      {octaves.map((midi) => (
        <Line
          key={midi}
          x1={x(midi)}
          x2={x(midi)}
          y1={0}
          y2={height}
          stroke={tall ? colors.line : mixtures.rungC}
          strokeWidth={1}
        />
      ))}
      {between.map((midi) => (
        <Line
          key={midi}
          x1={x(midi)}
          x2={x(midi)}
          y1={0}
          y2={height}
          stroke={colors.line}
          strokeWidth={1}
          strokeDasharray="1 4"
        />
      ))}
      <Defs>
        <ClipPath id={`${id}c`}>
          <Rect x={left} y={top} width={right - left} height={thick} rx={thick / 2} />
        </ClipPath>
      </Defs>
      <G clipPath={`url(#${id}c)`}>
        <Rect x={left} y={top} width={right - left} height={thick} fill={`url(#${id}s)`} />
        <Rect x={softLeft} y={top} width={softRight - softLeft} height={thick} fill={colors.lagoon} />
      </G>
      <Rect
        x={left}
        y={top}
        width={right - left}
        height={thick}
        rx={thick / 2}
        fill="none"
        stroke={colors.honey}
        strokeWidth={1}
      />
      {tall && (
        <>
          <SvgLabel x={left - 6} y={middle + 4} size={11} family="mono" anchor="end" halo>
            {glyphs(noteName(voice.range.lowMidi))}
          </SvgLabel>
          <SvgLabel x={right + 6} y={middle + 4} size={11} family="mono" halo>
            {glyphs(noteName(voice.range.highMidi))}
          </SvgLabel>
        </>
      )}
      {span && <SungLine span={span} x={x} middle={middle} left={left} right={right} soft={[softLeft, softRight]} />}
    </Svg>
  );
}

interface SungLineProps {
  span: SungSpan;
  x: (midi: number) => number;
  middle: number;
  left: number;
  right: number;
  soft: readonly [number, number];
}

/** Light over the solid band, ink over the hatched one, dotted brick with an arrow outside. */
function SungLine({ span, x, middle, left, right, soft }: SungLineProps) {
  const from = x(span.low);
  const to = x(span.high);
  const part = (a: number, b: number, stroke: string, dotted = false) =>
    b - a > 0.5 && (
      <Line
        x1={a}
        x2={b}
        y1={middle}
        y2={middle}
        stroke={stroke}
        strokeWidth={2}
        {...(dotted ? { strokeDasharray: "0.1 4", strokeLinecap: "round" as const } : null)}
      />
    );
  const tick = (at: number, beyond: boolean) => (
    <Line
      x1={at}
      x2={at}
      y1={middle - 5}
      y2={middle + 5}
      stroke={beyond ? colors.brick : at > soft[0] && at < soft[1] ? colors.card : colors.ink}
      strokeWidth={2}
    />
  );
  const inside = (a: number) => Math.min(right, Math.max(left, a));
  return (
    <G>
      {part(from, Math.min(to, left), colors.brick, true)}
      {part(inside(from), Math.min(inside(to), soft[0]), colors.ink)}
      {part(Math.max(from, soft[0]), Math.min(to, soft[1]), colors.card)}
      {part(Math.max(inside(from), soft[1]), inside(to), colors.ink)}
      {part(Math.max(from, right), to, colors.brick, true)}
      {tick(from, span.below)}
      {tick(to, span.above)}
      {span.below && <Path d={`M${from - 8} ${middle - 3}h7l-3.5 5.6z`} fill={colors.brick} />}
      {span.above && <Path d={`M${to + 1} ${middle + 3}h7l-3.5 -5.6z`} fill={colors.brick} />}
    </G>
  );
}
