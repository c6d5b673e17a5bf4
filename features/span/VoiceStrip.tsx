import Svg, { ClipPath, Defs, G, Line, Path, Rect } from "react-native-svg";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import type { Spelling } from "@/shared/music/pitch";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { ground, Hatch, useDrawingId } from "./Hatch";
import { ladderWords, semitonesOf, sideOf, type Scale } from "./ladderGeometry";

export interface VoiceStripProps {
  voice: SingingVoice;
  marks: readonly KeyMark[];
  /** semitones shown; the same for all rows of a list */
  scale: Scale;
  width?: number;
  spelling?: Spelling;
  /** in words; made from voice and marks unless told otherwise */
  summary?: string;
}

/** Horizontal place of a pitch in a row of this width. */
export function stripX(midi: number, scale: Scale, width: number): number {
  return ((midi - scale.low + 0.5) * width) / (scale.high - scale.low + 1);
}

/** Row of the phone: the voice as a strip 8 high, the song's marks hanging below it, 4 to 13 long. */
export function VoiceStrip({ voice, marks, scale, width = 120, spelling = "common", summary }: VoiceStripProps) {
  const id = useDrawingId();
  const x = (midi: number) => stripX(midi, scale, width);
  const half = width / (scale.high - scale.low + 1) / 2;
  const left = x(voice.range.lowMidi) - half;
  const right = x(voice.range.highMidi) + half;
  const softLeft = x(voice.comfort.lowMidi) - half;
  const softRight = x(voice.comfort.highMidi) + half;
  const longest = Math.max(0.01, ...marks.map((mark) => mark.share));
  const thick = Math.min(3.2, half * 1.4);
  const octaves = semitonesOf(scale).filter((midi) => midi % 12 === 0);
  return (
    <Svg
      width={width}
      height={26}
      viewBox={`0 0 ${width} 26`}
      role="img"
      aria-label={summary ?? ladderWords(voice, marks, spelling)}
    >
      <Hatch id={`${id}s`} pitch={4} line={1.6} />
      {octaves.map((midi) => (
        <Line key={midi} x1={x(midi)} x2={x(midi)} y1={0} y2={26} stroke={mixtures.rungC} strokeWidth={1} />
      ))}
      <Defs>
        <ClipPath id={`${id}c`}>
          <Rect x={left} y={2} width={right - left} height={8} rx={4} />
        </ClipPath>
      </Defs>
      <G clipPath={`url(#${id}c)`}>
        <Rect x={left} y={2} width={right - left} height={8} fill={`url(#${id}s)`} />
        <Rect x={softLeft - 1.5} y={2} width={softRight - softLeft + 3} height={8} fill={ground} />
        <Rect x={softLeft} y={2} width={softRight - softLeft} height={8} fill={colors.lagoon} />
      </G>
      {marks.map((mark) => {
        const long = 4 + (8.8 * mark.share) / longest;
        const at = x(mark.midi);
        if (mark.zone === "comfort")
          return (
            <Rect key={mark.midi} x={at - thick / 2} y={12.5} width={thick} height={long} rx={1} fill={colors.ink} />
          );
        if (mark.zone === "reach") {
          return (
            <Rect
              key={mark.midi}
              x={at - 1.5}
              y={13}
              width={3}
              height={long - 1}
              rx={1}
              fill={ground}
              stroke={colors.honey}
              strokeWidth={1.25}
            />
          );
        }
        const up = sideOf(mark.midi, voice) === "above";
        const away = up ? 7 : -7;
        return (
          <G key={mark.midi}>
            <Rect
              x={at - 1.5}
              y={13}
              width={3}
              height={long - 1}
              rx={1}
              fill="none"
              stroke={colors.brick}
              strokeWidth={1.2}
              strokeDasharray="0.1 2.1"
              strokeLinecap="round"
            />
            <Path
              d={up ? `M${at + away - 3.5} 19.8h7l-3.5-5.6z` : `M${at + away - 3.5} 14.2h7l-3.5 5.6z`}
              fill={colors.brick}
            />
          </G>
        );
      })}
    </Svg>
  );
}

/** Names over a list of strips: the ends of the comfort band and the C between them. */
export function VoiceStripHeader({ voice, scale, width = 120 }: Pick<VoiceStripProps, "voice" | "scale" | "width">) {
  const names = stripNames(voice, scale, width);
  return (
    <Svg width={width} height={16} viewBox={`0 0 ${width} 16`} aria-hidden>
      {names.map(({ midi, name, x }) => (
        <SvgLabel key={midi} x={x} y={12} size={12} family="display" weight="600" anchor="middle">
          {name}
        </SvgLabel>
      ))}
    </Svg>
  );
}

function stripNames(voice: SingingVoice, scale: Scale, width: number): { midi: number; name: string; x: number }[] {
  const low = Math.round(voice.comfort.lowMidi);
  const high = Math.round(voice.comfort.highMidi);
  const between = [...Array(Math.max(0, high - low)).keys()]
    .map((index) => low + index)
    .filter((midi) => midi % 12 === 0);
  const out: { midi: number; name: string; x: number }[] = [];
  for (const midi of [low, high, ...between]) {
    const x = stripX(midi, scale, width);
    if (out.every((other) => Math.abs(other.x - x) >= 22)) out.push({ midi, name: nameOf(midi), x });
  }
  return out;
}

const letters = ["C", "C♯", "D", "E♭", "E", "F", "F♯", "G", "A♭", "A", "B♭", "B"] as const;

function nameOf(midi: number): string {
  return `${letters[midi % 12] ?? ""}${Math.floor(midi / 12) - 1}`;
}
