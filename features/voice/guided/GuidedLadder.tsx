import { useState } from "react";
import { View } from "react-native";
import Svg, { Circle, G, Line, Rect } from "react-native-svg";
import { isNatural, semitonesOf } from "@/features/span/ladderGeometry";
import { SvgLabel } from "@/features/ui/SvgLabel";
import { colors, mixtures } from "@/features/ui/theme";
import { noteWord } from "../noteWords";
import { useHeard } from "../listening/useHeard";
import type { LiveSound } from "../recorder/liveSound";
import { holdNow } from "./hearing/guidedHold";
import type { GuidedRun } from "./guidedSteps";

export interface GuidedLadderProps {
  run: GuidedRun;
  live: LiveSound;
  /** whether the singer's own pitch is drawn */
  listening: boolean;
  height: number;
}

const names = 34;
const columnX = 48;
const columnWidth = 64;
/** Room for an octave of steps ahead; the picture grows with the voice. */
const around = 5;
const least = 14;

/** The notes held so far as a growing column, the note asked for, and where the voice is now. */
export function GuidedLadder({ run, live, listening, height }: GuidedLadderProps) {
  const [width, setWidth] = useState(0);
  const sung = useHeard(live, () => {
    const now = listening ? holdNow(live.frames) : null;
    return now === null ? -1 : Math.round(now.midi * 10) / 10;
  });
  const { low, high } = scaleOf(run, sung);
  const step = (height - 16) / (high - low);
  const y = (midi: number) => 8 + (high - midi) * step;
  const rungs = semitonesOf({ low, high });
  const own = run.held.map(({ midi }) => midi);
  const bottom = Math.min(...own);
  const top = Math.max(...own);
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height }}>
      {width > 0 && (
        <Svg width={width} height={height} role="img" aria-label={ladderWords(run)}>
          {rungs.map((midi) => (
            <G key={midi}>
              <Line
                x1={names}
                x2={isNatural(midi) ? width : names + 6}
                y1={y(midi)}
                y2={y(midi)}
                stroke={midi % 12 === 0 ? mixtures.rungC : colors.line}
              />
              {isNatural(midi) && step > 6 && (
                <SvgLabel x={names - 8} y={y(midi) + 4} size={13} family="display" weight="600" anchor="end">
                  {noteWord(midi)}
                </SvgLabel>
              )}
            </G>
          ))}
          {own.length > 0 && (
            <Rect
              x={columnX}
              y={y(top) - step / 2}
              width={columnWidth}
              height={y(bottom) - y(top) + step}
              rx={Math.min(14, step / 2 + 6)}
              fill={colors.lagoon}
            />
          )}
          {run.home !== null && own.length > 0 && (
            <Circle cx={columnX + columnWidth / 2} cy={y(run.home)} r={4} fill={colors.card} />
          )}
          {sung >= low && sung <= high && (
            <Line
              x1={columnX - 10}
              x2={width}
              y1={y(sung)}
              y2={y(sung)}
              stroke={colors.ink}
              strokeWidth={1.5}
              strokeDasharray="2 5"
            />
          )}
          {run.target !== null && (
            <G>
              <Rect
                x={columnX - 6}
                y={y(run.target) - 7}
                width={columnWidth + 12}
                height={14}
                rx={7}
                fill={colors.paper}
                stroke={colors.plum}
                strokeWidth={2.5}
              />
              <SvgLabel
                x={columnX + columnWidth + 16}
                y={y(run.target) + 5}
                size={14}
                weight="600"
                fill={colors.plum}
                halo
              >
                {`asked for: ${noteWord(run.target)}`}
              </SvgLabel>
            </G>
          )}
          {sung >= low && sung <= high && (
            <G>
              <Circle
                cx={columnX + columnWidth / 2}
                cy={y(sung)}
                r={7}
                fill={colors.ink}
                stroke={colors.paper}
                strokeWidth={2}
              />
              <SvgLabel x={width - 4} y={y(sung) - 6} size={13} weight="600" anchor="end" fill={colors.ink} halo>
                {`you: ${noteWord(sung)}`}
              </SvgLabel>
            </G>
          )}
        </Svg>
      )}
    </View>
  );
}

function scaleOf(run: GuidedRun, sung: number): { low: number; high: number } {
  const shown = [...run.held.map(({ midi }) => Math.round(midi)), run.target, run.home].filter((midi) => midi !== null);
  if (shown.length === 0) shown.push(sung > 0 ? Math.round(sung) : 57);
  const low = Math.min(...shown) - around;
  const high = Math.max(...shown) + 3;
  return high - low >= least ? { low, high } : { low, high: low + least };
}

function ladderWords({ held, target }: GuidedRun): string {
  const asked = target === null ? "" : ` Asked for: ${noteWord(target)}.`;
  if (held.length === 0) return `Nothing held yet.${asked}`;
  const all = held.map(({ midi }) => midi);
  return `Held so far: ${noteWord(Math.min(...all))} to ${noteWord(Math.max(...all))}.${asked}`;
}
