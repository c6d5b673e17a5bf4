import { View } from "react-native";
import Svg, { G, Line, Rect } from "react-native-svg";
import type { KeyMark, SingingVoice } from "@/shared/keys/keyScore";
import type { Spelling } from "@/shared/music/pitch";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { ground, Hatch, useDrawingId } from "./Hatch";
import { LadderColumn } from "./LadderColumn";
import {
  isNatural,
  ladderMeasures,
  ladderScale,
  ladderWords,
  lengthPerPercent,
  yOf,
  type LadderStep,
  type Scale,
} from "./ladderGeometry";
import { LadderLabels, type LadderLabel } from "./LadderLabels";
import { LadderMarks } from "./LadderMarks";
import { ShiftHandle, type LadderShift } from "./ShiftHandle";

/** Two lines over one side of a two-sided ladder. */
interface LadderHead {
  title: string;
  text: string;
  tone: "comfort" | "beyond";
}

export interface SpanLadderProps {
  voice: SingingVoice | null;
  /** right of the column */
  marks?: readonly KeyMark[];
  /** left of the column: the ladder becomes two-sided */
  leftMarks?: readonly KeyMark[];
  /** over the two sides */
  heads?: { left: LadderHead; right: LadderHead };
  /** px a semitone: 18 on a result, 15 on the first page, 12 on a card */
  step: LadderStep;
  width: number;
  /** semitones shown; from voice and marks unless told otherwise */
  scale?: Scale;
  /** names at the right; they take 150 px */
  labels?: readonly LadderLabel[];
  /** lines of words beside the bracket between the comfort labels */
  bracket?: readonly string[];
  /** one line at the top rung, such as "held: E4 for 2.6 s" */
  note?: string;
  /** words low in the column */
  columnWords?: readonly string[];
  /** the handle that moves the song by semitones */
  shift?: LadderShift;
  spelling?: Spelling;
  /** the picture in words; made from voice and marks unless told otherwise */
  summary?: string;
  testID?: string;
}

const labelRoom = 150;
const headRoom = 46;

/** The span: a vertical pitch ladder whose column is the voice and whose marks are the song. */
export function SpanLadder({
  voice,
  marks = [],
  leftMarks,
  heads,
  step,
  width,
  scale,
  labels,
  bracket,
  note,
  columnWords,
  shift,
  spelling = "common",
  summary,
  testID,
}: SpanLadderProps) {
  const id = useDrawingId();
  const measure = ladderMeasures[step];
  const shown = scale ?? ladderScale(voice, [...marks, ...(leftMarks ?? [])], step === 12 ? 0 : 1);
  const pad = step / 2 + (step === 12 ? 2 : 0) + (heads ? headRoom : 0);
  const height = pad + (shown.high - shown.low) * step + step / 2 + (step === 12 ? 2 : 0);
  const y = (midi: number) => yOf(midi, shown, step, pad);
  const rungEnd = labels ? width - labelRoom : width;
  const columnX = leftMarks
    ? Math.round(measure.rungs + (width - measure.rungs - measure.column) * 0.464)
    : measure.columnX;
  const marksX = columnX + measure.column + measure.gap;
  const leftX = columnX - measure.gap;
  const shiftRoom = shift ? 56 : 0;
  const perPercent = Math.min(
    lengthPerPercent(marks, rungEnd - marksX - 4 - shiftRoom, measure.perPercent),
    leftMarks ? lengthPerPercent(leftMarks, leftX - measure.rungs - 8, measure.perPercent) : measure.perPercent,
  );
  const rungs = Array.from({ length: shown.high - shown.low + 1 }, (_, index) => shown.high - index);
  const words = summary ?? ladderWords(voice, marks, spelling);
  const home = marks.find((mark) => mark.home)?.midi ?? shown.low + (shown.high - shown.low) / 2;
  const headSize = width < 330 ? 11.5 : 14;
  const side = { id, voice, scale: shown, step, pad, height: measure.mark, perPercent };

  return (
    <View testID={testID} style={{ width, height }}>
      <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={words}>
        <Hatch id={`${id}h`} pitch={6} line={2.4} />
        <Hatch id={`${id}s`} pitch={4} line={1.6} />
        {rungs.map((midi) => {
          const natural = isNatural(midi);
          const middleC = midi % 12 === 0;
          return (
            <G key={midi}>
              <Line
                x1={measure.rungs}
                x2={natural ? rungEnd : measure.rungs + measure.tick}
                y1={y(midi)}
                y2={y(midi)}
                stroke={middleC ? mixtures.rungC : colors.line}
                strokeWidth={1}
              />
              {natural && (
                <SvgLabel
                  x={measure.names}
                  y={y(midi) + measure.font * 0.35}
                  size={measure.font}
                  family="display"
                  weight="600"
                  anchor="end"
                  fill={middleC ? colors.ink : colors.inkSoft}
                >
                  {`${"C D EF G A B"[midi % 12]}${Math.floor(midi / 12) - 1}`}
                </SvgLabel>
              )}
            </G>
          );
        })}
        {leftMarks && (
          <Rect
            x={columnX - measure.ground}
            y={y(shown.high) - step / 2}
            width={measure.column + 2 * measure.ground}
            height={height}
            fill={ground}
          />
        )}
        {voice && (
          <LadderColumn id={id} voice={voice} scale={shown} step={step} pad={pad} x={columnX} words={columnWords} />
        )}
        {leftMarks && <LadderMarks {...side} marks={leftMarks} x={leftX} direction={-1} />}
        <LadderMarks {...side} marks={marks} x={marksX} direction={1} />
        {note !== undefined && (
          <G>
            <Rect
              x={columnX + measure.column + 4}
              y={y(shown.high) - 8}
              width={Math.max(0, Math.min(width - marksX, note.length * 6.2 + 8))}
              height={16}
              fill={ground}
            />
            <SvgLabel x={marksX} y={y(shown.high) + 4} size={12}>
              {note}
            </SvgLabel>
          </G>
        )}
        {labels && <LadderLabels labels={labels} y={y} x={rungEnd + 4} bracket={bracket} />}
        {heads && (
          <G>
            <LadderHeadWords head={heads.left} x={leftX} anchor="end" size={headSize} />
            <LadderHeadWords head={heads.right} x={marksX} anchor="start" size={headSize} />
          </G>
        )}
      </Svg>
      {shift && (
        <ShiftHandle shift={shift} step={step} right={8} top={Math.min(height - 112, Math.max(0, y(home) - 56))} />
      )}
    </View>
  );
}

function LadderHeadWords({
  head,
  x,
  anchor,
  size,
}: {
  head: LadderHead;
  x: number;
  anchor: "start" | "end";
  size: number;
}) {
  return (
    <G>
      <SvgLabel x={x} y={14} size={size} weight="500" anchor={anchor} fill={colors.ink}>
        {head.title}
      </SvgLabel>
      <SvgLabel
        x={x}
        y={33}
        size={size}
        weight="500"
        anchor={anchor}
        fill={head.tone === "comfort" ? colors.lagoon : colors.brick}
      >
        {head.text}
      </SvgLabel>
    </G>
  );
}
