import Svg, { Circle, G, Line, Path, Rect } from "react-native-svg";
import { ground, Hatch, useDrawingId } from "@/features/span/Hatch";
import { isNatural, ladderWords, type Scale } from "@/features/span/ladderGeometry";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName } from "@/shared/music/pitch";
import { spellingIn, type KeyRow } from "../keyRows";
import { compareHeight, comparePlaces, compareY, step } from "./compareGeometry";

export interface CompareSpanProps {
  row: KeyRow;
  /** on whole semitones */
  voice: SingingVoice;
  scale: Scale;
  width: number;
}

const thick = 10;

/** One key upright: the voice as bands from edge to edge, the tune's notes as bars, the room left as dimension lines. */
export function CompareSpan({ row, voice, scale, width }: CompareSpanProps) {
  const id = useDrawingId();
  const height = compareHeight(scale);
  const y = (midi: number) => compareY(midi, scale);
  const { tune, room, longest } = comparePlaces(width);
  const spelling = spellingIn(row.key);
  const name = (midi: number) => glyphs(noteName(midi, spelling));
  const most = Math.max(0.01, ...row.marks.map(({ share }) => share));
  const longestMark = row.marks.find(({ share }) => share === most);
  const half = step / 2;
  const [top, bottom] = [y(voice.range.highMidi) - half, y(voice.range.lowMidi) + half];
  const [softTop, softBottom] = [y(voice.comfort.highMidi) - half, y(voice.comfort.lowMidi) + half];
  const labelOf = (mark: KeyMark) => {
    if (mark.midi === row.highMidi || mark.midi === row.lowMidi) return name(mark.midi);
    if (mark.home) return `home ${name(mark.midi)}`;
    return mark === longestMark && !row.coarse ? `${Math.round(mark.share * 100)} %` : null;
  };
  const rungs = Array.from({ length: scale.high - scale.low + 1 }, (_, index) => scale.low + index).filter(isNatural);
  return (
    <Svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={ladderWords(voice, row.marks, spelling)}
      style={{ display: "flex" }}
    >
      <Hatch id={`${id}w`} pitch={7} line={1} lineOpacity={0.42} under="none" />
      <Hatch id={`${id}h`} pitch={5} line={2} under={colors.honey} underOpacity={0.16} />
      <Rect x={0} y={top} width={width} height={softTop - top} fill={`url(#${id}w)`} />
      <Rect x={0} y={softBottom} width={width} height={bottom - softBottom} fill={`url(#${id}w)`} />
      <Rect x={0} y={softTop} width={width} height={softBottom - softTop} fill="var(--band)" />
      {rungs.map((midi) => (
        <Line
          key={midi}
          x1={0}
          x2={width}
          y1={y(midi)}
          y2={y(midi)}
          stroke={colors.line}
          strokeWidth={1}
          {...(midi % 12 === 0 ? null : { strokeDasharray: "1 4" })}
        />
      ))}
      {[softTop, softBottom].map((edge) => (
        <Line key={edge} x1={0} x2={width} y1={edge} y2={edge} stroke={colors.lagoon} strokeWidth={1.5} />
      ))}
      {[top, bottom].map((edge) => (
        <Line
          key={edge}
          x1={0}
          x2={width}
          y1={edge}
          y2={edge}
          stroke={colors.honey}
          strokeWidth={1.2}
          strokeDasharray="5 3"
        />
      ))}
      <Line x1={tune} x2={tune} y1={y(row.highMidi)} y2={y(row.lowMidi)} stroke={colors.inkSoft} strokeWidth={1} />
      {row.marks.map((mark) => {
        const long = Math.max(24, (longest * mark.share) / most);
        const box = { x: tune - long / 2, y: y(mark.midi) - thick / 2, width: long, height: thick, rx: 3 };
        const label = labelOf(mark);
        return (
          <G key={mark.midi}>
            {mark.zone === "comfort" ? (
              <Rect {...box} fill={colors.lagoon} />
            ) : (
              <G>
                <Rect {...box} fill={ground} />
                <Rect
                  {...box}
                  fill={mark.zone === "reach" ? `url(#${id}h)` : "none"}
                  stroke={mark.zone === "reach" ? colors.honey : colors.brick}
                  strokeWidth={mark.zone === "reach" ? 1.2 : 1.5}
                  {...(mark.zone === "beyond" ? { strokeDasharray: "1.5 2", strokeLinecap: "round" as const } : null)}
                />
              </G>
            )}
            {mark.home && (
              <Circle cx={tune} cy={y(mark.midi)} r={2.6} fill={mark.zone === "comfort" ? ground : colors.ink} />
            )}
            {label !== null && (
              <SvgLabel
                x={tune + long / 2 + 8}
                y={y(mark.midi) + 4}
                size={12}
                family="mono"
                weight={label === name(mark.midi) ? "600" : "400"}
                halo
                fill={mark.zone === "beyond" ? colors.brick : label.endsWith("%") ? colors.inkSoft : colors.ink}
              >
                {label}
              </SvgLabel>
            )}
          </G>
        );
      })}
      <Dimension
        x={room}
        from={y(voice.range.highMidi)}
        to={y(row.highMidi)}
        semitones={row.above.semitones}
        side="above"
      />
      <Dimension
        x={room}
        from={y(voice.range.lowMidi)}
        to={y(row.lowMidi)}
        semitones={row.below.semitones}
        side="below"
      />
    </Svg>
  );
}

