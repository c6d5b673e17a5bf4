import Svg, { Circle, G, Line, Path, Rect } from "react-native-svg";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import { glyphs, noteName, type Spelling } from "@/shared/music/pitch";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors } from "@/features/ui/theme";
import { ground, Hatch, useDrawingId } from "./Hatch";
import { isNatural, ladderWords, semitonesOf, sideOf, type Scale } from "./ladderGeometry";
import { edges, keySpanWidth, keySpanX, markHeight, seamless } from "./keySpanGeometry";

export interface KeySpanProps {
  voice: SingingVoice;
  marks: readonly KeyMark[];
  /** semitones shown; the same for all rows of a table */
  scale: Scale;
  /** 14.4 in the table, 5.6 beside a chart */
  perSemitone?: number;
  /** height of the row; the bands fill it, so that rows join */
  height?: number;
  spelling?: Spelling;
  /** on a surface of card colour */
  selected?: boolean;
  /** in words; made from voice and marks unless told otherwise */
  summary?: string;
}

/** Row of the key table: bands of the voice behind, the song's marks in front, all rows on one scale. */
export function KeySpan({
  voice,
  marks,
  scale,
  perSemitone = 14.4,
  height = 51,
  spelling = "common",
  selected = false,
  summary,
}: KeySpanProps) {
  const id = useDrawingId();
  const fine = perSemitone < 8;
  const width = keySpanWidth(scale, perSemitone);
  const x = (midi: number) => keySpanX(midi, scale, perSemitone);
  const { left, right, softLeft, softRight } = edges(voice, scale, perSemitone);
  const middle = height / 2;
  const thick = fine ? 4.4 : 10;
  const tallest = fine ? 26 : 36;
  const longest = Math.max(0.01, ...marks.map((mark) => mark.share));
  const soft = seamless(height, 7);
  const sorted = [...marks].sort((a, b) => a.midi - b.midi);
  const first = sorted[0];
  const last = sorted[sorted.length - 1];
  const name = (midi: number) => glyphs(noteName(midi, spelling));
  const tone = (mark: KeyMark) =>
    mark.zone === "beyond" ? colors.brick : mark.zone === "reach" ? colors.honeyText : colors.ink;
  const rungs = semitonesOf(scale).filter(isNatural);
  return (
    <Svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={summary ?? ladderWords(voice, marks, spelling)}
      style={{ display: "flex", ...(selected ? { ["--ground" as string]: "var(--card)" } : null) }}
    >
      <Hatch
        id={`${id}h`}
        pitch={fine ? 3.4 : 5}
        line={fine ? 1.9 : 2}
        under={fine ? "none" : colors.honey}
        underOpacity={0.16}
      />
      <Hatch id={`${id}w`} pitch={soft.pitch} line={1} lineOpacity={0.42} under="none" />
      <Rect x={left} y={0} width={Math.max(0, softLeft - left)} height={height} fill={`url(#${id}w)`} />
      <Rect x={softRight} y={0} width={Math.max(0, right - softRight)} height={height} fill={`url(#${id}w)`} />
      <Rect x={softLeft} y={0} width={Math.max(0, softRight - softLeft)} height={height} fill="var(--band)" />
      {!fine &&
        rungs.map((midi) => (
          <Line
            key={midi}
            x1={x(midi)}
            x2={x(midi)}
            y1={0}
            y2={height}
            stroke={colors.line}
            strokeWidth={1}
            {...(midi % 12 === 0 ? null : { strokeDasharray: "1 4" })}
          />
        ))}
      {[softLeft, softRight].map((edge) => (
        <Line key={edge} x1={edge} x2={edge} y1={0} y2={height} stroke={colors.lagoon} strokeWidth={fine ? 1.3 : 1.5} />
      ))}
      {[left, right].map((edge) => (
        <Line
          key={edge}
          x1={edge}
          x2={edge}
          y1={0}
          y2={height}
          stroke={colors.honey}
          strokeWidth={fine ? 1 : 1.2}
          strokeDasharray={soft.dash}
        />
      ))}
      {first && last && (
        <Line x1={x(first.midi)} x2={x(last.midi)} y1={middle} y2={middle} stroke={colors.inkSoft} strokeWidth={1} />
      )}
      {sorted.map((mark) => {
        const tall = markHeight(mark.share, longest, tallest);
        const box = {
          x: x(mark.midi) - thick / 2,
          y: middle - tall / 2,
          width: thick,
          height: tall,
          rx: Math.min(3, thick / 2),
        };
        return (
          <G key={mark.midi}>
            {mark.zone === "comfort" ? (
              <Rect {...box} fill={colors.lagoon} />
            ) : (
              <G>
                <Rect
                  {...box}
                  fill={ground}
                  {...(mark.zone === "beyond"
                    ? {
                        stroke: colors.brick,
                        strokeWidth: fine ? 1.2 : 1.5,
                        strokeDasharray: "1.5 2",
                        strokeLinecap: "round" as const,
                      }
                    : null)}
                />
                {mark.zone === "reach" && (
                  <Rect
                    {...box}
                    fill={`url(#${id}h)`}
                    {...(fine ? null : { stroke: colors.honey, strokeWidth: 1.2 })}
                  />
                )}
              </G>
            )}
            {mark.home && !fine && (
              <Circle cx={x(mark.midi)} cy={middle} r={2.6} fill={mark.zone === "comfort" ? ground : colors.ink} />
            )}
          </G>
        );
      })}
      {first && (
        <EndName
          x={x(first.midi) - thick}
          direction={-1}
          middle={middle}
          words={fine ? "" : name(first.midi)}
          arrow={first.zone === "beyond" && sideOf(first.midi, voice) === "below" ? "down" : null}
          fill={tone(first)}
        />
      )}
      {last && (
        <EndName
          x={x(last.midi) + thick}
          direction={1}
          middle={middle}
          words={fine ? "" : name(last.midi)}
          arrow={last.zone === "beyond" && sideOf(last.midi, voice) === "above" ? "up" : null}
          fill={tone(last)}
        />
      )}
    </Svg>
  );
}

interface EndNameProps {
  x: number;
  direction: 1 | -1;
  middle: number;
  words: string;
  arrow: "up" | "down" | null;
  fill: string;
}

const letterWidth = 6.9;

/** Name of an outer note, and outside it the arrow of one that lies beyond. */
function EndName({ x, direction, middle, words, arrow, fill }: EndNameProps) {
  const tip = x + direction * (words === "" ? 1 : words.length * letterWidth + 6);
  const left = direction === 1 ? tip : tip - 7;
  const rise = arrow === "up" ? -5.6 : 5.6;
  return (
    <G>
      {words !== "" && (
        <SvgLabel
          x={x}
          y={middle + 4}
          size={11.5}
          family="mono"
          anchor={direction === 1 ? "start" : "end"}
          halo
          fill={fill}
        >
          {words}
        </SvgLabel>
      )}
      {arrow && <Path d={`M${left} ${middle - rise / 2}h7l-3.5 ${rise}z`} fill={fill} />}
    </G>
  );
}