interface DimensionProps {
  x: number;
  /** last note of the range */
  from: number;
  /** last note of the tune */
  to: number;
  semitones: number;
  side: "above" | "below";
}

/** How much room is left between the tune's end and the voice's; brick with ▲ or ▼ where the tune goes past it. */
function Dimension({ x, from, to, semitones, side }: DimensionProps) {
  const past = semitones < 0;
  const color = past ? colors.brick : colors.ink;
  const tick = 4;
  const middle = (from + to) / 2;
  const rise = side === "above" ? -5.6 : 5.6;
  return (
    <G>
      <Line x1={x} x2={x} y1={from} y2={to} stroke={color} strokeWidth={1.2} />
      {[...new Set([from, to])].map((end) => (
        <Line key={end} x1={x - tick} x2={x + tick} y1={end} y2={end} stroke={color} strokeWidth={1.2} />
      ))}
      {past && <Path d={`M${x + 8} ${middle - rise / 2}h7l-3.5 ${rise}z`} fill={color} />}
      <SvgLabel x={x + (past ? 19 : 8)} y={middle + 4} size={12.5} family="mono" weight="600" halo fill={color}>
        {past ? String(-semitones) : `${semitones} ${side}`}
      </SvgLabel>
    </G>
  );
}

export interface CompareLeadProps {
  voice: SingingVoice;
  scale: Scale;
  width: number;
}

/** Names beside the pictures: the naturals, the comfort band and the reach. */
export function CompareLead({ voice, scale, width }: CompareLeadProps) {
  const height = compareHeight(scale);
  const y = (midi: number) => compareY(midi, scale);
  const naturals = Array.from({ length: scale.high - scale.low + 1 }, (_, index) => scale.low + index).filter(
    isNatural,
  );
  const { range, comfort } = voice;
  const middle = y((comfort.highMidi + comfort.lowMidi) / 2);
  const reach = [
    { from: comfort.highMidi + 1, to: range.highMidi },
    { from: range.lowMidi, to: comfort.lowMidi - 1 },
  ].filter(({ from, to }) => to >= from);
  return (
    <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden style={{ display: "flex" }}>
      {naturals.map((midi) => {
        const octave = midi % 12 === 0;
        return (
          <SvgLabel
            key={midi}
            x={width - 12}
            y={y(midi) + 4}
            size={12}
            family="mono"
            weight={octave ? "600" : "400"}
            anchor="end"
            fill={octave ? colors.ink : colors.inkSoft}
          >
            {octave ? noteName(midi) : noteName(midi).charAt(0)}
          </SvgLabel>
        );
      })}
      {reach.map(({ from, to }) => (
        <SvgLabel key={from} x={3} y={y((from + to) / 2) + 4} size={12} weight="600" fill={colors.honeyText}>
          reach
        </SvgLabel>
      ))}
      <SvgLabel x={3} y={middle - 4} size={12} weight="600" fill={colors.lagoon}>
        comfort
      </SvgLabel>
      <SvgLabel x={3} y={middle + 12} size={12} weight="600" fill={colors.lagoon}>
        band
      </SvgLabel>
    </Svg>
  );
}
